import { openQuestion } from '../../engines/colouring/index.ts';
import type { BeginSearch, SearchFound, SearchNote } from '../../schemas/search.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	countOpenSearches,
	endSearch,
	findSearch,
	holdSearch,
	insertSearch,
	listSearches,
	type SearchNoteRow,
} from '../repositories/searches.repository.ts';
import { holdSheet } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { storedResult } from './outcome-of-colouring.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { personName } from './people.ts';
import { problemDigest } from './problem-digest.ts';

/** Searches of one team that may wait or run at once: each may take a core for hours. */
const mostOpen = 4;

/** Asks for a longer search for what the colouring of the present draft leaves open. */
export async function beginSearch(
	shop: Workshop,
	member: Member,
	number: number,
	{ revision, times }: BeginSearch,
): Promise<{ number: number }> {
	requireAccess(member, 'colours.edit');
	await sheetOf(shop.db, member, number);
	return shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, number);
		if (!sheet) throw new NotFound('sheet');
		if (revision !== undefined && revision !== sheet.revision) {
			throw new Conflict('stale', 'The sheet has been saved again since. Look at it first.');
		}
		const draft = await draftOf(trx, sheet.id, sheet.revision);
		const document = documentOf(draft);
		const known = storedResult(draft);
		const question = known && openQuestion(known, document.inks);
		if (!question) throw new Conflict('nothing-open', 'Nothing is open about this colouring.');
		const open = await countOpenSearches(trx, { sheetId: sheet.id, teamId: member.team.id });
		if (open.ofSheet > 0) {
			throw new Conflict('search-open', 'A longer try of this sheet is under way already.');
		}
		if (open.ofTeam >= mostOpen) {
			throw new Conflict('too-many-open', `${mostOpen} longer tries of the team are under way.`);
		}
		const made = await insertSearch(trx, {
			...{ team_id: member.team.id, sheet_id: sheet.id, question, times },
			revision: sheet.revision,
			problem_digest: problemDigest(document, draft.boundary_set_id),
			created_by: member.userId,
		});
		await shop.queue.send(trx, 'search', { searchId: made.id });
		const detail = { sheet: number, number: made.number, times };
		await record(trx, member, 'search.asked', { kind: 'search', id: made.id }, detail);
		return { number: made.number };
	});
}

/** Stops one that waits or runs; its thread ends within a second. */
export async function stopSearch(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	search: number,
): Promise<void> {
	requireAccess(member, 'colours.edit');
	const { id } = await sheetOf(shop.db, member, number);
	await shop.db.transaction().execute(async (trx) => {
		const row = isNumber(search) ? await holdSearch(trx, id, search) : undefined;
		if (!row) throw new NotFound('search');
		const end = { state: 'cancelled', sentence: 'It was stopped. Nothing was changed.' } as const;
		if (!(await endSearch(trx, row.id, end))) {
			throw new Conflict('not-open', 'It has ended already.');
		}
		const detail = { sheet: number, number: row.number };
		await record(trx, member, 'search.stopped', { kind: 'search', id: row.id }, detail);
	});
}

/** The searches of a sheet, the newest first: for its page, and for asking again and again. */
export async function sheetSearches(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<SearchNote[]> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	return (await listSearches(shop.db, sheet.id)).map(noteOf);
}

/** One with the inks that it found, to be looked at. */
export async function readSearch(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	search: number,
): Promise<SearchFound> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = isNumber(search) ? await findSearch(shop.db, sheet.id, search) : undefined;
	if (!row) throw new NotFound('search');
	const inks = row.result?.status === 'coloured' ? (row.result.colouring as number[]) : null;
	return { ...noteOf(row), inks };
}

const isNumber = (number: number): boolean =>
	Number.isSafeInteger(number) && number > 0 && number < 2 ** 31;

const noteOf = (row: SearchNoteRow): SearchNote => ({
	...{ number: row.number, state: row.state, question: row.question, times: row.times },
	...{ revision: row.revision, step: row.step, share: row.share, gain: row.gain },
	sentence: row.sentence,
	storedRevision: row.stored_revision,
	createdAt: row.created_at.toISOString(),
	createdBy: personName(row),
	updatedAt: row.updated_at.toISOString(),
});
