import type { ColouringResult } from '../../engines/colouring/index.ts';
import { gainOf } from '../../engines/colouring/index.ts';
import type { Trx } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';
import type { SearchOutcome } from '../jobs/search.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdClaim, type Claim } from '../repositories/claims.repository.ts';
import { claimedSearch, endSearch } from '../repositories/searches.repository.ts';
import {
	findSheetById,
	holdSheet,
	insertColouring,
	insertDraft,
	type DraftRow,
} from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf } from './draft.service.ts';
import { checkedOutcome, storedResult, type Outcome } from './outcome-of-colouring.ts';
import { problemDigest } from './problem-digest.ts';
import { foundSentence, keptSentence, nothingSentence } from './search-words.ts';

/**
 * Stores what came of a search, only while the claim holds. What is better than known becomes a revision
 * signed by whoever asked, if the sheet's present draft still asks the same; else it is kept with the search.
 */
export async function keepSearch(
	shop: Pick<Workshop, 'db' | 'pool'>,
	claim: Claim,
	found: SearchOutcome,
): Promise<boolean> {
	for (;;) {
		const row = await claimedSearch(shop.db, claim);
		const sheet = row && (await findSheetById(shop.db, row.sheet_id));
		if (!sheet) return false;
		const current = await draftOf(shop.db, sheet.id, sheet.revision);
		const ending = await endingOf(shop, row, current, found);
		const kept = await shop.db.transaction().execute(async (trx) => {
			const now = await holdSheet(trx, sheet.team_id, sheet.number);
			if (now?.revision !== current.revision) return 'changed' as const;
			const held = await holdClaim(trx, 'searches', claim);
			if (!held) return false;
			await end(trx, { row: held, number: now.number, current }, ending);
			return true;
		});
		// somebody saved meanwhile: look again at what the sheet asks now
		if (kept !== 'changed') return kept;
	}
}

/** What a search leads to. */
interface Ending {
	state: 'stored' | 'kept' | 'nothing';
	sentence: string;
	gain: SearchOutcome['gain'];
	result: ColouringResult | null;
	/** of the new revision */
	outcome: Outcome | null;
}

async function endingOf(
	shop: Pick<Workshop, 'db' | 'pool'>,
	row: Row<'searches'>,
	current: DraftRow,
	{ gain, result }: SearchOutcome,
): Promise<Ending> {
	const nothing: Ending = {
		...{ state: 'nothing', sentence: nothingSentence },
		...{ gain: null, result: null, outcome: null },
	};
	if (!gain) return nothing;
	const found = foundSentence(gain, result);
	if (problemDigest(documentOf(current), current.boundary_set_id) !== row.problem_digest) {
		const sentence = keptSentence(found, row.revision);
		return { ...nothing, state: 'kept', sentence, gain, result };
	}
	const present = storedResult(current);
	if (!present || !gainOf(present, result)) return nothing;
	const better = await asShown(shop, current, present, result);
	const outcome = checkedOutcome({ result: better, faults: [] });
	return { state: 'stored', sentence: found, gain, result: better, outcome };
}

/** With as many inks as are shown the sheet stays as it is shown now, whatever it was when this was asked. */
async function asShown(
	shop: Pick<Workshop, 'db' | 'pool'>,
	current: DraftRow,
	present: ColouringResult,
	result: ColouringResult,
): Promise<ColouringResult> {
	if (present.status !== 'coloured' || result.status !== 'coloured') return result;
	if (present.inksUsed !== result.inksUsed) return result;
	const { keys, borders } = await boundaryView(shop.db, current.boundary_set_id);
	const input = { keys, borders, draft: documentOf(current), result };
	const shown = Array.from(present.colouring);
	return (await shop.pool.run('arrangeDraft', { ...input, shown })) ?? result;
}

type Held = { row: Row<'searches'>; number: number; current: DraftRow };

async function end(trx: Trx, { row, number, current }: Held, ending: Ending): Promise<void> {
	const { state, sentence, gain, result, outcome } = ending;
	const revision = outcome ? current.revision + 1 : null;
	if (outcome && revision !== null) {
		const { colouring, explanation } = outcome;
		await insertDraft(trx, {
			...{ sheetId: row.sheet_id, revision, document: documentOf(current), explanation },
			colouringId: colouring && (await insertColouring(trx, row.sheet_id, colouring)),
			savedBy: row.created_by,
		});
	}
	await endSearch(trx, row.id, {
		...{ state, sentence, gain, stored_revision: revision },
		result: result && JSON.stringify(asJson(result)),
	});
	const detail = { sheet: number, number: row.number, gain, ...(revision && { revision }) };
	await note(trx, row, outcome ? 'stored' : 'ended', detail);
}

/** Inks as a list, as `resultIn` reads them again. */
const asJson = (result: ColouringResult) =>
	result.status === 'coloured'
		? { ...result, colouring: Array.from(result.colouring) }
		: { ...result };

/** Gives up on a search in sight of everybody. */
export const failSearch = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	sentence: string,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const row = await holdClaim(trx, 'searches', claim);
		if (!row) return false;
		await endSearch(trx, row.id, { state: 'failed', sentence });
		const sheet = await findSheetById(trx, row.sheet_id);
		await note(trx, row, 'failed', { sheet: sheet?.number, number: row.number });
		return true;
	});

/** Writes it down under the one who asked. */
const note = (
	trx: Trx,
	row: Row<'searches'>,
	verb: string,
	detail: Record<string, unknown>,
): Promise<void> => {
	const team = { id: row.team_id, slug: '', name: '' };
	const actor = { team, userId: row.created_by, tokenId: null };
	return record(trx, actor, `search.${verb}`, { kind: 'search', id: row.id }, detail);
};
