import type { Wishes } from '../../engines/territories/territory-draft.ts';
import type { ProposalNote } from '../../schemas/desk-territories.ts';
import type { Db } from '../database/connection.ts';
import {
	listProposals,
	type ProposalNoteRow,
	type ProposalRecord,
} from '../repositories/proposals.repository.ts';
import { personName } from './people.ts';
import { dataParts, whatChanged } from './proposal-data.ts';
import type { StoredFailure, StoredRequest, StoredResult } from './proposal-result.ts';
import type { TerritoryState } from './territory-state.ts';

/** Proposals as lists and comparisons show them. */

export const requestOf = ({ request }: Pick<ProposalRecord, 'request'>): StoredRequest =>
	request as unknown as StoredRequest;

export const resultOf = ({
	result,
}: Pick<ProposalRecord, 'result'>): StoredResult | StoredFailure | null =>
	result as StoredResult | StoredFailure | null;

/** Every proposal of the sheet that was not dropped, the newest first. */
export async function proposalNotes(db: Db, state: TerritoryState): Promise<ProposalNote[]> {
	const stale = staleness(state);
	return (await listProposals(db, state.sheet.id)).map((row) => noteOf(row, stale));
}

export const noteOf = (
	row: ProposalNoteRow,
	stale: (row: Pick<ProposalRecord, 'state' | 'request'>) => string | null,
): ProposalNote => noteFrom(row, requestOf(row).wishes, resultOf(row), stale(row));

export function noteFrom(
	row: Omit<ProposalNoteRow, 'request' | 'result'>,
	wishes: Wishes,
	result: StoredResult | StoredFailure | null,
	stale: string | null,
): ProposalNote {
	return {
		number: row.number,
		name: row.name,
		state: row.state,
		step: row.step,
		share: row.share,
		createdAt: row.created_at.toISOString(),
		createdBy: personName(row),
		wishes,
		revision: row.revision,
		stale,
		sentence: sentenceOf(row, result),
		outcome: result?.outcome ?? null,
	};
}

/** Tells of proposals what they were computed from and has changed since. */
export function staleness(
	state: TerritoryState,
): (row: Pick<ProposalRecord, 'state' | 'request'>) => string | null {
	const now = presentParts(state);
	return (row) => {
		const isOver = !['kept', 'impossible', 'undecided'].includes(row.state);
		const { wishes, parts } = requestOf(row);
		return isOver ? null : whatChanged(parts, now(wishes));
	};
}

/** Digests of the present data for any wishes; each long column is digested once. */
export function presentParts({ sheet, document, ground }: TerritoryState) {
	const everything: Wishes = {
		...document.wishes,
		tolerances: Object.fromEntries(ground.measures.map(({ id }) => [id, 0])),
	};
	let all: ReturnType<typeof dataParts> | undefined;
	return ({ tolerances, cost }: Wishes) => {
		all ??= dataParts(sheet.boundary_set_id, document, ground, everything);
		const wished = new Set([...Object.keys(tolerances), cost]);
		const measures = Object.entries(all.measures).filter(([id]) => wished.has(id));
		return { ...all, measures: Object.fromEntries(measures) };
	};
}

function sentenceOf(
	{ state, step }: Pick<ProposalNoteRow, 'state' | 'step'>,
	result: StoredResult | StoredFailure | null,
): string {
	if (state === 'waiting') return 'Waits for its turn.';
	if (state === 'running') return step === '' ? 'Being worked out.' : `Being worked out: ${step}.`;
	if (state === 'cancelled') return 'Stopped before it was done.';
	return result?.sentence ?? 'It could not be worked out because of a fault here.';
}
