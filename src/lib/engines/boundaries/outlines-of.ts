import { Room } from '../geometry/room.ts';
import type { Outlines } from './outlines.ts';
import type { RawLayer } from './raw-layer.ts';
import { VertexTable } from './vertices.ts';

/** What had to be mended while the rings were taken over; features by number. */
export interface RingRepairs {
	closed: Set<number>;
	turned: Set<number>;
	/** a corner written twice in a row, and where the first of them is */
	doubled: Map<number, [number, number]>;
	/** rings with fewer than three different vertices; those with two stay as lines of no width */
	collapsed: Set<number>;
}

/**
 * Takes the rings over: closes them, drops repeated vertices, leaves out those without area, and turns
 * them so that their region is on the left (outer rings anticlockwise, holes clockwise).
 * Each feature is taken for a region of its own. The layer's points are gone afterwards: the vertices'
 * positions are written over them, and what is left of their memory is answered as room.
 */
export function outlinesOf(
	layer: RawLayer,
	west: number,
): { outlines: Outlines; repairs: RingRepairs; room: Room } {
	const points = layer.points.items;
	const total = layer.points.length / 2;
	const table = new VertexTable(west, Math.ceil(total * 0.6), typicalStep(points, total), points);
	const ringVertices = new Uint32Array(total);
	const ringStarts: number[] = [];
	const ringRegion: number[] = [];
	const repairs: RingRepairs = {
		closed: new Set(),
		turned: new Set(),
		doubled: new Map(),
		collapsed: new Set(),
	};
	let used = 0;
	for (const ring of eachRing(layer)) {
		if (!isClosed(points, ring.from, ring.to)) repairs.closed.add(ring.feature);
		const start = used;
		const x0 = points[2 * ring.from];
		const y0 = points[2 * ring.from + 1];
		let [x, y, area, before] = [0, 0, 0, -1];
		for (let i = ring.from; i < ring.to; i++) {
			const lon = points[2 * i];
			const lat = points[2 * i + 1];
			area += x * (lat - y0) - (lon - x0) * y;
			x = lon - x0;
			y = lat - y0;
			const v = table.at(lon, lat);
			if (v !== before) ringVertices[used++] = before = v;
			else if (!repairs.doubled.has(ring.feature)) repairs.doubled.set(ring.feature, [lon, lat]);
		}
		while (used > start + 1 && ringVertices[used - 1] === ringVertices[start]) used--;
		if (used - start < 3) {
			repairs.collapsed.add(ring.feature);
			if (used - start < 2) {
				used = start;
				continue;
			}
		}
		if (area > 0 === ring.isHole) {
			ringVertices.subarray(start, used).reverse();
			repairs.turned.add(ring.feature);
		}
		ringStarts.push(start);
		ringRegion.push(ring.feature);
	}
	ringStarts.push(used);
	const room = new Room();
	room.give(points.subarray(2 * table.count));
	room.give(table.memory());
	const outlines = {
		positions: table.positions.subarray(0, 2 * table.count),
		vertices: table.count,
		ringVertices: ringVertices.subarray(0, used),
		ringStarts: Uint32Array.from(ringStarts),
		ringRegion: Uint32Array.from(ringRegion),
		regions: layer.regions,
	};
	return { outlines, repairs, room };
}

/** Every ring of a layer with its feature; the first of a part is its outer ring. */
export function* eachRing(layer: RawLayer) {
	for (let feature = 0; feature < layer.regions; feature++) {
		for (let part = layer.partsBefore(feature); part < layer.partsBefore(feature + 1); part++) {
			const first = layer.ringsBefore(part);
			for (let ring = first; ring < layer.ringsBefore(part + 1); ring++) {
				const from = layer.pointsBefore(ring);
				yield { feature, isHole: ring > first, from, to: layer.pointsBefore(ring + 1) };
			}
		}
	}
}

/** The middle one of the distances between points that follow each other, from a thousand of them. */
function typicalStep(points: Float64Array, total: number): number {
	const steps: number[] = [];
	for (let i = 1; i < total; i += 1 + Math.floor(total / 1000)) {
		const east = Math.abs(points[2 * i] - points[2 * i - 2]);
		steps.push(Math.max(east, Math.abs(points[2 * i + 1] - points[2 * i - 1])));
	}
	steps.sort((a, b) => a - b);
	return steps[steps.length >> 1] ?? 0;
}

function isClosed(points: Float64Array, from: number, to: number): boolean {
	const last = to - 1;
	return points[2 * from] === points[2 * last] && points[2 * from + 1] === points[2 * last + 1];
}
