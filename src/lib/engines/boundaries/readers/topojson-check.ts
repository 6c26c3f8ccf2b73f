import type { Topology } from 'topojson-specification';
import { Refusal } from '../refusal.ts';

/**
 * Refuses a topology that the reading library would run out of: arcs that are no lists of numbers, and
 * arc indices that point nowhere.
 */
export function checkTopology(topology: Topology): void {
	const { arcs, objects, transform } = topology;
	if (topology.type !== 'Topology' || !Array.isArray(arcs) || !isObject(objects)) {
		throw new Refusal('not-geojson', 'The TopoJSON file lacks its arcs or its objects.');
	}
	if (transform !== undefined && ![transform?.scale, transform?.translate].every(isPair)) {
		throw new Refusal(
			'bad-coordinate',
			'The transform of the TopoJSON file is not made of numbers.',
		);
	}
	arcs.forEach((arc, i) => {
		if (!Array.isArray(arc) || arc.length < 2 || !arc.every(isPair)) {
			throw new Refusal('bad-arc', `Arc ${i} is not a list of at least two positions.`);
		}
	});
	for (const [name, object] of Object.entries(objects)) checkObject(object, name, arcs.length);
}

function checkObject(object: unknown, name: string, arcs: number, level = 0): void {
	if (level > 8 || !isObject(object)) {
		throw new Refusal('not-geojson', `Layer "${name}" holds something that is no geometry.`);
	}
	const { type, geometries } = object;
	if (type === 'GeometryCollection') {
		if (!Array.isArray(geometries))
			throw new Refusal('not-geojson', `Layer "${name}" has no geometries.`);
		geometries.forEach((inner) => checkObject(inner, name, arcs, level + 1));
		return;
	}
	const depth = type === 'Polygon' ? 2 : type === 'MultiPolygon' ? 3 : 0;
	if (depth) checkArcs(object.arcs, depth, name, arcs, object.id);
}

function checkArcs(list: unknown, depth: number, name: string, arcs: number, id: unknown): void {
	if (!Array.isArray(list)) {
		throw new Refusal('bad-arc', `The arcs of ${idText(id)} in layer "${name}" are not lists.`);
	}
	for (const entry of list) {
		if (depth > 1) checkArcs(entry, depth - 1, name, arcs, id);
		else if (!Number.isInteger(entry) || entry >= arcs || ~entry >= arcs) {
			const message = `${idText(id)} in layer "${name}" names arc ${String(entry)}; there are ${arcs}.`;
			throw new Refusal('bad-arc', message);
		}
	}
}

const idText = (id: unknown) => (id === undefined ? 'A feature' : `Feature "${String(id)}"`);

const isObject = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

const isPair = (value: unknown): boolean =>
	Array.isArray(value) && Number.isFinite(value[0]) && Number.isFinite(value[1]);
