import { featureCollection, point, voronoi } from '@turf/turf';
import { randomStream } from './random.ts';

export type Point = [x: number, y: number];

/** A fine mosaic of cells, kilometres on a plane: the clay from which land and districts are shaped. */
export interface Cells {
	centres: Point[];
	areas: Float64Array;
	vertices: Point[];
	/** vertex numbers round each cell, anticlockwise */
	rims: number[][];
	neighbours: number[][];
}

/** Random points in a box, evened out twice by moving each to the middle of its cell (Lloyd 1982). */
export function makeCells(
	count: number,
	halfWidth: number,
	halfHeight: number,
	seed: number,
): Cells {
	const random = randomStream(seed);
	let centres = Array.from({ length: count }, (): Point => [
		(2 * random() - 1) * halfWidth,
		(2 * random() - 1) * halfHeight,
	]);
	const box: [number, number, number, number] = [-halfWidth, -halfHeight, halfWidth, halfHeight];
	for (let round = 0; round < 2; round++) centres = polygons(centres, box).map(centroid);
	return index(centres, polygons(centres, box));
}

function polygons(centres: Point[], bbox: [number, number, number, number]): Point[][] {
	const mosaic = voronoi(featureCollection(centres.map((centre) => point(centre))), { bbox });
	return mosaic.features.map((cell) => {
		const ring = cell.geometry.coordinates[0].slice(0, -1) as Point[];
		return signedArea(ring) > 0 ? ring : ring.reverse();
	});
}

function index(centres: Point[], rings: Point[][]): Cells {
	const numbers = new Map<string, number>();
	const vertices: Point[] = [];
	const rims = rings.map((ring) => ring.map((vertex) => number(vertex, numbers, vertices)));
	const owners = new Map<string, number>();
	rims.forEach((rim, cell) => {
		rim.forEach((from, i) => owners.set(`${from} ${rim[(i + 1) % rim.length]}`, cell));
	});
	const neighbours = rims.map((rim) =>
		rim.flatMap((from, i) => owners.get(`${rim[(i + 1) % rim.length]} ${from}`) ?? []),
	);
	return { centres, areas: Float64Array.from(rings, signedArea), vertices, rims, neighbours };
}

function number(vertex: Point, numbers: Map<string, number>, vertices: Point[]): number {
	const key = vertex.join();
	const known = numbers.get(key);
	if (known !== undefined) return known;
	numbers.set(key, vertices.length);
	vertices.push(vertex);
	return vertices.length - 1;
}

/** The area of a ring on the plane, positive when anticlockwise. */
export function signedArea(ring: readonly Point[]): number {
	let sum = 0;
	ring.forEach(([x, y], i) => {
		const [nx, ny] = ring[(i + 1) % ring.length];
		sum += x * ny - nx * y;
	});
	return sum / 2;
}

function centroid(ring: Point[]): Point {
	let [sx, sy, area] = [0, 0, 0];
	ring.forEach(([x, y], i) => {
		const [nx, ny] = ring[(i + 1) % ring.length];
		const cross = x * ny - nx * y;
		sx += (x + nx) * cross;
		sy += (y + ny) * cross;
		area += cross;
	});
	return [sx / (3 * area), sy / (3 * area)];
}
