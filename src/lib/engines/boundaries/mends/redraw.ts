import { boxOf } from '../../geometry/coverage-rings.ts';
import type { Outlines } from '../outlines.ts';
import type { Draft } from './draft.ts';

/**
 * The outlines with the draft's regions drawn anew and the removed ones gone; regions keep their numbers.
 * A point that stands exactly on a vertex is that vertex; others are new ones.
 */
export function redrawOutlines(outlines: Outlines, draft: Draft): Outlines {
	const outcome = draft.outcome();
	const rings = [...draft.drawings()].flatMap(([region, parts]) =>
		parts.flat().map((points) => ({ region, points })),
	);
	const { vertexOf, positions } = placePoints(
		outlines,
		rings.map(({ points }) => points),
	);
	const { ringVertices, ringStarts, ringRegion } = outlines;
	const added = rings.reduce((sum, { points }) => sum + points.length / 2, 0);
	const vertices = new Uint32Array(ringVertices.length + added);
	const starts: number[] = [];
	const regions: number[] = [];
	let used = 0;
	for (let ring = 0; ring < ringRegion.length; ring++) {
		const region = ringRegion[ring];
		if (outcome[region] !== region || draft.isRedrawn(region)) continue;
		const run = ringVertices.subarray(ringStarts[ring], ringStarts[ring + 1]);
		vertices.set(run, used);
		starts.push(used);
		regions.push(region);
		used += run.length;
	}
	for (const { region, points } of rings) {
		starts.push(used);
		regions.push(region);
		for (let i = 0; i < points.length; i += 2) {
			vertices[used++] = vertexOf(points[i], points[i + 1]);
		}
	}
	starts.push(used);
	return {
		positions: positions(),
		vertices: positions().length / 2,
		ringVertices: vertices.subarray(0, used),
		ringStarts: Uint32Array.from(starts),
		ringRegion: Uint32Array.from(regions),
		regions: outlines.regions,
	};
}

function placePoints(outlines: Outlines, rings: Float64Array[]) {
	const known = new Map<string, number>();
	const code = (x: number, y: number) => `${x} ${y}`;
	const [west, south, east, north] = boxOfAll(rings);
	const wanted = new Set<number>();
	for (const ring of rings) for (let i = 0; i < ring.length; i += 2) wanted.add(ring[i]);
	const { positions, vertices } = outlines;
	for (let v = 0; v < vertices; v++) {
		const [x, y] = [positions[2 * v], positions[2 * v + 1]];
		if (x < west || x > east || y < south || y > north || !wanted.has(x)) continue;
		if (!known.has(code(x, y))) known.set(code(x, y), v);
	}
	const fresh: number[] = [];
	let all: Float64Array | null = null;
	return {
		vertexOf(x: number, y: number): number {
			let vertex = known.get(code(x, y));
			if (vertex === undefined) {
				vertex = vertices + fresh.length / 2;
				fresh.push(x, y);
				known.set(code(x, y), vertex);
			}
			return vertex;
		},
		positions(): Float64Array {
			if (all) return all;
			all = new Float64Array(2 * vertices + fresh.length);
			all.set(positions.subarray(0, 2 * vertices));
			all.set(fresh, 2 * vertices);
			return all;
		},
	};
}

function boxOfAll(rings: Float64Array[]): [number, number, number, number] {
	const box: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
	for (const [west, south, east, north] of rings.map(boxOf)) {
		box[0] = Math.min(box[0], west);
		box[1] = Math.min(box[1], south);
		box[2] = Math.max(box[2], east);
		box[3] = Math.max(box[3], north);
	}
	return box;
}
