import type { TerritoryEntry } from '../../engines/territories/territory-draft.ts';
import type { HandoverNote } from '../../schemas/desk-territories.ts';
import type {
	Handover,
	HandoverLetter,
	HandoverMove,
	HandoverTerritory,
} from '../../schemas/handover.ts';
import type { Db } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';
import { readLetters } from '../repositories/handover-letters.repository.ts';
import {
	countMoves,
	listHandovers,
	readMoves,
	type HandoverRow,
	type StateCount,
} from '../repositories/handovers.repository.ts';
import { handoverDigest } from './handover-content.ts';
import { staleSentence } from './handover-data.ts';
import { contradicted } from './handover-moves.ts';
import { personName } from './people.ts';
import { territoriesIn, territoryDraftOf, type TerritoryState } from './territory-state.ts';

/** Handover lists as pages and the API are given them. */

/** The lists of a sheet, the newest first. */
export async function handoverNotes(db: Db, now: TerritoryState): Promise<HandoverNote[]> {
	const counts = await countMoves(db, now.sheet.id);
	const rows = await listHandovers(db, now.sheet.id);
	return rows.map((row) => noteOf(row, now, counts));
}

function noteOf(
	row: HandoverRow,
	now: TerritoryState,
	counts: readonly StateCount[],
): HandoverNote {
	const own = counts.filter(({ handover_id }) => handover_id === row.id);
	const inState = (state: string) => Number(own.find((count) => count.state === state)?.moves ?? 0);
	return {
		number: row.number,
		proposal: { number: row.proposal_number, name: row.proposal_name },
		effectiveOn: row.effective_on,
		state: row.state,
		stale: staleSentence(row, now),
		moves: own.reduce((sum, { moves }) => sum + Number(moves), 0),
		proposed: inState('proposed'),
		accepted: inState('accepted'),
		disputed: inState('disputed'),
		createdAt: row.created_at.toISOString(),
		createdBy: personName(row),
		approvedAt: row.approved_at?.toISOString() ?? null,
		approvedBy: personName({ by_name: row.approver_name, by_email: row.approver_email }),
	};
}

/** One list with its moves, who is concerned and what became of their letters. */
export async function handoverView(
	db: Db,
	row: HandoverRow,
	now: TerritoryState,
): Promise<Handover> {
	const moves = await readMoves(db, row.id);
	const letters = await readLetters(db, row.id);
	const counts = await countMoves(db, now.sheet.id);
	const seen = handoverDigest(now.sheet.number, row, moves);
	const adrift = new Set(row.state === 'open' ? contradicted(moves, now.document) : []);
	return {
		...noteOf(row, now, counts),
		sheet: { number: now.sheet.number, name: now.sheet.name },
		note: row.note,
		measures: row.measures,
		moves: moves.map((move) => moveView(move, adrift.has(move.ordinal))),
		territories: concerned(moves, await contacts(db, row, now), letters),
		digest: row.digest,
		intact: row.digest === null ? null : row.digest === seen,
		seen,
	};
}

const moveView = (move: Row<'handover_moves'>, adrift: boolean): HandoverMove => ({
	ordinal: move.ordinal,
	region: { key: move.region_key, name: move.region_name },
	from: move.from_key === null ? null : { key: move.from_key, name: move.from_name ?? '' },
	to: { key: move.to_key, name: move.to_name },
	figures: move.figures,
	reason: move.reason,
	state: move.state,
	word: move.word,
	by: move.changed_by,
	changedAt: move.changed_at.toISOString(),
	contradicted: adrift,
});

/** Who is reached where, by territory: as they stand now, and as they were for one that has closed since. */
async function contacts(
	db: Db,
	{ before_revision }: HandoverRow,
	{ sheet, document }: TerritoryState,
): Promise<Map<string, TerritoryEntry>> {
	const before = territoriesIn(await territoryDraftOf(db, sheet.id, before_revision));
	return new Map([...before.territories, ...document.territories].map((one) => [one.key, one]));
}

/** The territories that gain or lose, by name, with the letter that counts for each. */
function concerned(
	moves: readonly Row<'handover_moves'>[],
	entries: ReadonlyMap<string, TerritoryEntry>,
	letters: readonly Row<'handover_letters'>[],
): HandoverTerritory[] {
	const found = new Map<string, HandoverTerritory>();
	const entry = (key: string, name: string): HandoverTerritory => {
		const known = found.get(key);
		if (known) return known;
		const { person = '', email = '' } = entries.get(key) ?? {};
		const letter = letters.find(({ territory_key }) => territory_key === key);
		const made = { key, name, person, email, gains: 0, losses: 0, balance: {} };
		found.set(key, { ...made, letter: letter ? letterView(letter) : null });
		return entry(key, name);
	};
	for (const { from_key, from_name, to_key, to_name, figures } of moves) {
		add(entry(to_key, to_name), 1, figures);
		if (from_key !== null) add(entry(from_key, from_name ?? ''), -1, figures);
	}
	return [...found.values()].sort((a, b) => a.name.localeCompare(b.name, 'en'));
}

function add(territory: HandoverTerritory, sign: 1 | -1, figures: Record<string, number>): void {
	if (sign > 0) territory.gains += 1;
	else territory.losses += 1;
	for (const [measure, value] of Object.entries(figures)) {
		territory.balance[measure] = (territory.balance[measure] ?? 0) + sign * value;
	}
}

const letterView = (letter: Row<'handover_letters'>): HandoverLetter => ({
	state: letterState(letter),
	email: letter.email,
	withFigures: letter.with_figures,
	at: (letter.sent_at ?? letter.created_at).toISOString(),
	expiresAt: letter.expires_at.toISOString(),
	failure: letter.failure,
});

function letterState(letter: Row<'handover_letters'>): HandoverLetter['state'] {
	if (letter.revoked_at) return 'ended';
	if (letter.answered_at) return 'answered';
	if (!letter.sent_at) return letter.failure === null ? 'on its way' : 'failed';
	return letter.expires_at.getTime() <= Date.now() ? 'expired' : 'sent';
}

/** A letter that has been answered or still can be; one on its way counts for ten minutes. */
export function worksStill({ state, at }: HandoverLetter): boolean {
	if (state === 'on its way') return Date.now() - Date.parse(at) < 600_000;
	return state === 'sent' || state === 'answered';
}
