import { Random } from '../../src/lib/engines/colouring/random.ts';
import { Triangulation } from './triangulation.ts';

export interface PlanarMap {
	regions: number;
	borders: { a: Uint32Array; b: Uint32Array };
}

/** A triangulation of the sphere grown by splitting random faces, then stirred by random flips. */
export function randomTriangulation(regions: number, seed: number, stir = 5): PlanarMap {
	const { mesh } = stirred(regions, seed, stir);
	return { regions, borders: mesh.edges() };
}

/**
 * A random triangulation of the sphere in which every vertex has at least five neighbours, the hard
 * case for chain arguments: flips go on, seldom uphill, until no vertex lacks anything of five.
 * `regions` must be 12 or at least 14.
 */
export function minimumDegreeFive(regions: number, seed: number): PlanarMap {
	const { mesh, edges, degree, random } = stirred(regions, seed, 3);
	const lack = (d: number) => Math.max(0, 5 - d);
	let missing = degree.reduce((sum, d) => sum + lack(d), 0);
	for (let e = 0; missing > 0; e = (e + 1) % mesh.size) {
		const [p, q, r, s] = mesh.around(e);
		if (degree[r] >= 5 && degree[s] >= 5 && random.below(20) > 0) continue;
		let change = lack(degree[p] - 1) - lack(degree[p]) + lack(degree[q] - 1) - lack(degree[q]);
		change += lack(degree[r] + 1) - lack(degree[r]) + lack(degree[s] + 1) - lack(degree[s]);
		if (change > 0 && (degree[r] >= 5 || random.below(20) > 0)) continue;
		if (flipIfSimple(mesh, edges, degree, e)) missing += change;
	}
	return { regions, borders: mesh.edges() };
}

function stirred(regions: number, seed: number, stir: number) {
	const random = new Random(seed);
	const mesh = twoTriangles(regions);
	for (let v = 3; v < regions; v++) mesh.split(random.below(mesh.size), v);
	const { a, b } = mesh.edges();
	const edges = new Set<number>();
	const degree = new Int32Array(regions);
	for (let i = 0; i < a.length; i++) {
		edges.add(keyOf(regions, a[i], b[i]));
		degree[a[i]]++;
		degree[b[i]]++;
	}
	for (let i = 0; i < stir * a.length; i++) {
		flipIfSimple(mesh, edges, degree, random.below(mesh.size));
	}
	return { mesh, edges, degree, random };
}

function twoTriangles(regions: number): Triangulation {
	const halfEdges = 6 * regions;
	const mesh = new Triangulation(new Int32Array(halfEdges), new Int32Array(halfEdges), 6);
	mesh.origin.set([0, 1, 2, 1, 0, 2]);
	mesh.link(0, 3);
	mesh.link(1, 5);
	mesh.link(2, 4);
	return mesh;
}

const keyOf = (regions: number, a: number, b: number) => Math.min(a, b) * regions + Math.max(a, b);

/** Flips the edge unless its new ends are joined already or an old end would fall below degree 3. */
function flipIfSimple(mesh: Triangulation, edges: Set<number>, degree: Int32Array, e: number) {
	const [p, q, r, s] = mesh.around(e);
	const added = keyOf(degree.length, r, s);
	if (r === s || edges.has(added) || degree[p] <= 3 || degree[q] <= 3) return false;
	mesh.flip(e);
	edges.delete(keyOf(degree.length, p, q));
	edges.add(added);
	degree[p]--;
	degree[q]--;
	degree[r]++;
	degree[s]++;
	return true;
}

/**
 * A map like those of real districts: points scattered about a square lattice, joined by straight
 * lines without crossings, and named in random order. Fast enough for a million regions.
 */
export function scatteredMap(regions: number, seed: number, shuffle = true): PlanarMap {
	const random = new Random(seed);
	const width = Math.ceil(Math.sqrt(regions));
	const height = Math.ceil(regions / width);
	const mesh = lattice(width, height, random);
	const name = Uint32Array.from({ length: width * height }, (_, i) => i);
	for (let i = name.length - 1; shuffle && i > 0; i--) {
		const j = random.below(i + 1);
		[name[i], name[j]] = [name[j], name[i]];
	}
	const { a, b } = mesh.edges();
	return {
		regions: width * height,
		borders: { a: a.map((v) => name[v]), b: b.map((v) => name[v]) },
	};
}

/** The Delaunay triangulation of scattered points (C. Lawson's flips, 1977); numbered row by row. */
export function delaunayMap(regions: number, seed: number): PlanarMap {
	const width = Math.ceil(Math.sqrt(regions));
	const height = Math.ceil(regions / width);
	const { mesh, x, y } = scatteredMesh(width, height, new Random(seed));
	for (let flipped = true; flipped;) {
		flipped = false;
		for (let e = 0; e < mesh.size; e++) if (flipIfCircled(mesh, x, y, e)) flipped = true;
	}
	return { regions: width * height, borders: mesh.edges() };
}

function lattice(width: number, height: number, random: Random): Triangulation {
	const { mesh, x, y, halfEdges } = scatteredMesh(width, height, random);
	for (let i = 0; i < 2 * halfEdges; i++) flipIfConvex(mesh, x, y, random.below(halfEdges));
	return mesh;
}

/** Points about the crossings of a lattice, joined with their neighbours and across each cell. */
function scatteredMesh(width: number, height: number, random: Random) {
	const points = width * height;
	const x = Float64Array.from({ length: points }, (_, i) => (i % width) + random.below(400) / 1000);
	const y = Float64Array.from(
		{ length: points },
		(_, i) => Math.floor(i / width) + random.below(400) / 1000,
	);
	const halfEdges = 6 * (width - 1) * (height - 1);
	const mesh = new Triangulation(
		new Int32Array(halfEdges),
		new Int32Array(halfEdges).fill(-1),
		halfEdges,
	);
	for (let row = 0; row < height - 1; row++) {
		for (let column = 0; column < width - 1; column++) layCell(mesh, width, row, column);
	}
	return { mesh, x, y, halfEdges };
}

/** Two triangles a cell: half-edges 0, 1, 2 of the lower (bottom, diagonal, left), 3, 4, 5 of the upper. */
function layCell(mesh: Triangulation, width: number, row: number, column: number): void {
	const cell = 6 * (row * (width - 1) + column);
	const v = row * width + column;
	mesh.origin.set([v, v + 1, v + width, v + width + 1, v + width, v + 1], cell);
	mesh.link(cell + 1, cell + 4);
	if (column > 0) mesh.link(cell + 2, cell - 6 + 5);
	if (row > 0) mesh.link(cell, cell - 6 * (width - 1) + 3);
}

function flipIfConvex(mesh: Triangulation, x: Float64Array, y: Float64Array, e: number): void {
	if (mesh.twin[e] < 0) return;
	const [p, q, r, s] = mesh.around(e);
	const turn = (a: number, b: number, c: number) =>
		(x[b] - x[a]) * (y[c] - y[a]) - (y[b] - y[a]) * (x[c] - x[a]);
	if (turn(p, s, r) > 1e-3 && turn(q, r, s) > 1e-3) mesh.flip(e);
}

/** Flips the diagonal of two triangles when the fourth corner lies within the circle of the other three. */
function flipIfCircled(mesh: Triangulation, x: Float64Array, y: Float64Array, e: number): boolean {
	if (mesh.twin[e] < 0) return false;
	const [p, q, r, s] = mesh.around(e);
	const [ax, ay, bx, by] = [x[p] - x[s], y[p] - y[s], x[q] - x[s], y[q] - y[s]];
	const [cx, cy] = [x[r] - x[s], y[r] - y[s]];
	const inside =
		(ax * ax + ay * ay) * (bx * cy - cx * by) -
		(bx * bx + by * by) * (ax * cy - cx * ay) +
		(cx * cx + cy * cy) * (ax * by - bx * ay);
	const turn = (x[q] - x[p]) * (y[r] - y[p]) - (y[q] - y[p]) * (x[r] - x[p]);
	if (inside * Math.sign(turn) <= 1e-9) return false;
	mesh.flip(e);
	return true;
}
