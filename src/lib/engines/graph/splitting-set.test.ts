import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildGraph } from './build-graph.ts';
import { isPlanar } from './left-right-test.ts';
import { splittingSet, type PartedGraph } from './splitting-set.ts';

/** Whether the graph is planar with these regions split and these pairs left out: built here anew. */
function flatWith({ owner, a, b }: PartedGraph, regions: number[], pairs: number[]): boolean {
	const names = new Map<string, number>();
	const number = (part: number) => {
		const name = regions.includes(owner[part]) ? `part ${part}` : `region ${owner[part]}`;
		if (!names.has(name)) names.set(name, names.size);
		return names.get(name) as number;
	};
	const kept = Array.from(a, (_, i) => i).filter(
		(i) => !pairs.includes(i) && owner[a[i]] !== owner[b[i]],
	);
	const [from, to] = [kept.map((i) => number(a[i])), kept.map((i) => number(b[i]))];
	return isPlanar(buildGraph(names.size, from, to));
}

/** Every part of a triangulated square grid belongs to some region, now and then to one far away. */
function scattered(width: number, owners: number[]): PartedGraph {
	const pairs: [number, number][] = [];
	for (let y = 0; y < width; y++) {
		for (let x = 0; x < width; x++) {
			const part = y * width + x;
			if (x + 1 < width) pairs.push([part, part + 1]);
			if (y + 1 < width) pairs.push([part, part + width]);
			if (x + 1 < width && y + 1 < width) pairs.push([part, part + width + 1]);
		}
	}
	const [a, b] = [pairs.map((pair) => pair[0]), pairs.map((pair) => pair[1])];
	return { regions: width * width, owner: owners, a, b };
}

describe('splittingSet', () => {
	it('is irreducible on random maps with scattered parts', () => {
		const width = 6;
		let crossed = 0;
		fc.assert(
			fc.property(
				fc.array(fc.tuple(fc.nat(35), fc.nat(35)), { minLength: 1, maxLength: 6 }),
				(moves) => {
					const owners = Array.from({ length: width * width }, (_, i) => i);
					for (const [part, region] of moves) owners[part] = region;
					const graph = scattered(width, owners);
					const found = splittingSet(graph);
					if (!found) throw new Error('parts that lie in a plane were said not to');
					const { regions, pairs } = found;
					expect(pairs).toEqual([]);
					expect(flatWith(graph, regions, [])).toBe(true);
					for (const region of regions) {
						const rest = regions.filter((other) => other !== region);
						expect(flatWith(graph, rest, [])).toBe(false);
					}
					if (regions.length > 0) crossed++;
				},
			),
			{ numRuns: 200 },
		);
		expect(crossed).toBeGreaterThan(50);
	});

	it('names a loose pair only where no splitting helps, and nothing where neither does', () => {
		const five = [0, 1, 2, 3, 4];
		const pairs = five.flatMap((p) => five.slice(0, p).map((q) => [p, q]));
		const graph = {
			regions: 5,
			owner: five,
			a: pairs.map(([p]) => p),
			b: pairs.map(([, q]) => q),
		};
		expect(splittingSet(graph)).toBeNull();
		expect(splittingSet({ ...graph, loose: [3, 7] })).toMatchObject({ regions: [] });
		expect(splittingSet({ ...graph, loose: [3, 7] })?.pairs).toHaveLength(1);
	});

	it('is empty for a planar graph', () => {
		const owner = Array.from({ length: 9 }, (_, i) => i);
		expect(splittingSet(scattered(3, owner))).toEqual({ regions: [], pairs: [] });
	});
});
