import type { Case } from './explain-case.ts';
import { CaseClauses } from './explain-clauses.ts';
import { around } from './explain-ball.ts';
import type { Purse } from './explain-purse.ts';

const RADII = [1, 2, 3, 5, 8];

/** Demands that clash together with the rules on a part of the map, and that part. */
export interface Clash {
	demands: number[];
	/** the vertices besides the locked ones on which the clash rests */
	vertices: number[];
}

/**
 * Fewer demands that still clash, and a small part of the map on which they do. In the part none of
 * the demands can be spared, unless the purse runs out; on the whole map more may be at work.
 * Method: the smallest ball about the demands in which they clash, then each left out in turn.
 */
export function shrink(of: Case, demands: number[], purse: Purse, seed: number): Clash | null {
	for (const radius of RADII) {
		const part = around(of.graph, startsOf(of, demands), radius);
		const clauses = new CaseClauses(of, part, { seed, switches: true });
		const answer = purse.pay(clauses.sat, (budget) => clauses.solve(demands, budget));
		if (answer === 'unsat') return sparing(clauses, purse);
		if (part.length === of.graph.count) return null;
	}
	return null;
}

const startsOf = ({ demands }: Case, list: number[]) => list.map((d) => demands[d].vertex);

function sparing(clauses: CaseClauses, purse: Purse): Clash {
	let demands = clauses.failedDemands();
	let vertices = clauses.failedVertices();
	for (const d of [...demands]) {
		if (!demands.includes(d) || demands.length === 1) continue;
		const rest = demands.filter((other) => other !== d);
		const answer = purse.pay(clauses.sat, (budget) => clauses.solve(rest, budget));
		if (answer !== 'unsat') continue;
		demands = clauses.failedDemands();
		vertices = clauses.failedVertices();
	}
	return { demands, vertices };
}

/** The part of a clash without any vertex that can be spared, as far as the purse allows. */
export function barePart(of: Case, clash: Clash, purse: Purse, seed: number): number[] {
	const locked = startsOf(of, clash.demands);
	let { vertices } = clash;
	for (let rounds = 0; rounds < 4; rounds++) {
		const clauses = new CaseClauses(of, [...new Set([...locked, ...vertices])], {
			seed: seed + rounds,
			switches: true,
		});
		const answer = purse.pay(clauses.sat, (budget) => clauses.solve(clash.demands, budget));
		if (answer !== 'unsat' || clauses.failedVertices().length >= vertices.length) break;
		vertices = clauses.failedVertices();
	}
	const clauses = new CaseClauses(of, [...new Set([...locked, ...vertices])], { switches: true });
	for (const v of [...vertices]) {
		if (!vertices.includes(v)) continue;
		const rest = vertices.filter((other) => other !== v);
		const answer = purse.pay(clauses.sat, (budget) =>
			clauses.solve(clash.demands, budget, new Set(rest)),
		);
		if (answer === 'unsat') vertices = clauses.failedVertices();
	}
	return [...new Set([...locked, ...vertices])].sort((a, b) => a - b);
}
