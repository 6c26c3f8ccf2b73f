import type { Wishes } from '../../engines/territories/territory-draft.ts';
import type { ProposalOutcome } from '../../schemas/desk-territories.ts';
import type { MadePlan, RebalanceOutcome } from '../jobs/rebalance.work.ts';
import type { DataParts } from './proposal-data.ts';
import { impossibleSentence, inWords, planSentence, reliefSentence } from './proposal-words.ts';

/** What a proposal was asked for, as its row keeps it. */
export interface StoredRequest {
	wishes: Wishes;
	/** digests of what it was computed from */
	parts: DataParts;
}

/** What came of it, as its row keeps it: ready to be shown, with names as they were. */
export interface StoredResult {
	status: RebalanceOutcome['status'];
	sentence: string;
	outcome: ProposalOutcome;
	/** measure ids, in the order of `deviations` */
	measures: string[];
	/** for each measure, deviation of each territory; null for one that closes */
	deviations: (number | null)[][];
	/** regions by number whose move is compulsory */
	compulsory: number[];
}

/** Why there is none, when working it out failed. */
export interface StoredFailure {
	status: 'failed';
	sentence: string;
	outcome: null;
}

/** What numbers stand for in sentences. */
export interface PlanNames {
	regions: readonly string[];
	territories: readonly string[];
	/** in the problem's order, with their ids */
	measures: readonly { id: string; name: string }[];
	/** name of the measure by which moves are counted; null for regions */
	cost: string | null;
}

/** What the engine answered, as it is stored. */
export function storedResult(
	answer: RebalanceOutcome,
	wishes: Wishes,
	names: PlanNames,
): StoredResult {
	if (answer.status === 'impossible') return impossibleResult(answer, wishes, names);
	const { plan, lowerBound } = answer;
	const proved = answer.status === 'proposed' && answer.proved;
	if (plan) {
		const result = planResult(plan, { lowerBound, proved }, wishes, names);
		if (answer.status === 'proposed') return result;
		return { ...result, status: 'undecided', sentence: inWords(answer.message, names) };
	}
	const sentence = answer.status === 'undecided' ? inWords(answer.message, names) : '';
	const outcome = { ...blank, lowerBound };
	return { ...{ status: 'undecided', sentence, outcome }, ...empty(names) };
}

/** A plan with its figures, whoever made it. */
export function planResult(
	plan: MadePlan,
	bound: { lowerBound: number; proved: boolean },
	wishes: Wishes,
	names: PlanNames,
): StoredResult {
	const outcome: ProposalOutcome = {
		...{ moved: plan.moved, cost: plan.cost, compulsoryCost: plan.compulsoryCost },
		compulsory: plan.compulsory.length,
		lowerBound: bound.lowerBound,
		proved: bound.proved,
		cutBorders: plan.cutBorders,
		...spreadOf(plan.deviations, names, wishes),
		faults: plan.faults.map((fault) => inWords(fault, names)),
		misses: plan.misses.map((miss) => inWords(miss, names)),
		...{ reason: null, relief: [], witness: null },
	};
	const measures = names.measures.map(({ id }) => id);
	return {
		...{ status: 'proposed', outcome, measures },
		sentence: planSentence(outcome, wishes, names),
		deviations: plan.deviations,
		compulsory: plan.compulsory,
	};
}

function impossibleResult(
	{ reason, message, relief, witness }: Extract<RebalanceOutcome, { status: 'impossible' }>,
	wishes: Wishes,
	names: PlanNames,
): StoredResult {
	const outcome: ProposalOutcome = {
		...{ ...blank, reason },
		relief: relief.map((one) => ({ ...one, sentence: reliefSentence(one, names) })),
		witness: { regions: witness.units, territories: witness.territories },
	};
	const sentence = impossibleSentence(message, relief, names, wishes);
	return { ...{ status: 'impossible', sentence, outcome }, ...empty(names) };
}

const blank: ProposalOutcome = {
	...{ moved: 0, cost: 0, compulsoryCost: 0, compulsory: 0, lowerBound: 0, proved: false },
	cutBorders: { before: 0, after: 0 },
	...{ largest: {}, mean: {}, outside: 0, faults: [], misses: [] },
	...{ reason: null, relief: [], witness: null },
};

const empty = ({ measures }: PlanNames) => ({
	measures: measures.map(({ id }) => id),
	deviations: [],
	compulsory: [],
});

/** Largest and mean deviation by measure, and how many territories lie outside a tolerance. */
function spreadOf(deviations: (number | null)[][], { measures }: PlanNames, wishes: Wishes) {
	const largest: Record<string, number> = {};
	const mean: Record<string, number> = {};
	const outside = new Set<number>();
	measures.forEach(({ id }, m) => {
		const sizes = deviations[m].flatMap((deviation, t) => {
			if (deviation === null) return [];
			if (Math.abs(deviation) > wishes.tolerances[id] + 1e-9) outside.add(t);
			return [Math.abs(deviation)];
		});
		largest[id] = sizes.reduce((most, size) => Math.max(most, size), 0);
		mean[id] = sizes.reduce((sum, size) => sum + size, 0) / Math.max(1, sizes.length);
	});
	return { largest, mean, outside: outside.size };
}
