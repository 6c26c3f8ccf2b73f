import type { RawLayer } from '../raw-layer.ts';
import { notGeoJson, readGeometry } from './geojson-geometry.ts';
import { byte, type JsonBytes } from './json-bytes.ts';

/** A feature that is the whole file. */
export interface LoneFeature {
	id: string | number | null;
	properties: object | null;
}

/** One feature (RFC 7946, section 3.2) into the layer. */
export function readFeature(json: JsonBytes, layer: RawLayer): void {
	json.feature = layer.regions + 1;
	if (json.peek() !== byte.openObject) throw notGeoJson(json, 'a feature is not an object');
	json.at++;
	layer.startRegion();
	let id: string | number | null = null;
	let properties: object | null = null;
	let geometries = 0;
	if (json.peek() === byte.closeObject) json.at++;
	else {
		do {
			const name = json.string();
			json.take(byte.colon);
			if (name === 'geometry') {
				if (geometries++) throw notGeoJson(json, 'a feature has two geometries');
				readGeometry(json, layer);
			} else if (name === 'properties') properties = objectOrNull(json.value());
			else if (name === 'id') id = idOf(json.value());
			else json.skip();
		} while (json.another(byte.closeObject));
	}
	layer.table.add(id, properties);
}

export const objectOrNull = (value: unknown) =>
	typeof value === 'object' && !Array.isArray(value) ? value : null;

export const idOf = (value: unknown) =>
	typeof value === 'string' || typeof value === 'number' ? value : null;

export const nameOf = (value: unknown) => (typeof value === 'string' ? value : null);
