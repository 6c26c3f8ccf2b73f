import type { RegionGraph } from '../graph/region-graph.ts';
import { Sat } from '../solver/sat.ts';

/**
 * The colouring of a graph as clauses. The variable of vertex v (from 0) and ink c is v * inks + c + 1,
 * as in published proofs. With `switches` each vertex has one more variable, which must be assumed for
 * the vertex to need an ink at all, so that cores name vertices.
 */
export class ColouringClauses {
	readonly sat: Sat;

	constructor(
		readonly graph: RegionGraph,
		readonly inks: number,
		options: { seed?: number; proof?: boolean; switches?: boolean } = {},
	) {
		this.sat = new Sat(options);
		const { count, offsets, targets } = graph;
		const variables = count * inks + (options.switches ? count : 0);
		for (let i = 0; i < variables; i++) this.sat.newVariable();
		for (let v = 0; v < count; v++) {
			const some = options.switches ? [-this.switch(v)] : [];
			for (let c = 0; c < inks; c++) some.push(this.has(v, c));
			this.sat.addClause(some);
			for (let e = offsets[v]; e < offsets[v + 1]; e++) {
				if (targets[e] < v) this.differ(v, targets[e]);
			}
		}
	}

	/** The variable of a vertex having an ink. */
	has(vertex: number, ink: number): number {
		return vertex * this.inks + ink + 1;
	}

	/** The variable to assume so that the vertex needs an ink. */
	switch(vertex: number): number {
		return this.graph.count * this.inks + vertex + 1;
	}

	private differ(a: number, b: number): void {
		for (let c = 0; c < this.inks; c++) this.sat.addClause([-this.has(a, c), -this.has(b, c)]);
	}
}
