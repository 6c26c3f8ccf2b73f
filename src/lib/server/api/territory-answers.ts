import type {
	DeskProposal,
	DeskTerritories,
	ProposalNote,
	ProposalOutcome,
} from '../../schemas/desk-territories.ts';
import { deviationsByKey, reliefByKey, type PlanKeys } from '../jobs/checks/keyed-plan.ts';
import { assignmentByKey } from '../services/plan-names.ts';
import type { StoredResult } from '../services/proposal-result.ts';

/** A team's territories and proposals as programs see them: regions and territories by key. */

export const territoriesAnswer = ({
	revision,
	savedAt,
	savedBy,
	draft,
	inks,
	inkNote,
}: DeskTerritories) => ({ revision, savedAt, savedBy, document: draft, inks, inkNote });

/** What the list tells of one. */
export function proposalNoteAnswer(note: ProposalNote) {
	const { number, name, state, step, share, createdAt, createdBy } = note;
	const { wishes, revision, stale, sentence } = note;
	return {
		...{ number, name, state, step, share, createdAt, createdBy },
		...{ wishes, revision, stale, sentence },
	};
}

export function proposalAnswer(
	opened: DeskProposal,
	result: StoredResult | null,
	regions: readonly string[],
) {
	const { territoryKeys: territories, assignment, today, outcome } = opened;
	const keys: PlanKeys = { units: regions, territories, measures: result?.measures ?? [] };
	const compulsory = new Set(result?.compulsory);
	const moves = (assignment ?? []).flatMap((to, region) =>
		to === today[region]
			? []
			: [
					{
						region: regions[region],
						from: territories[today[region]] ?? null,
						to: territories[to],
						compulsory: compulsory.has(region),
					},
				],
	);
	return {
		...proposalNoteAnswer(opened),
		outcome: outcome && result ? outcomeByKey(keys, outcome) : null,
		assignment: assignment && assignmentByKey(regions, territories, assignment),
		moves,
		deviations: deviationsByKey(keys, result?.deviations ?? []),
	};
}

const outcomeByKey = (keys: PlanKeys, outcome: ProposalOutcome) => ({
	...outcome,
	relief: outcome.relief.map((one) => ({ ...reliefByKey(keys, one), sentence: one.sentence })),
	witness: outcome.witness && {
		regions: outcome.witness.regions.map((region) => keys.units[region]),
		territories: outcome.witness.territories.map((territory) => keys.territories[territory]),
	},
});
