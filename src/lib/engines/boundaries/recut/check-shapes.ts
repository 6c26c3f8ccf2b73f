import { polygon, multiPolygon } from '@turf/turf';
import Flatbush from 'flatbush';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { ringPoints } from '../../geometry/coverage-rings.ts';
import type { Coverage } from '../coverage.ts';

export type Area = Feature<Polygon | MultiPolygon>;
export type Box = [number, number, number, number];

/** Boxes of all regions; their shapes only when asked for, since all of them may not fit in memory. */
export class CheckShapes {
	/** west, south, east, north by region; empty ones turned inside out */
	readonly boxes: Box[];
	/** points of its arcs by region */
	readonly points: Float64Array;
	private index: Flatbush;

	constructor(private coverage: Coverage) {
		const { keys, arcStarts, arcPoints, arcLeft, arcRight } = coverage;
		this.boxes = keys.map((): Box => [Infinity, Infinity, -Infinity, -Infinity]);
		this.points = new Float64Array(keys.length);
		for (let arc = 0; arc < arcLeft.length; arc++) {
			for (const region of [arcLeft[arc], arcRight[arc]]) {
				if (region < 0) continue;
				this.points[region] += arcStarts[arc + 1] - arcStarts[arc];
				const box = this.boxes[region];
				for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++) {
					box[0] = Math.min(box[0], arcPoints[2 * i]);
					box[1] = Math.min(box[1], arcPoints[2 * i + 1]);
					box[2] = Math.max(box[2], arcPoints[2 * i]);
					box[3] = Math.max(box[3], arcPoints[2 * i + 1]);
				}
			}
		}
		this.index = new Flatbush(Math.max(1, keys.length));
		for (const box of this.boxes) this.index.add(...box);
		if (keys.length === 0) this.index.add(Infinity, Infinity, -Infinity, -Infinity);
		this.index.finish();
	}

	/** Regions whose box meets a box. */
	meeting(box: Box): number[] {
		return this.index.search(...box).filter((region) => region < this.boxes.length);
	}

	/** The shape of a region, `by` degrees further east. */
	shape(region: number, by = 0): Area {
		const { regionParts, partRings } = this.coverage;
		const parts: number[][][][] = [];
		for (let part = regionParts[region]; part < regionParts[region + 1]; part++) {
			const rings: number[][][] = [];
			for (let ring = partRings[part]; ring < partRings[part + 1]; ring++) {
				rings.push(closed(ringPoints(this.coverage, ring), by));
			}
			parts.push(rings);
		}
		return parts.length === 1 ? polygon(parts[0]) : multiPolygon(parts);
	}
}

function closed(points: Float64Array, by: number): number[][] {
	const ring: number[][] = [];
	for (let i = 0; i < points.length; i += 2) ring.push([points[i] + by, points[i + 1]]);
	return [...ring, ring[0]];
}
