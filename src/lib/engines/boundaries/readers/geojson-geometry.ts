import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { byte, type JsonBytes } from './json-bytes.ts';

/** Members of the geometry object read so far; coordinates may come before the type. */
export interface GeometryMembers {
	type?: string;
	/** depth of the coordinates' brackets: 3 for a polygon, 4 for several; 0 when there were none */
	depth: number;
}

/** A geometry (RFC 7946, section 3.1) or null; polygons go into the layer, anything else adds no area. */
export function readGeometry(json: JsonBytes, layer: RawLayer, level = 0): void {
	if (json.peek() !== byte.openObject) {
		if (json.value() !== null) throw notGeoJson(json, 'a geometry is neither an object nor null');
		return;
	}
	if (level > 8) throw json.tooDeep();
	const members: GeometryMembers = { depth: 0 };
	json.at++;
	if (json.peek() === byte.closeObject) json.at++;
	else {
		do {
			const name = json.string();
			json.take(byte.colon);
			readGeometryMember(json, layer, name, members, level);
		} while (json.another(byte.closeObject));
	}
	checkGeometry(json, members, layer);
}

export function readGeometryMember(
	json: JsonBytes,
	layer: RawLayer,
	name: string,
	members: GeometryMembers,
	level = 0,
): void {
	if (name === 'type') members.type = String(json.value());
	else if (name === 'coordinates') members.depth = readCoordinates(json, layer);
	else if (name === 'geometries') readList(json, () => readGeometry(json, layer, level + 1));
	else json.skip();
}

/** The type and the nesting of the coordinates must agree. Points and lines are counted. */
export function checkGeometry(json: JsonBytes, members: GeometryMembers, layer: RawLayer): void {
	const wanted = members.type === 'Polygon' ? 3 : members.type === 'MultiPolygon' ? 4 : 0;
	if (members.depth >= 3 && members.depth !== wanted && !isLines(members)) {
		const message = `its coordinates do not fit the type "${members.type ?? 'missing'}"`;
		throw notGeoJson(json, message);
	}
	if (members.depth > 0 && wanted === 0) layer.stray(members.type ?? 'Point');
}

const isLines = (members: GeometryMembers) =>
	members.depth === 3 && members.type === 'MultiLineString';

function readCoordinates(json: JsonBytes, layer: RawLayer): number {
	const depth = bracketsAhead(json);
	if (depth === 3) readPart(json, layer);
	else if (depth === 4) readList(json, () => readPart(json, layer));
	else if (depth > 4) throw notGeoJson(json, 'coordinates nest deeper than a MultiPolygon');
	else json.skip();
	return depth;
}

/** How many brackets open before the first number; empty lists count as nothing. */
function bracketsAhead(json: JsonBytes): number {
	const start = json.at;
	let depth = 0;
	while (json.peek() === byte.open && depth < 6) {
		depth++;
		json.at++;
	}
	const empty = json.peek() === byte.close;
	json.at = start;
	return empty ? 0 : depth;
}

function readPart(json: JsonBytes, layer: RawLayer): void {
	layer.startPart();
	readList(json, () => {
		layer.startRing();
		readRing(json, layer);
	});
}

function readRing(json: JsonBytes, layer: RawLayer): void {
	json.take(byte.open);
	if (json.takes(byte.close)) return;
	do {
		if (!json.takes(byte.open)) throw notPosition(json);
		const x = json.number();
		if (!json.takes(byte.comma)) throw notPosition(json);
		layer.point(x, json.number());
		if (!json.takes(byte.close)) while (json.another(byte.close)) json.number();
	} while (json.takes(byte.comma) || json.another(byte.close));
}

/** A JSON list, `item` called at the start of each entry. */
export function readList(json: JsonBytes, item: () => void): void {
	json.take(byte.open);
	if (json.peek() === byte.close) {
		json.at++;
		return;
	}
	do item();
	while (json.another(byte.close));
}

function notPosition(json: JsonBytes): Refusal {
	const message = `A position is not a list of at least two numbers at ${json.place()}.`;
	return new Refusal('bad-coordinate', message);
}

export function notGeoJson(json: JsonBytes, what: string): Refusal {
	return new Refusal('not-geojson', `This is not GeoJSON: ${what}, at ${json.place()}.`);
}
