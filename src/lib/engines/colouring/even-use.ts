import type { Board } from './board.ts';
import { Chains } from './chains.ts';
import { Random } from './random.ts';

export interface MoveSettings {
	moves: number;
	seed: number;
	cancelled?: () => boolean;
}

/** Chains longer than this seldom help, and cost. */
const longestChain = 2_000;

/**
 * Evens out what the inks carry by chain exchanges from heavier to lighter inks, each taken only when
 * it lowers the sum of squared differences from the mean load. Returns that sum. Ends early when loads
 * differ by no more than the lightest vertex, where by count nothing better exists.
 */
export function evenUse(board: Board, weights: Float64Array, settings: MoveSettings): number {
	const { graph, ink, inks } = board;
	const load = new Float64Array(inks);
	for (let v = 0; v < graph.count; v++) load[ink[v]] += weights[v];
	const chains = new Chains(board);
	const random = new Random(settings.seed);
	const least = weights.reduce((low, weight) => Math.min(low, weight), Infinity);
	for (let move = 0; move < settings.moves && inks > 1; move++) {
		if ((move & 1023) === 0) {
			const spread = Math.max(...load) - Math.min(...load);
			if (spread <= least || settings.cancelled?.()) break;
		}
		const v = random.below(graph.count);
		const c = ink[v];
		const d = random.below(inks);
		if (load[d] >= load[c]) continue;
		const chain = chains.chain(v, d, longestChain);
		if (!chain) continue;
		const shift = shiftOf(chain, c, ink, weights);
		if (shift <= 0 || shift >= load[c] - load[d]) continue;
		chains.turn(c, d);
		load[c] -= shift;
		load[d] += shift;
	}
	const mean = load.reduce((sum, one) => sum + one, 0) / inks;
	return load.reduce((sum, one) => sum + (one - mean) ** 2, 0);
}

/** What ink c would give to the other ink of the chain. */
function shiftOf(chain: Uint32Array, c: number, ink: Int32Array, weights: Float64Array): number {
	let shift = 0;
	for (const w of chain) shift += ink[w] === c ? weights[w] : -weights[w];
	return shift;
}
