import type { Topology } from 'topojson-specification';
import type { Limits } from '../options.ts';
import { Refusal } from '../refusal.ts';
import { arcLengths } from './topojson-arcs.ts';

/**
 * Refuses a topology that the reading library would run out of or go astray in: arcs that are no lists
 * of finite numbers, arc indices that point nowhere, and arcs used so often
 * that their points written out would be more than `limits.points`.
 */
export function checkTopology(topology: Topology, limits: Limits): void {
	const { arcs, objects, transform } = topology;
	if (topology.type !== 'Topology' || !Array.isArray(arcs) || !isObject(objects)) {
		throw new Refusal('not-geojson', 'The TopoJSON file lacks its arcs or its objects.');
	}
	if (transform !== undefined) checkTransform(transform);
	const walk = { lengths: arcLengths(topology), points: 0, most: limits.points };
	for (const [name, object] of Object.entries(objects)) {
		walk.points = 0;
		checkObject(object, name, walk);
	}
}

interface Walk {
	/** points of each arc */
	lengths: Uint32Array;
	/** of the layer so far, arcs written out */
	points: number;
	most: number;
}

function checkTransform(transform: { scale?: unknown; translate?: unknown } | null): void {
	const { scale, translate } = transform ?? {};
	if (!isPair(scale) || !isPair(translate) || scale[0] === 0 || scale[1] === 0) {
		const message = 'The transform of the TopoJSON file is not made of numbers other than zero.';
		throw new Refusal('bad-coordinate', message);
	}
}

function checkObject(object: unknown, name: string, walk: Walk, level = 0): void {
	if (level > 8 || !isObject(object)) {
		throw new Refusal('not-geojson', `Layer "${name}" holds something that is no geometry.`);
	}
	const { type, geometries } = object;
	if (type === 'GeometryCollection') {
		if (!Array.isArray(geometries))
			throw new Refusal('not-geojson', `Layer "${name}" has no geometries.`);
		geometries.forEach((inner) => checkObject(inner, name, walk, level + 1));
		return;
	}
	const depth = type === 'Polygon' ? 2 : type === 'MultiPolygon' ? 3 : 0;
	const id = object.id === undefined ? 'A feature' : `Feature "${String(object.id)}"`;
	if (depth) checkArcs(object.arcs, depth, `${id} in layer "${name}"`, walk);
}

function checkArcs(list: unknown, depth: number, place: string, walk: Walk): void {
	if (!Array.isArray(list)) {
		throw new Refusal('bad-arc', `The arcs of ${place} are not lists.`);
	}
	if (depth === 1) return checkRing(list, place, walk);
	for (const entry of list) checkArcs(entry, depth - 1, place, walk);
}

function checkRing(ring: unknown[], place: string, walk: Walk): void {
	const { lengths } = walk;
	ring.forEach((entry) => {
		const arc = entry as number;
		if (!Number.isInteger(arc) || arc >= lengths.length || ~arc >= lengths.length) {
			const message = `${place} names arc ${String(entry)}; there are ${lengths.length}.`;
			throw new Refusal('bad-arc', message);
		}
		walk.points += lengths[arc < 0 ? ~arc : arc];
		if (walk.points > walk.most) {
			const message = `The arcs written out are more than ${walk.most} points, which is the most this reader takes.`;
			throw new Refusal('too-large-unpacked', message);
		}
	});
}

const isObject = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

const isPair = (value: unknown): value is [number, number] =>
	Array.isArray(value) && Number.isFinite(value[0]) && Number.isFinite(value[1]);
