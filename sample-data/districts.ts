import type { Cells, Point } from './cells.ts';
import { grow } from './growth.ts';
import { pieces } from './land.ts';
import { noise, randomStream } from './random.ts';

/** Towns, round which districts are small: place in km, reach in km. */
export const towns: { at: Point; reach: number }[] = [
	{ at: [28, -18], reach: 38 },
	{ at: [-148, -70], reach: 30 },
	{ at: [128, 92], reach: 32 },
	{ at: [-120, 46], reach: 24 },
];

/** How densely people live, 1 in the country and up to 3.4 in a town. */
export function density([x, y]: Point): number {
	const near = towns.map(({ at, reach }) => Math.hypot(x - at[0], y - at[1]) / reach);
	return 1 + Math.max(...near.map((distance) => 2.4 * Math.exp(-(distance ** 2))));
}

/** The district of each cell, -1 for water. Islets too small for a district of their own go to the nearest. */
export function makeDistricts(
	cells: Cells,
	land: boolean[],
	count: number,
	seed: number,
): Int32Array {
	const weight = cells.centres.map((centre, cell) => cells.areas[cell] * density(centre));
	const parts = pieces(cells, land).sort((a, b) => b.length - a.length);
	const sizes = parts.map((part) => part.reduce((sum, cell) => sum + weight[cell], 0));
	const share = sizes.reduce((a, b) => a + b, 0) / count;
	const seats = sizes.map((size) =>
		size < share * 0.5 ? 0 : Math.max(1, Math.round(size / share)),
	);
	seats[0] += count - seats.reduce((a, b) => a + b, 0);

	const random = randomStream(seed);
	const neighbours = cells.neighbours.map((list, cell) =>
		land[cell] ? list.filter((n) => land[n]) : [],
	);
	const starts = parts.flatMap((part, i) => pickSeeds(part, weight, seats[i], random));
	const owner = relax(cells, neighbours, weight, starts, seed);
	parts.forEach((part, i) => {
		if (seats[i] === 0) attach(cells, part, owner);
	});
	return owner;
}

function pickSeeds(
	part: number[],
	weight: number[],
	count: number,
	random: () => number,
): number[] {
	const left = [...part];
	return Array.from({ length: count }, () => {
		let ticket = random() * left.reduce((sum, cell) => sum + weight[cell], 0);
		const place = left.findIndex((cell) => (ticket -= weight[cell]) <= 0);
		return left.splice(Math.max(0, place), 1)[0];
	});
}

function relax(
	cells: Cells,
	neighbours: number[][],
	weight: number[],
	starts: number[],
	seed: number,
): Int32Array {
	const cost = remembered(cells.centres.length, (from, to) => {
		const [a, b] = [cells.centres[from], cells.centres[to]];
		const rough = 1 + 1.3 * noise((a[0] + b[0]) / 2, (a[1] + b[1]) / 2, 24, seed + 5, 1.25);
		return Math.hypot(a[0] - b[0], a[1] - b[1]) * Math.sqrt(density(a)) * Math.max(0.2, rough);
	});
	let seeds = starts;
	for (let round = 0; round < 24; round++) {
		seeds = middles(cells, grow(neighbours, seeds, cost), weight, seeds.length);
	}
	return grow(neighbours, seeds, cost);
}

/** A cost of a step that is worked out once. */
function remembered(
	count: number,
	cost: (from: number, to: number) => number,
): (from: number, to: number) => number {
	const known = new Map<number, number>();
	return (from, to) => {
		const key = from * count + to;
		const old = known.get(key);
		if (old !== undefined) return old;
		const value = cost(from, to);
		known.set(key, value);
		return value;
	};
}

/** The cell nearest the weighted middle of each district. */
function middles(cells: Cells, owner: Int32Array, weight: number[], count: number): number[] {
	const sums = Array.from({ length: count }, () => [0, 0, 0]);
	owner.forEach((district, cell) => {
		if (district < 0) return;
		const [x, y] = cells.centres[cell];
		const sum = sums[district];
		sum[0] += x * weight[cell];
		sum[1] += y * weight[cell];
		sum[2] += weight[cell];
	});
	const best = new Int32Array(count).fill(-1);
	const near = new Float64Array(count).fill(Infinity);
	owner.forEach((district, cell) => {
		if (district < 0) return;
		const [x, y, w] = sums[district];
		const distance = Math.hypot(cells.centres[cell][0] - x / w, cells.centres[cell][1] - y / w);
		if (distance < near[district]) [near[district], best[district]] = [distance, cell];
	});
	return [...best];
}

function attach(cells: Cells, islet: number[], owner: Int32Array): void {
	const here = cells.centres[islet[0]];
	let [best, near] = [-1, Infinity];
	owner.forEach((district, cell) => {
		if (district < 0) return;
		const there = cells.centres[cell];
		const distance = Math.hypot(here[0] - there[0], here[1] - there[1]);
		if (distance < near) [near, best] = [distance, district];
	});
	for (const cell of islet) owner[cell] = best;
}
