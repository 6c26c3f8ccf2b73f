import { ProgramBuilder } from '../solver/program-builder.ts';
import { solveProgram } from '../solver/program.ts';
import type { SearchState } from './search-state.ts';

/** How many mean units of `from` should pass to `to`, which borders on it. */
export interface Stream {
	from: number;
	to: number;
	units: number;
}

/** What a mean unit outside tolerance costs against one unit passed on: more than any way is long. */
const OUTSIDE = 1000;

/**
 * The least stream of units between neighbouring territories that brings every load within tolerance,
 * or as near to it as streams can, by a linear program: a stream from a territory carries the mean unit
 * of that territory in every measure. The bands are shrunk by `margin` of the target on either side.
 */
export async function leastStreams(state: SearchState, margin: number): Promise<Stream[]> {
	const { prepared, perUnit } = state.terms;
	const pairs = borderingPairs(state);
	const program = new ProgramBuilder();
	for (let i = 0; i < pairs.length; i++) program.real(1);
	const touching: number[][] = Array.from({ length: prepared.territories }, () => []);
	pairs.forEach(([from, to], column) => {
		touching[from].push(column);
		touching[to].push(column);
	});
	for (let m = 0; m < perUnit.length; m++) {
		const scale = perUnit[m];
		if (scale === 0) continue;
		for (let t = 0; t < prepared.territories; t++) {
			if (!prepared.open[t]) continue;
			const at = m * prepared.territories + t;
			const [low, high] = band(state, at, margin);
			const over = program.real(OUTSIDE);
			const under = program.real(OUTSIDE);
			const carried = touching[t].map((column) => {
				const [from] = pairs[column];
				const mean = (state.loads[m * prepared.territories + from] / state.sizes[from]) * scale;
				return from === t ? -mean : mean;
			});
			const load = state.loads[at];
			const columns = [...touching[t], over, under];
			program.row((low - load) * scale, (high - load) * scale, columns, [...carried, -1, 1]);
		}
	}
	const outcome = await solveProgram(program.build());
	if (outcome.status !== 'optimal') return [];
	return pairs
		.map(([from, to], i) => ({ from, to, units: outcome.values[i] }))
		.filter(({ units }) => units > 0.01);
}

function band({ terms }: SearchState, at: number, margin: number): [number, number] {
	const { least, greatest, targets } = terms.prepared;
	const room = Math.min(margin * targets[at], (greatest[at] - targets[at]) * 0.5);
	return [least[at] + room, greatest[at] - room];
}

/** Ordered pairs of open territories that border on each other. */
function borderingPairs({ assignment, terms }: SearchState): [number, number][] {
	const { graph, territories, open } = terms.prepared;
	const seen = new Set<number>();
	for (let unit = 0; unit < graph.count; unit++) {
		const from = assignment[unit];
		if (!open[from]) continue;
		for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
			const to = assignment[graph.targets[i]];
			if (to !== from && open[to]) seen.add(from * territories + to);
		}
	}
	const pairs = [...seen].sort((a, b) => a - b);
	return pairs.map((pair) => [Math.floor(pair / territories), pair % territories]);
}
