import type { ExactLimits } from './exact.ts';
import { mayEndIn, type Prepared } from './prepare.ts';
import type { Watch } from './problem.ts';

/** free blocks, and pairs of a block and a territory, up to which the whole problem is put to the solver */
const MOST_BLOCKS = 150;
const MOST_PAIRS = 1200;

/** Whether the whole problem is small enough to be solved exactly. */
export function isSmall(prepared: Prepared): boolean {
	const { blocks, fixed, territories } = prepared;
	const free = blocks.filter(([unit]) => fixed[unit] < 0);
	if (free.length > MOST_BLOCKS) return false;
	let pairs = 0;
	for (const block of free) {
		for (let t = 0; t < territories; t++) {
			if (block.every((unit) => mayEndIn(prepared, unit, t))) pairs++;
		}
	}
	return pairs <= MOST_PAIRS;
}

const iterations = { quick: 30_000, normal: 300_000, thorough: 1_500_000 };
const rounds = { quick: 10, normal: 40, thorough: 150 };

/** What an exact run may spend, or a share of it. */
export function exactLimits({ problem }: Prepared, watch: Watch, share = 1): ExactLimits {
	return {
		rounds: Math.ceil(rounds[problem.effort] * Math.sqrt(share)),
		iterations: Math.ceil(iterations[problem.effort] * share),
		nodes: 100_000,
		cancelled: watch.cancelled,
	};
}
