import { buildGraph } from '../graph/build-graph.ts';
import type { RegionGraph } from '../graph/region-graph.ts';
import { inducedSubgraph } from '../graph/subgraph.ts';
import type { Sat } from '../solver/sat.ts';
import { neededBorders, type VertexPair } from './refute-borders.ts';
import { greedyClique } from './refute-clique.ts';
import { ColouringClauses } from './refute-encoding.ts';
import { peel } from './refute-peel.ts';

export interface RefuteOptions {
	effort?: 'quick' | 'normal' | 'thorough';
	/** so many times the conflicts of this effort, from 1 */
	effortTimes?: number;
	seed?: number;
	/** asked between steps, with the conflicts of the question at hand; true ends the search without an answer */
	cancelled?: (conflicts?: number) => boolean;
}

export interface Refuted {
	/** vertices of the part, in the order of the proof's variables */
	regions: number[];
	/** the borders among them that are needed; all when absent */
	borders?: VertexPair[];
	clauses: string;
}

/** Conflicts allowed for the search, for making it small and for the plain proof, each. */
const EFFORT = { quick: 3_000, normal: 60_000, thorough: 1_000_000 };
const TRIMS = 6;
/** conflicts of a short proof; regions of a part that can still be shown */
const SOON = 3_000;
const WIDE = 300;

/**
 * Shows that a graph cannot be coloured with `inks` inks (from 0).
 *
 * Out: the vertices of a small part that cannot, and a DRUP refutation of exactly these clauses: with
 * the variable of the i-th of `regions` (from 1) and ink c being (i - 1) * inks + c + 1, each has one
 * of the inks, and two that border do not share one. No ink is fixed beforehand in that proof. Null
 * when the graph can be coloured or the effort did not suffice to tell. No region of the part and none of
 * its borders can be spared, unless the effort ran out on the way or a larger part has a much shorter
 * proof: the part is then critical (Dirac 1952).
 *
 * Method: vertices with fewer neighbours than inks are peeled; failed cores over vertices with one
 * clique coloured beforehand (any colouring can be renamed to agree); then each vertex left out in turn,
 * and each border.
 */
export function refute(
	graph: RegionGraph,
	inks: number,
	options: RefuteOptions = {},
): Refuted | null {
	const search = new Refutation(graph, inks, options);
	const whole = peel(graph, inks);
	let part = search.failing(whole);
	if (!part) return null;
	for (let i = 0; i < TRIMS; i++) {
		const smaller = search.failing(part);
		if (!smaller || smaller.length >= part.length) break;
		part = smaller;
	}
	return search.publish(whole, part, search.spared(part));
}

class Refutation {
	private readonly effort: number;
	private spent = 0;

	constructor(
		private graph: RegionGraph,
		private inks: number,
		private options: RefuteOptions,
	) {
		this.effort = EFFORT[options.effort ?? 'normal'] * (options.effortTimes ?? 1);
	}

	/** Vertices among those given that cannot be coloured; null when they can or the effort is spent. */
	failing(vertices: number[]): number[] | null {
		if (vertices.length === 0) return null;
		const { clauses, assumptions } = this.prepared(vertices);
		const all = vertices.map((_, place) => place);
		if (this.ask(clauses, assumptions(all), this.effort) !== 'unsat') return null;
		return placesOf(clauses).map((place) => vertices[place]);
	}

	/** Leaves out every vertex that can be spared, one after the other. */
	spared(vertices: number[]): number[] {
		const { clauses, assumptions } = this.prepared(vertices);
		let kept = vertices.map((_, place) => place);
		this.spent = 0;
		for (let i = 0; i < vertices.length && this.spent < this.effort; i++) {
			if (!kept.includes(i)) continue;
			const rest = kept.filter((place) => place !== i);
			const answer = this.ask(clauses, assumptions(rest), this.effort - this.spent);
			if (answer === 'unsat') kept = placesOf(clauses);
		}
		return kept.map((place) => vertices[place]);
	}

	/**
	 * A proof for the smallest part if it comes soon, else for the whole, if it is not too wide to show,
	 * before the parts between: what is left out of a part can be what makes its proof short.
	 */
	publish(whole: number[], part: number[], spared: number[]): Refuted | null {
		const critical = this.critical(spared);
		if (critical) return critical;
		const soon = this.plainProof(spared, Math.min(SOON, this.effort));
		if (soon !== null) return { regions: spared, clauses: soon };
		for (const regions of [whole, part, spared]) {
			if (regions === whole && whole.length > WIDE) continue;
			const clauses = this.plainProof(regions, this.effort);
			if (clauses !== null) return { regions, clauses };
		}
		return null;
	}

	/** The part without the borders that can be spared; null when none can or no proof of it comes soon. */
	private critical(vertices: number[]): Refuted | null {
		if (vertices.length > WIDE) return null;
		const part = inducedSubgraph(this.graph, vertices);
		this.spent = 0;
		const needed = neededBorders(part, this.inks, greedyClique(part, this.inks), (sat, assumed) =>
			this.spend(sat, assumed, Math.min(SOON, this.effort / 3 - this.spent)),
		);
		if (!needed || 2 * needed.length === part.targets.length) return null;
		const ends = (side: 0 | 1) => needed.map((pair) => pair[side]);
		const bare = buildGraph(part.count, ends(0), ends(1));
		const clauses = new ColouringClauses(bare, this.inks, { seed: this.options.seed, proof: true });
		if (this.ask(clauses, [], Math.min(SOON, this.effort)) !== 'unsat') return null;
		const borders = needed.map(([a, b]): VertexPair => [vertices[a], vertices[b]]);
		return { regions: vertices, borders, clauses: clauses.sat.proofText() };
	}

	/** The refutation text of the part, or null when the conflicts do not suffice. */
	private plainProof(vertices: number[], conflicts: number): string | null {
		const part = inducedSubgraph(this.graph, vertices);
		const clauses = new ColouringClauses(part, this.inks, { seed: this.options.seed, proof: true });
		return this.ask(clauses, [], conflicts) === 'unsat' ? clauses.sat.proofText() : null;
	}

	/** Clauses with a switch for each vertex, and what to assume so that the vertices given need inks. */
	private prepared(vertices: number[]) {
		const part = inducedSubgraph(this.graph, vertices);
		const { seed } = this.options;
		const clauses = new ColouringClauses(part, this.inks, { seed, switches: true });
		const clique = greedyClique(part, this.inks);
		const assumptions = (places: number[]) => [
			...clique.flatMap((v, ink) => (places.includes(v) ? [clauses.has(v, ink)] : [])),
			...places.map((place) => clauses.switch(place)),
		];
		return { clauses, assumptions };
	}

	private ask({ sat }: ColouringClauses, assumptions: number[], conflicts: number) {
		return this.spend(sat, assumptions, conflicts);
	}

	private spend(sat: Sat, assumptions: number[], conflicts: number) {
		if (conflicts <= 0) return 'unknown';
		const before = sat.conflicts;
		const answer = sat.solve(assumptions, { conflicts, cancelled: this.options.cancelled });
		this.spent += sat.conflicts - before;
		return answer;
	}
}

/** The vertices a failed core names, be it by switch or by ink. */
function placesOf({ sat, graph, inks }: ColouringClauses): number[] {
	const most = graph.count * inks;
	const places = sat
		.core()
		.map((literal) => (literal > most ? literal - most - 1 : Math.floor((literal - 1) / inks)));
	return [...new Set(places)].sort((a, b) => a - b);
}
