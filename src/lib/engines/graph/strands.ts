import { buildGraph } from './build-graph.ts';
import type { RegionGraph } from './region-graph.ts';
import { isPlanar } from './left-right-test.ts';

/** A chain of borders that acts as one edge: its vertices in order, ends included. */
export type Strand = number[];

export const isFlat = (strands: Strand[]) => isPlanar(graphOf(strands));

/** The graph in which each strand is one edge. */
function graphOf(strands: Strand[]): RegionGraph {
	const numbers = new Map<number, number>();
	const number = (v: number) => {
		if (!numbers.has(v)) numbers.set(v, numbers.size);
		return numbers.get(v) as number;
	};
	const a = strands.map((strand) => number(strand[0]));
	const b = strands.map((strand) => number(strand[strand.length - 1]));
	return buildGraph(numbers.size, a, b);
}

/**
 * The same up to planarity: loose ends taken off, strands that meet at a vertex of degree 2 joined,
 * and of strands with the same ends only the shortest kept.
 */
export function tidied(strands: Strand[]): Strand[] {
	for (let before = Infinity; strands.length < before;) {
		before = strands.length;
		strands = withoutTwins(joinedAtTwos(withoutLooseEnds(strands)));
	}
	return strands;
}

function atEnds(strands: Strand[]): Map<number, Strand[]> {
	const at = new Map<number, Strand[]>();
	for (const strand of strands) {
		for (const end of [strand[0], strand[strand.length - 1]]) {
			const list = at.get(end);
			if (list) list.push(strand);
			else at.set(end, [strand]);
		}
	}
	return at;
}

function withoutLooseEnds(strands: Strand[]): Strand[] {
	const at = atEnds(strands);
	const gone = new Set<Strand>();
	const loose = [...at.keys()].filter((v) => at.get(v)?.length === 1);
	while (loose.length > 0) {
		const v = loose.pop() as number;
		const strand = at.get(v)?.find((other) => !gone.has(other));
		if (!strand) continue;
		gone.add(strand);
		const other = strand[0] === v ? strand[strand.length - 1] : strand[0];
		if (at.get(other)?.filter((left) => !gone.has(left)).length === 1) loose.push(other);
	}
	return strands.filter((strand) => !gone.has(strand));
}

/** Joins pairs of strands; a strand takes part once a round, and rounds are repeated by `tidied`. */
function joinedAtTwos(strands: Strand[]): Strand[] {
	const used = new Set<Strand>();
	const joined: Strand[] = [];
	for (const [v, list] of atEnds(strands)) {
		const [left, right] = list;
		if (list.length !== 2 || left === right || used.has(left) || used.has(right)) continue;
		used.add(left);
		used.add(right);
		const from = left[0] === v ? left.slice().reverse() : left;
		const onwards = right[0] === v ? right : right.slice().reverse();
		const strand = [...from, ...onwards.slice(1)];
		if (strand[0] !== strand[strand.length - 1]) joined.push(strand);
	}
	return [...joined, ...strands.filter((strand) => !used.has(strand))];
}

function withoutTwins(strands: Strand[]): Strand[] {
	const best = new Map<string, Strand>();
	for (const strand of strands) {
		const [a, b] = [strand[0], strand[strand.length - 1]];
		const name = a < b ? `${a} ${b}` : `${b} ${a}`;
		const other = best.get(name);
		if (!other || strand.length < other.length) best.set(name, strand);
	}
	return [...best.values()];
}
