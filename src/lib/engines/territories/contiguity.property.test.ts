import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { buildGraph } from '../graph/build-graph.ts';
import { canLeave, contiguityScratch } from './contiguity.ts';

const graphs = fc.integer({ min: 1, max: 24 }).chain((units) =>
	fc.record({
		units: fc.constant(units),
		pairs: fc.array(fc.tuple(fc.nat(units - 1), fc.nat(units - 1)), { maxLength: 3 * units }),
		assignment: fc.array(fc.integer({ min: -1, max: 2 }), { minLength: units, maxLength: units }),
	}),
);

/** Pieces of a territory without one unit, by merging labels until nothing changes. */
function pieces(
	pairs: [number, number][],
	assignment: number[],
	territory: number,
	without: number,
) {
	const label = assignment.map((t, u) => (t === territory && u !== without ? u : -1));
	for (let changed = true; changed;) {
		changed = false;
		for (const [a, b] of pairs) {
			if (label[a] < 0 || label[b] < 0 || label[a] === label[b]) continue;
			label[a] = label[b] = Math.min(label[a], label[b]);
			changed = true;
		}
	}
	return new Set(label.filter((l) => l >= 0)).size;
}

describe('whether a unit can leave its territory', () => {
	it('agrees with counting pieces, with one scratch for all tests and across the last stamp', () => {
		fc.assert(
			fc.property(graphs, fc.boolean(), ({ units, pairs, assignment }, late) => {
				const edges = pairs.filter(([a, b]) => a !== b);
				const graph = buildGraph(
					units,
					edges.map((e) => e[0]),
					edges.map((e) => e[1]),
				);
				const scratch = contiguityScratch(units);
				if (late) scratch.now = 0xffffffff - 8;
				for (let u = 0; u < units; u++) {
					const before = pieces(edges, assignment, assignment[u], -1);
					const after = pieces(edges, assignment, assignment[u], u);
					const may = canLeave(graph, Int32Array.from(assignment), u, scratch);
					expect(may).toBe(after <= before);
				}
			}),
			{ numRuns: 500 },
		);
	});
});
