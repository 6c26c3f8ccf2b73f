import type { PlanSaved, PlanStale } from '$lib/schemas/desk-territories';
import { postJson, type SaveDraft, type Saved } from './save-draft';

/** Territory of every region, as an index into the proposal's own list. */
export type PlanOfRegions = readonly number[];

/** What the server answers when a plan was saved, in the terms of a draft. */
export interface PlanAnswer extends Saved<PlanOfRegions> {
	note: PlanSaved['note'];
	inks: PlanSaved['inks'];
	changedInks: PlanSaved['changedInks'];
}

/** Saves edits by hand by `POST {address}`; somebody else's plan comes back when they were first. */
export const savePlanTo =
	(address: string, fetcher: typeof fetch = fetch): SaveDraft<PlanOfRegions, PlanAnswer> =>
	async (revision, document) => {
		const answer = await postJson<PlanSaved, PlanStale>(
			address,
			{ revision, assignment: document },
			fetcher,
		);
		const savedAt = new Date().toISOString();
		if (answer.kind === 'saved') {
			const { revision: next, note, inks, changedInks } = answer.saved;
			return { kind: 'saved', saved: { revision: next, savedAt, note, inks, changedInks } };
		}
		if (answer.kind === 'stale') {
			const { revision: theirs, assignment } = answer.stale;
			return {
				kind: 'stale',
				stale: { revision: theirs, savedBy: null, savedAt, document: assignment },
			};
		}
		return answer;
	};

/** Two people edited one plan: where I moved a region mine stands, elsewhere theirs. */
export function rebasePlan(
	nameOf: (region: number) => string,
): (
	base: PlanOfRegions,
	mine: PlanOfRegions,
	theirs: PlanOfRegions,
) => { draft: PlanOfRegions; both: string[] } {
	return (base, mine, theirs) => {
		const both: string[] = [];
		const draft = theirs.map((their, region) => {
			if (mine[region] === base[region]) return their;
			if (their !== base[region] && their !== mine[region]) both.push(nameOf(region));
			return mine[region];
		});
		return { draft, both };
	};
}
