import type { Position } from 'geojson';
import { openShp } from 'shapefile';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { checkShp, declaredShp } from './shp-check.ts';

/**
 * The records of a .shp file into the layer, one region a record, by the `shapefile` package, which tells
 * outer rings from holes. The bytes are checked before, since the package passes over what it cannot read.
 */
export async function readShp(bytes: Uint8Array, layer: RawLayer): Promise<void> {
	const records = checkShp(bytes);
	const source = await openShp(declaredShp(bytes));
	for (let record = 1; ; record++) {
		const { done, value } = await source.read();
		if (done && record === records + 1) return;
		if (done || record > records) {
			const message = `The .shp file has ${records} records, but reading ended at record ${record}.`;
			throw new Refusal('file-truncated', message);
		}
		layer.startRegion();
		if (value?.type === 'Polygon') addPart(value.coordinates, layer);
		if (value?.type === 'MultiPolygon') {
			for (const part of value.coordinates) addPart(part, layer);
		}
	}
}

function addPart(rings: Position[][], layer: RawLayer): void {
	layer.startPart();
	for (const ring of rings) {
		layer.startRing();
		for (const [x, y] of ring) layer.point(x, y);
	}
}
