import type { Prepared } from './prepare.ts';

/** What a run may spend, in proposals and regions. */
export interface Budget {
	/** too large to be annealed as a whole: surplus is carried in streams first */
	large: boolean;
	/** annealings of the whole from the start, each with its own scale of temperatures */
	starts: number;
	proposals: number;
	/** regional annealings after each start and, of the best, at the end; proposals of each */
	regions: number;
	lastRegions: number;
	regionProposals: number;
	/** further tries where territories are outside tolerance to the last */
	rescues: number;
}

const LARGE = 8000;

/** The budget of an effort for the size of the problem. */
export function budgetOf({ problem, units, territories }: Prepared): Budget {
	const share = { quick: 0.25, normal: 1, thorough: 4 }[problem.effort];
	const large = units > LARGE;
	const starts = large ? 1 : { quick: 2, normal: 3, thorough: 6 }[problem.effort];
	const most = large ? 8_000_000 : 4_000_000;
	return {
		large,
		rescues: 4 * starts,
		starts,
		proposals: Math.round(Math.min(most, Math.max(20_000, 1500 * units)) * Math.sqrt(share)),
		regions: large ? 0 : Math.round(territories * share),
		lastRegions: Math.round(4 * territories * share),
		regionProposals: Math.min(40_000, Math.max(4000, 150 * units)),
	};
}
