import type { RegionGraph } from '../graph/region-graph.ts';
import { Sat, type Budget } from '../solver/sat.ts';

/** A pair of vertices, the smaller number first. */
export type VertexPair = [number, number];

/**
 * The borders of a graph without which it could be coloured with `inks` inks: each border is left out in
 * turn, and for good where what is left still cannot be coloured. `clique` may be coloured beforehand as
 * long as all its borders are kept, since any colouring can be renamed to agree; its own borders come
 * last. Null when the budget does not suffice to show that the graph itself cannot be coloured; once it is
 * spent on the way, the borders that are left are kept.
 */
export function neededBorders(
	graph: RegionGraph,
	inks: number,
	clique: readonly number[],
	ask: (sat: Sat, assumptions: number[]) => ReturnType<Sat['solve']>,
): VertexPair[] | null {
	const switched = new SwitchedBorders(graph, inks);
	const inClique = (e: number) => switched.pairs[e].every((v) => clique.includes(v));
	const coloured = clique.map((v, ink) => v * inks + ink + 1);
	const all = switched.pairs.map((_, e) => e);
	const ofClique = all.filter(inClique);
	const others = all.filter((e) => !inClique(e));
	const first = switched.failing(all, coloured, ask);
	if (!first) return null;
	const kept = switched.sparing([...new Set([...first, ...ofClique])], others, coloured, ask);
	const borders = switched.sparing(kept, ofClique, [], ask);
	return borders.sort((a, b) => a - b).map((e) => switched.pairs[e]);
}

type Ask = (sat: Sat, assumptions: number[], budget?: Budget) => ReturnType<Sat['solve']>;

/** A colouring as clauses in which each border has a switch that must be assumed for it to count. */
class SwitchedBorders {
	readonly pairs: VertexPair[] = [];
	private readonly sat = new Sat();
	private readonly base: number;

	constructor({ count, offsets, targets }: RegionGraph, inks: number) {
		this.base = count * inks;
		for (let i = 0; i < this.base; i++) this.sat.newVariable();
		for (let v = 0; v < count; v++) {
			this.sat.addClause(Array.from({ length: inks }, (_, c) => v * inks + c + 1));
			for (let e = offsets[v]; e < offsets[v + 1]; e++) {
				const w = targets[e];
				if (w <= v) continue;
				this.pairs.push([v, w]);
				const border = this.sat.newVariable();
				for (let c = 1; c <= inks; c++) {
					this.sat.addClause([-border, -(v * inks + c), -(w * inks + c)]);
				}
			}
		}
	}

	/** Borders among those given that suffice; null when they do not or the budget is spent. */
	failing(borders: readonly number[], coloured: readonly number[], ask: Ask): number[] | null {
		const assumptions = [...coloured, ...borders.map((e) => this.base + e + 1)];
		if (ask(this.sat, assumptions) !== 'unsat') return null;
		return this.sat
			.core()
			.flatMap((literal) => (literal > this.base ? [literal - this.base - 1] : []));
	}

	/** Those kept when each of `tries` is left out where it can be. */
	sparing(borders: number[], tries: number[], coloured: readonly number[], ask: Ask): number[] {
		const fixed = new Set(borders.filter((e) => coloured.length > 0 && !tries.includes(e)));
		let kept = borders;
		for (const e of tries) {
			if (!kept.includes(e)) continue;
			const enough = this.failing(
				kept.filter((other) => other !== e),
				coloured,
				ask,
			);
			if (enough) kept = [...new Set([...fixed, ...enough])];
		}
		return kept;
	}
}
