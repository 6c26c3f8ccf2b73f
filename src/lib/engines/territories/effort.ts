import type { Prepared } from './prepare.ts';

/** What a run may spend, in proposals and regions. */
export interface Budget {
	/** annealings of the whole from the start, each with its own scale of temperatures */
	starts: number;
	proposals: number;
	/** regional annealings after each start and, of the best, at the end; proposals of each */
	regions: number;
	lastRegions: number;
	regionProposals: number;
}

/** The budget of an effort for the size of the problem. */
export function budgetOf({ problem, units, territories }: Prepared): Budget {
	const share = { quick: 0.25, normal: 1, thorough: 4 }[problem.effort];
	const starts = { quick: 1, normal: 3, thorough: 6 }[problem.effort];
	return {
		starts,
		proposals: Math.round(Math.min(4_000_000, Math.max(20_000, 1500 * units)) * Math.sqrt(share)),
		regions: Math.round(territories * share),
		lastRegions: Math.round(4 * territories * share),
		regionProposals: Math.min(40_000, Math.max(4000, 150 * units)),
	};
}
