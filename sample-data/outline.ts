import { signedArea, type Cells, type Point } from './cells.ts';
import { hashed } from './random.ts';

/** One part of a district: its outer ring anticlockwise, then its holes clockwise; not closed. */
export type Part = Point[][];

interface Side {
	from: number;
	to: number;
	coast: boolean;
}

/**
 * The parts of every district. Each side of the mosaic between two districts is drawn once, as a
 * fractal line, and used by both, so that neighbours share it point for point.
 */
export function outlines(
	cells: Cells,
	owner: Int32Array,
	count: number,
	joined: [number, number],
	seed: number,
): Part[][] {
	const sides = borderSides(cells, owner, count, joined);
	const vertices = smoothed(cells.vertices, sides, joined);
	const lines = new Map<string, Point[]>();
	for (const { from, to, coast } of sides.flat()) {
		const key = from < to ? `${from} ${to}` : `${to} ${from}`;
		if (lines.has(key)) continue;
		const [low, high] = [Math.min(from, to), Math.max(from, to)];
		lines.set(key, fractal(vertices[low], vertices[high], coast, [low, high, seed]));
	}
	return sides.map((list) => partsOf(chain(list).map((ring) => expand(ring, lines))));
}

function borderSides(
	cells: Cells,
	owner: Int32Array,
	count: number,
	[keep, gone]: [number, number],
): Side[][] {
	const owners = new Map<string, number>();
	const rims = cells.rims.map((rim) => rim.map((vertex) => (vertex === gone ? keep : vertex)));
	rims.forEach((rim, cell) => {
		rim.forEach((from, i) => owners.set(`${from} ${rim[(i + 1) % rim.length]}`, owner[cell]));
	});
	const sides: Side[][] = Array.from({ length: count }, () => []);
	rims.forEach((rim, cell) => {
		if (owner[cell] < 0) return;
		rim.forEach((from, i) => {
			const to = rim[(i + 1) % rim.length];
			const beyond = owners.get(`${to} ${from}`) ?? -1;
			if (from === to || beyond === owner[cell]) return;
			sides[owner[cell]].push({ from, to, coast: beyond < 0 });
		});
	});
	return sides;
}

/** Corners of the mosaic eased along each border; places where three districts meet stay. */
function smoothed(vertices: Point[], sides: Side[][], [keep, gone]: [number, number]): Point[] {
	const links = new Map<number, Set<number>>();
	const shore = new Set<number>();
	for (const { from, to, coast } of sides.flat()) {
		for (const [a, b] of [
			[from, to],
			[to, from],
		]) {
			links.set(a, (links.get(a) ?? new Set()).add(b));
			if (coast) shore.add(a);
		}
	}
	let now = [...vertices];
	now[keep] = average([vertices[keep], vertices[gone]]);
	for (let round = 0; round < 1; round++) {
		const next = [...now];
		for (const [vertex, ends] of links) {
			if (vertex === keep || ends.size !== 2 || shore.has(vertex)) continue;
			next[vertex] = average([now[vertex], average([...ends].map((end) => now[end]))]);
		}
		now = next;
	}
	return now;
}

function average(points: Point[]): Point {
	const sum = points.reduce(([x, y], [px, py]): Point => [x + px, y + py], [0, 0]);
	return [sum[0] / points.length, sum[1] / points.length];
}

/** Midpoint displacement (Fournier, Fussell, Carpenter 1982): a line of 4 steps, wilder on the coast. */
function fractal(from: Point, to: Point, coast: boolean, key: [number, number, number]): Point[] {
	let line = [from, to];
	const rough = coast ? 0.2 : 0.16;
	for (let level = 0; level < 2; level++) {
		line = line.flatMap((point, i) => {
			const next = line[i + 1];
			if (!next) return [point];
			const shift = rough * (2 * hashed(key[0] * 8 + i, key[1] * 4 + level, key[2]) - 1);
			const [dx, dy] = [next[0] - point[0], next[1] - point[1]];
			return [
				point,
				[(point[0] + next[0]) / 2 - dy * shift, (point[1] + next[1]) / 2 + dx * shift],
			];
		});
	}
	return line;
}

/** Sides put end to end into rings. */
function chain(sides: Side[]): number[][] {
	const next = new Map(sides.map(({ from, to }) => [from, to]));
	if (next.size !== sides.length) throw new Error('A district touches itself in a point');
	const rings: number[][] = [];
	for (const { from } of sides) {
		const ring: number[] = [];
		for (let at = from; next.has(at);) {
			ring.push(at);
			const to = next.get(at) as number;
			next.delete(at);
			at = to;
		}
		if (ring.length > 0) rings.push(ring);
	}
	return rings;
}

function expand(ring: number[], lines: Map<string, Point[]>): Point[] {
	return ring.flatMap((from, i) => {
		const to = ring[(i + 1) % ring.length];
		const line = lines.get(from < to ? `${from} ${to}` : `${to} ${from}`) ?? [];
		return (from < to ? line : [...line].reverse()).slice(0, -1);
	});
}

/** Rings to parts: the largest part first, every hole with the outer ring round it. */
function partsOf(rings: Point[][]): Part[] {
	const outer = rings.filter((ring) => signedArea(ring) > 0);
	outer.sort((a, b) => signedArea(b) - signedArea(a));
	const parts: Part[] = outer.map((ring) => [ring]);
	for (const hole of rings.filter((ring) => signedArea(ring) < 0)) {
		const home = parts.find(([ring]) => contains(ring, hole[0])) ?? parts[0];
		home.push(hole);
	}
	return parts;
}

function contains(ring: Point[], [x, y]: Point): boolean {
	let inside = false;
	ring.forEach(([ax, ay], i) => {
		const [bx, by] = ring[(i + 1) % ring.length];
		if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) inside = !inside;
	});
	return inside;
}
