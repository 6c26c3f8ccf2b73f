import type { EditionContent } from '../../engines/editions/index.ts';
import type { EditionChanges, FiguresSince, ThemedEdition } from '../../schemas/edition-notes.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findEdition, listThemedEditions } from '../repositories/editions.repository.ts';
import { readMeasuresNamed, type NamedMeasure } from '../repositories/measures.repository.ts';
import { isNumber } from './ask-export.ts';
import { sheetOf } from './draft.service.ts';
import { NotFound } from './outcomes.ts';

/** What changed from the edition before to this one. */
export async function editionChanges(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	edition: number,
): Promise<EditionChanges> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const after = await contentOf(shop.db, sheet.id, edition);
	if (!after) throw new NotFound('edition');
	const before = await contentOf(shop.db, sheet.id, edition - 1);
	if (!before) return { since: null, sentences: [] };
	const sentences = await shop.pool.run('compareEditions', { before, after });
	return { since: edition - 1, sentences };
}

async function contentOf(db: Db, sheetId: string, edition: number): Promise<EditionContent | null> {
	const row = isNumber(edition) ? await findEdition(db, sheetId, edition) : undefined;
	return row ? (row.content as unknown as EditionContent) : null;
}

/**
 * The editions of a sheet that show a measure, and whether its figures were joined again since they were
 * issued; they keep those they were issued with. The newest first.
 */
export async function themedEditions(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<ThemedEdition[]> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const editions = await listThemedEditions(shop.db, sheet.id);
	const names = editions.flatMap(({ measure, divisor }) => [measure, divisor ?? measure]);
	if (names.length === 0) return [];
	const rows = await readMeasuresNamed(shop.db, sheet.id, names);
	const now = new Map(rows.map((row) => [row.name, row]));
	return editions.map(({ number, measure, divisor, figures_at: figuresAt, issued_at: issued }) => {
		const named = [measure, divisor ?? measure].map((name) => now.get(name));
		return { number, measure, figuresAt, since: sinceThen(named, issued) };
	});
}

/** A table is never taken over twice: one that is newer than the edition came in place of what it showed. */
function sinceThen(measures: (NamedMeasure | undefined)[], issued: Date): FiguresSince {
	const there = measures.filter((one) => one !== undefined);
	if (there.length < measures.length) return { state: 'gone' };
	const taken = there.map(({ taken_at: at }) => at?.getTime() ?? 0);
	const last = Math.max(...taken);
	return last > issued.getTime()
		? { state: 'replaced', at: new Date(last).toISOString() }
		: { state: 'same' };
}
