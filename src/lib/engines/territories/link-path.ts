import type { SearchTerms } from './search-terms.ts';

/**
 * Joins `part` to the rest of `territory` (or, at -1, to whichever territory may take all of it) by
 * giving that territory the cheapest path of free units in between, if that costs at most `most`.
 * The units of path and part are noted in `links`. Bordering territories may be torn by it: the caller
 * looks again. A part at -1 is put into the territory it reaches.
 *
 * Source of the method: E. W. Dijkstra, A Note on Two Problems in Connexion with Graphs (1959), over
 * units, each weighted with its cost.
 */
export function linkPath(
	terms: SearchTerms,
	assignment: Int32Array,
	links: Uint8Array,
	part: readonly number[],
	territory: number,
	most = Infinity,
): boolean {
	const { prepared } = terms;
	const goals =
		territory >= 0 ? [territory] : Array.from({ length: prepared.territories }, (_, t) => t);
	let best: { path: number[]; cost: number; goal: number } | null = null;
	for (const goal of goals) {
		if (territory < 0 && !part.every((unit) => mayEnter(terms, unit, goal))) continue;
		const found = cheapest(terms, assignment, links, part, goal, best?.cost ?? most);
		if (found) best = { ...found, goal };
	}
	if (!best) return false;
	for (const unit of best.path) {
		for (const u of prepared.blocks[prepared.block[unit]]) {
			assignment[u] = best.goal;
			links[u] = 1;
		}
	}
	for (const unit of part) {
		assignment[unit] = best.goal;
		links[unit] = 1;
	}
	return true;
}

const mayEnter = ({ row, may, prepared }: SearchTerms, unit: number, t: number) =>
	may[row[unit] * prepared.territories + t] === 1;

/** The cheapest path from `part` to a unit of `goal` outside it, cheaper than `most`. */
function cheapest(
	terms: SearchTerms,
	assignment: Int32Array,
	links: Uint8Array,
	part: readonly number[],
	goal: number,
	most: number,
): { path: number[]; cost: number } | null {
	const { offsets, targets } = terms.prepared.graph;
	const reached = new Map<number, { cost: number; from: number }>();
	for (const unit of part) reached.set(unit, { cost: 0, from: -1 });
	const isPart = new Set(part);
	const open = new Set(part);
	while (open.size > 0) {
		let unit = -1;
		let cost = Infinity;
		for (const candidate of open) {
			const known = (reached.get(candidate) as { cost: number }).cost;
			if (known < cost) [unit, cost] = [candidate, known];
		}
		open.delete(unit);
		if (cost >= most) return null;
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			const next = targets[i];
			if (isPart.has(next)) continue;
			if (assignment[next] === goal) return { path: pathTo(reached, unit, isPart), cost };
			if (!terms.movable[next] || links[next] || !mayEnter(terms, next, goal)) continue;
			const known = reached.get(next)?.cost ?? Infinity;
			const through = cost + terms.prepared.cost[next] + 1e-9;
			if (through >= known) continue;
			reached.set(next, { cost: through, from: unit });
			open.add(next);
		}
	}
	return null;
}

function pathTo(
	reached: Map<number, { cost: number; from: number }>,
	end: number,
	isPart: Set<number>,
): number[] {
	const path: number[] = [];
	for (let unit = end; unit >= 0 && !isPart.has(unit);) {
		path.push(unit);
		unit = (reached.get(unit) as { from: number }).from;
	}
	return path;
}
