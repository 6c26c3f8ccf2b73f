import { type Board } from './board.ts';
import { Chains } from './chains.ts';
import type { MoveSettings } from './even-use.ts';
import { Random } from './random.ts';

const longestChain = 200;

/**
 * Raises the mean distance between the inks of neighbours, weighted by shared metres, by chain
 * exchanges under falling temperature; the best board met is kept. Returns the mean, or 0 without
 * metres.
 *
 * Source: S. Kirkpatrick, C. Gelatt, M. Vecchi, Optimization by simulated annealing, Science 220 (1983);
 * chains as moves: C. Morgenstern, H. Shapiro, SODA 1990.
 */
export function distinctNeighbours(
	board: Board,
	metres: Float64Array,
	distances: readonly (readonly number[])[],
	{ moves, seed, cancelled }: MoveSettings,
): number {
	const { graph, ink, inks } = board;
	const chains = new Chains(board);
	const random = new Random(seed);
	const start = hottest(metres, distances);
	let value = 0;
	let best = 0;
	const kept = ink.slice();
	for (let move = 0; move < moves && inks > 1; move++) {
		if ((move & 1023) === 0) {
			if (cancelled?.()) break;
			if (value > best) {
				best = value;
				kept.set(ink);
			}
		}
		const v = random.below(graph.count);
		const c = ink[v];
		const d = random.below(inks);
		if (c === d) continue;
		const chain = chains.chain(v, d, longestChain);
		if (!chain) continue;
		const gain = gainOf(board, chain, c, d, metres, distances);
		const heat = start * (1 - move / moves);
		if (gain < 0 && random.below(1_000_000) >= 1_000_000 * Math.exp(gain / heat)) continue;
		chains.turn(c, d);
		value += gain;
	}
	if (value < best) restore(board, kept);
	return meanDistance(board, metres, distances);
}

function restore(board: Board, kept: Int32Array): void {
	board.ink.set(kept);
	board.use.fill(0);
	for (const c of kept) board.use[c]++;
}

/** About what an ordinary border is worth: its metres times the spread of distances. */
function hottest(metres: Float64Array, distances: readonly (readonly number[])[]): number {
	const all = distances.flat();
	const spread = Math.max(...all) - Math.min(...all.filter((distance) => distance > 0), 0);
	const total = metres.reduce((sum, length) => sum + length, 0);
	return (0.2 * spread * total) / Math.max(1, metres.length);
}

/** Only borders between the chain and vertices of a third ink change. */
function gainOf(
	{ graph, ink }: Board,
	chain: Uint32Array,
	c: number,
	d: number,
	metres: Float64Array,
	distances: readonly (readonly number[])[],
): number {
	const { offsets, targets } = graph;
	let gain = 0;
	for (const v of chain) {
		const now = distances[ink[v]];
		const then = distances[ink[v] === c ? d : c];
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const other = ink[targets[e]];
			if (other !== c && other !== d) gain += metres[e] * (then[other] - now[other]);
		}
	}
	return gain;
}

function meanDistance(
	{ graph, ink }: Board,
	metres: Float64Array,
	distances: readonly (readonly number[])[],
): number {
	let total = 0;
	let weighted = 0;
	for (let v = 0; v < graph.count; v++) {
		for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
			total += metres[e];
			weighted += metres[e] * distances[ink[v]][ink[graph.targets[e]]];
		}
	}
	return total > 0 ? weighted / total : 0;
}
