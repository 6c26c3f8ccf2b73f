import type { Point } from './cells.ts';
import { toGrid, type District } from './survey.ts';

/** How the distributor gets about: districts that share a side, and ferries to those that share none. */
export interface Roads {
	/** for each district the districts beside it by land, ascending */
	beside: number[][];
	ferries: [number, number][];
	/** land and ferries together */
	joined: number[][];
	middles: Point[];
}

export function roadsOf(districts: readonly District[]): Roads {
	const beside = sharedSides(districts);
	const middles = districts.map(({ polygons }) => middle(polygons[0][0].map(toGrid)));
	const ferries = ferriesBetween(beside, middles);
	const joined = beside.map((list, at) => [
		...list,
		...ferries.flatMap(([a, b]) => (a === at ? [b] : b === at ? [a] : [])),
	]);
	return { beside, ferries, joined, middles };
}

function sharedSides(districts: readonly District[]): number[][] {
	const owners = new Map<string, Set<number>>();
	districts.forEach(({ polygons }, district) => {
		for (const ring of polygons.flat()) {
			ring.slice(1).forEach((point, at) => {
				const side = [ring[at].join(), point.join()].sort().join(' ');
				owners.set(side, (owners.get(side) ?? new Set()).add(district));
			});
		}
	});
	const beside = districts.map(() => new Set<number>());
	for (const pair of owners.values()) {
		for (const a of pair) for (const b of pair) if (a !== b) beside[a].add(b);
	}
	return beside.map((set) => [...set].sort((a, b) => a - b));
}

function middle(ring: Point[]): Point {
	const sum = (axis: 0 | 1) => ring.reduce((total, point) => total + point[axis], 0);
	return [sum(0) / ring.length, sum(1) / ring.length];
}

/** Each group of districts without a way to the rest gets one ferry, the shortest, until all hang together. */
function ferriesBetween(beside: number[][], middles: Point[]): [number, number][] {
	const ferries: [number, number][] = [];
	for (;;) {
		const reached = group(beside, ferries, 0);
		if (reached.size === beside.length) return ferries;
		let [shortest, best] = [Infinity, [0, 0] as [number, number]];
		for (const a of reached) {
			middles.forEach(([x, y], b) => {
				const length = Math.hypot(x - middles[a][0], y - middles[a][1]);
				if (reached.has(b) || length >= shortest) return;
				[shortest, best] = [length, [a, b]];
			});
		}
		ferries.push(best);
	}
}

function group(beside: number[][], ferries: [number, number][], first: number): Set<number> {
	const found = new Set([first]);
	for (const place of found) {
		for (const next of beside[place]) found.add(next);
		for (const [a, b] of ferries) {
			if (a === place) found.add(b);
			if (b === place) found.add(a);
		}
	}
	return found;
}
