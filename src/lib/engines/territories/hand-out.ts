import type { SearchTerms } from './search-terms.ts';

/**
 * Gives units without a territory (-1) to bordering ones that may take them: the territory emptiest
 * against its targets goes first, and takes the unit with the most neighbours among its own. Units that
 * no territory reaches stay at -1. Units of one block go together.
 */
export function handOut(terms: SearchTerms, assignment: Int32Array): void {
	const { territories } = terms.prepared;
	const fill = fillOf(terms, assignment);
	const edges: Set<number>[] = Array.from({ length: territories }, () => new Set());
	for (let unit = 0; unit < assignment.length; unit++) {
		if (assignment[unit] < 0) noteEdges(terms, assignment, unit, edges);
	}
	for (;;) {
		let t = -1;
		for (let i = 0; i < territories; i++) {
			if (edges[i].size > 0 && (t < 0 || fill[i] < fill[t])) t = i;
		}
		if (t < 0) return;
		const unit = closest(terms, assignment, edges[t], t);
		edges[t].delete(unit);
		if (assignment[unit] >= 0 || !blockMayEnter(terms, assignment, unit, t)) continue;
		for (const u of terms.prepared.blocks[terms.prepared.block[unit]]) {
			assignment[u] = t;
			fill[t] += share(terms, u, t);
			noteFree(terms, assignment, u, edges[t]);
		}
	}
}

/** Load of each territory over its target, the largest over the measures; units where none is bound. */
function fillOf(terms: SearchTerms, assignment: Int32Array): Float64Array {
	const fill = new Float64Array(terms.prepared.territories);
	assignment.forEach((t, unit) => {
		if (t >= 0) fill[t] += share(terms, unit, t);
	});
	return fill;
}

function share({ prepared }: SearchTerms, unit: number, t: number): number {
	const { bound, loads, units, targets, territories } = prepared;
	if (bound.length === 0) return 1;
	let sum = 0;
	for (let m = 0; m < bound.length; m++) {
		const target = targets[m * territories + t];
		if (target > 0) sum += loads[m * units + unit] / target;
	}
	return sum;
}

function noteEdges(terms: SearchTerms, assignment: Int32Array, unit: number, edges: Set<number>[]) {
	const { offsets, targets } = terms.prepared.graph;
	for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
		const t = assignment[targets[i]];
		if (t >= 0 && mayEnter(terms, unit, t)) edges[t].add(unit);
	}
}

function noteFree(
	terms: SearchTerms,
	assignment: Int32Array,
	unit: number,
	edge: Set<number>,
): void {
	const { offsets, targets } = terms.prepared.graph;
	const t = assignment[unit];
	for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
		const other = targets[i];
		if (assignment[other] < 0 && mayEnter(terms, other, t)) edge.add(other);
	}
}

const mayEnter = ({ row, may, prepared }: SearchTerms, unit: number, t: number) =>
	may[row[unit] * prepared.territories + t] === 1;

function blockMayEnter(
	terms: SearchTerms,
	assignment: Int32Array,
	unit: number,
	t: number,
): boolean {
	const { block, blocks } = terms.prepared;
	return blocks[block[unit]].every(
		(u) => mayEnter(terms, u, t) && !terms.apart[u]?.some((other) => assignment[other] === t),
	);
}

function closest(
	{ prepared }: SearchTerms,
	assignment: Int32Array,
	edge: Set<number>,
	t: number,
): number {
	const { offsets, targets } = prepared.graph;
	let best = -1;
	let most = -1;
	for (const unit of edge) {
		let own = 0;
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			if (assignment[targets[i]] === t) own++;
		}
		if (own <= most) continue;
		best = unit;
		most = own;
	}
	return best;
}
