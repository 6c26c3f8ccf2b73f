import type { RegionGraph } from '../graph/region-graph.ts';
import { partsOf } from './parts-of.ts';
import type { Territory } from './problem.ts';

/** A territory that is not in one piece. */
export interface Torn {
	territory: number;
	/**
	 * units of each part, ascending; the first part is the rooted one (empty when the base lies in
	 * another territory and touches none of this one), the others by their lowest unit
	 */
	parts: number[][];
}

/**
 * The territories that are torn under an assignment, ascending.
 *
 * The rooted part holds the base. Where the base lies in another territory (it has yet to move in), the
 * parts that touch it are the rooted part together. Without a base it is the part with the largest load,
 * ties by more units, then by the lowest unit. `load` is one number a unit; absent: units are counted.
 */
export function tornParts(
	graph: RegionGraph,
	assignment: Int32Array,
	territories: readonly Territory[],
	load: Float64Array | null = null,
): Torn[] {
	const { of, territory, units } = partsOf(graph, assignment);
	const parts: number[][] = territories.map(() => []);
	territory.forEach((t, part) => {
		if (t >= 0) parts[t].push(part);
	});
	const torn: Torn[] = [];
	territories.forEach(({ base }, t) => {
		const rooted =
			base < 0
				? heaviest(parts[t], units, load)
				: assignment[base] === t
					? [of[base]]
					: touching(graph, base, assignment, of, t);
		const others = parts[t].filter((part) => !rooted.includes(part));
		if (others.length === 0) return;
		const first = rooted.flatMap((part) => units[part]).sort((a, b) => a - b);
		torn.push({ territory: t, parts: [first, ...others.map((part) => units[part])] });
	});
	return torn;
}

function heaviest(parts: number[], units: number[][], load: Float64Array | null): number[] {
	let best = -1;
	let most = -Infinity;
	for (const part of parts) {
		const weight = load ? units[part].reduce((sum, u) => sum + load[u], 0) : units[part].length;
		const tied = weight === most && units[part].length > units[best].length;
		if (weight > most || tied) {
			best = part;
			most = weight;
		}
	}
	return best < 0 ? [] : [best];
}

function touching(
	{ offsets, targets }: RegionGraph,
	base: number,
	assignment: Int32Array,
	of: Int32Array,
	territory: number,
): number[] {
	const parts = new Set<number>();
	for (let i = offsets[base]; i < offsets[base + 1]; i++) {
		if (assignment[targets[i]] === territory) parts.add(of[targets[i]]);
	}
	return [...parts];
}
