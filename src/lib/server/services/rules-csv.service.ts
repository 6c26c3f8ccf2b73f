import { replaceRules } from '../../engines/editions/rules-csv.ts';
import type { DraftSaved } from '../../schemas/desk.ts';
import { draftDocument } from '../../schemas/draft.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, saveDraft, sheetOf } from './draft.service.ts';
import { fileStem } from './drawing.service.ts';
import { Conflict, Unfit } from './outcomes.ts';

export interface RulesFile {
	name: string;
	mediaType: string;
	bytes: Uint8Array;
}

/** The rules of a sheet's draft as CSV, without those that an adjoining sheet asks for. */
export async function rulesFile(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	asker: AbortSignal,
): Promise<RulesFile> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const draft = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	const { keys, names } = await boundaryView(shop.db, sheet.boundary_set_id);
	return {
		name: `${fileStem(sheet.name)}-rules.csv`,
		mediaType: 'text/csv; charset=utf-8',
		bytes: await shop.pool.run('writeRules', { draft, keys, names }, { signal: asker }),
	};
}

/**
 * Saves the rules of a table in place of those of the draft, as the next revision; what an adjoining sheet
 * asks for stays. Throws `Unfit` with the faults by row, and saves nothing, unless every row makes a rule.
 */
export async function replaceRulesByFile(
	shop: Workshop,
	member: Member,
	number: number,
	bytes: Uint8Array,
	asker: AbortSignal,
): Promise<DraftSaved> {
	requireAccess(member, 'colours.edit');
	const sheet = await sheetOf(shop.db, member, number);
	const draft = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	const { keys, names } = await boundaryView(shop.db, sheet.boundary_set_id);
	const ground = { keys, names, inks: draft.palette.inks.map(({ name }) => name) };
	const read = await shop.pool.run('readRulesTable', { bytes, ground }, { signal: asker });
	if (read.status === 'refused') throw new Unfit('unfit-rules', read.message);
	if (read.faults.length > 0) {
		const [{ row, words }] = read.faults;
		throw new Unfit('unfit-rules', `row ${row}: ${words}`, { faults: read.faults.slice(0, 100) });
	}
	const document = draftDocument.parse(replaceRules(draft, read.parts));
	const result = await saveDraft(shop, member, number, { revision: sheet.revision, document });
	if (result.status === 'stale') throw new Conflict('stale', 'somebody else saved meanwhile');
	return result.saved;
}
