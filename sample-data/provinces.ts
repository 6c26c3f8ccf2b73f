import type { Cells, Point } from './cells.ts';
import { grow } from './growth.ts';
import { randomStream } from './random.ts';

/** Which districts share a border line, from the cells. */
export function districtGraph(cells: Cells, owner: Int32Array, count: number): number[][] {
	const sets = Array.from({ length: count }, () => new Set<number>());
	cells.neighbours.forEach((list, cell) => {
		for (const next of list) {
			if (owner[cell] >= 0 && owner[next] >= 0 && owner[cell] !== owner[next]) {
				sets[owner[cell]].add(owner[next]);
			}
		}
	});
	return sets.map((set) => [...set].sort((a, b) => a - b));
}

export function districtMiddles(cells: Cells, owner: Int32Array, count: number): Point[] {
	const sums = Array.from({ length: count }, () => [0, 0, 0]);
	owner.forEach((district, cell) => {
		if (district < 0) return;
		sums[district][0] += cells.centres[cell][0] * cells.areas[cell];
		sums[district][1] += cells.centres[cell][1] * cells.areas[cell];
		sums[district][2] += cells.areas[cell];
	});
	return sums.map(([x, y, area]): Point => [x / area, y / area]);
}

/**
 * The province of each district: `count - 1` of about equal numbers of districts on the mainland, one
 * of the largest island; districts of the other islands go with the nearest district of the mainland.
 */
export function makeProvinces(
	graph: number[][],
	middles: Point[],
	count: number,
	seed: number,
): Int32Array {
	const groups = connected(graph).sort((a, b) => b.length - a.length);
	const mainland = new Set(groups[0]);
	const far = (a: number, b: number) =>
		Math.hypot(middles[a][0] - middles[b][0], middles[a][1] - middles[b][1]);
	const province = balanced(graph, groups[0], far, middles, count - 1, seed);
	for (const island of groups.slice(1)) {
		const nearest = [...mainland].reduce((best, one) =>
			far(one, island[0]) < far(best, island[0]) ? one : best,
		);
		for (const district of island) {
			province[district] = island === groups[1] ? count - 1 : province[nearest];
		}
	}
	return province;
}

function balanced(
	graph: number[][],
	mainland: number[],
	far: (a: number, b: number) => number,
	middles: Point[],
	count: number,
	seed: number,
): Int32Array {
	const random = randomStream(seed);
	const inside = graph.map((list, d) => (mainland.includes(d) ? list : []));
	let seeds = spread(mainland, far, count, random);
	const headStart = seeds.map(() => 0);
	let owner = grow(inside, seeds, far, headStart);
	for (let round = 0; round < 60; round++) {
		const sizes = seeds.map((_, p) => mainland.filter((d) => owner[d] === p).length);
		sizes.forEach((size, p) => (headStart[p] += (size - mainland.length / count) * 0.8));
		if (round < 30) seeds = seeds.map((old, p) => middle(mainland, owner, middles, p, old));
		owner = grow(inside, seeds, far, headStart);
	}
	return owner;
}

/** Seeds far from each other: each the farthest from those before. */
function spread(
	places: number[],
	far: (a: number, b: number) => number,
	count: number,
	random: () => number,
): number[] {
	const seeds = [places[Math.floor(random() * places.length)]];
	while (seeds.length < count) {
		const room = (place: number) => Math.min(...seeds.map((seed) => far(place, seed)));
		seeds.push(places.reduce((best, place) => (room(place) > room(best) ? place : best)));
	}
	return seeds;
}

function middle(
	mainland: number[],
	owner: Int32Array,
	middles: Point[],
	province: number,
	old: number,
): number {
	const members = mainland.filter((district) => owner[district] === province);
	if (members.length === 0) return old;
	const x = members.reduce((sum, d) => sum + middles[d][0], 0) / members.length;
	const y = members.reduce((sum, d) => sum + middles[d][1], 0) / members.length;
	const off = (d: number) => Math.hypot(middles[d][0] - x, middles[d][1] - y);
	return members.reduce((best, d) => (off(d) < off(best) ? d : best));
}

function connected(graph: number[][]): number[][] {
	const seen = new Set<number>();
	return graph.flatMap((_, first) => {
		if (seen.has(first)) return [];
		const group = [first];
		seen.add(first);
		for (const place of group) {
			for (const next of graph[place].filter((one) => !seen.has(one))) {
				seen.add(next);
				group.push(next);
			}
		}
		return [group];
	});
}
