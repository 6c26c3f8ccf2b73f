import { crsOf, type Crs } from './crs.ts';
import type { BoundaryOptions } from './options.ts';
import type { RawLayer } from './raw-layer.ts';
import { Refusal } from './refusal.ts';

/**
 * Brings all positions to degrees of longitude and latitude on WGS 84, in place, and answers the name
 * of the system they came in. What the caller says goes before what the file says, and that before the
 * format's own rule; metres without a system are refused, not guessed.
 */
export function reproject(layer: RawLayer, options: BoundaryOptions): string {
	const points = layer.points.items;
	const length = layer.points.length;
	const said = options.crs ?? layer.crs ?? null;
	if (said !== null) {
		const crs = crsOf(said);
		if (options.axes === 'latlon') swap(points, length);
		if (crs.geographic) checkDegrees(layer, crs.name);
		if (crs.toLonLat) transform(layer, crs.toLonLat, crs);
		return crs.name;
	}
	if (options.axes === 'latlon') swap(points, length);
	checkDegrees(layer, null);
	if (!layer.crsByFormat) {
		layer.findings.push({
			code: 'crs-assumed',
			severity: 'warning',
			message:
				'The file does not name its coordinate system; its numbers were taken as degrees on WGS 84.',
			regions: [],
			at: null,
		});
	}
	return 'EPSG:4326';
}

function swap(points: Float64Array, length: number): void {
	for (let i = 0; i < length; i += 2) {
		const x = points[i];
		points[i] = points[i + 1];
		points[i + 1] = x;
	}
}

/** Degrees must lie in range; latitudes out of range that would fit the other way round are swapped axes. */
function checkDegrees(layer: RawLayer, said: string | null): void {
	const points = layer.points.items;
	let east = 0;
	let north = 0;
	let worst = 0;
	for (let i = 0; i < layer.points.length; i += 2) {
		east = Math.max(east, Math.abs(points[i]));
		const lat = Math.abs(points[i + 1]);
		if (lat > north) {
			north = lat;
			worst = i;
		}
	}
	if (north <= 90 && east <= 540) return;
	const shown = `${points[worst]}, ${points[worst + 1]}`;
	const feature = featureOfPoint(layer, worst / 2) + 1;
	if (east <= 90 && north <= 360) {
		const message = `Latitudes lie out of range (feature ${feature}: ${shown}): the two numbers of each position are probably swapped.`;
		throw new Refusal('axes-swapped', message);
	}
	if (said) {
		const message = `Feature ${feature} has the position ${shown}, which is no longitude and latitude in ${said}.`;
		throw new Refusal('bad-coordinate', message);
	}
	const message = `The coordinates are not degrees (feature ${feature}: ${shown}) and the file names no coordinate system. Which one is it in?`;
	throw new Refusal('crs-missing', message);
}

function transform(layer: RawLayer, toLonLat: NonNullable<Crs['toLonLat']>, crs: Crs): void {
	const points = layer.points.items;
	for (let i = 0; i < layer.points.length; i += 2) {
		const [x, y] = [points[i], points[i + 1]];
		const [lon, lat] = toLonLat([x, y]);
		if (!Number.isFinite(lon) || !Number.isFinite(lat) || Math.abs(lat) > 90) {
			const feature = featureOfPoint(layer, i / 2) + 1;
			const message = `Feature ${feature} has the position ${x}, ${y}, which lies outside ${crs.name}.`;
			throw new Refusal('bad-coordinate', message);
		}
		points[i] = lon;
		points[i + 1] = lat;
	}
}

/** Which feature a point belongs to, counted from 0. */
function featureOfPoint(layer: RawLayer, point: number): number {
	for (let f = layer.regions - 1; f > 0; f--) {
		const ring = layer.ringsBefore(layer.partsBefore(f));
		if (layer.pointsBefore(ring) <= point) return f;
	}
	return 0;
}
