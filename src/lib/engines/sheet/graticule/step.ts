import type { Extent } from '../plane/extent.ts';

/** Steps that divide the degree or the turn evenly, in minutes of arc. */
const minutes = [1, 2, 5, 10, 15, 30, 60, 120, 300, 600, 900, 1200, 1800];
/** About so many lines to the longer side of the map. */
const lines = 6;

const evenStep = (least: number): number =>
	(minutes.find((step) => step / 60 >= least * 0.999) ?? 1800) / 60;

export interface GraticuleSteps {
	/** degrees from one parallel to the next */
	lat: number;
	/** degrees from one meridian to the next */
	lon: number;
}

/**
 * Degrees from line to line. `auto` gives about six lines to the longer side; meridians are set wider
 * where they lie closer on the ground.
 */
export function graticuleSteps(asked: number | 'auto', extent: Extent): GraticuleSteps {
	if (asked !== 'auto') return { lat: asked, lon: asked };
	const { west, east, south, north } = extent;
	const turn = east - west > 180;
	const narrow = Math.max(0.15, Math.cos((((south + north) / 2) * Math.PI) / 180));
	const longer = Math.max(north - south, turn ? 0 : (east - west) * narrow);
	const lat = evenStep(longer / lines);
	// round a pole or the globe the meridians part the turn evenly
	return { lat, lon: turn ? 30 : evenStep(lat / narrow / 1.5) };
}

/** The faces of figures have no prime (U+2032); the upright mark is read as one. */
export const minuteMark = "'";

/** A figure at a line: `120° W`, `4° 30' N`, `0°`; decimals where a step does not fall on minutes. */
export function figureOf(value: number, positive: string, negative: string): string {
	const size = Math.abs(value);
	const inMinutes = Math.round(size * 60);
	const side =
		size < 1e-9 || Math.abs(size - 180) < 1e-9 ? '' : ` ${value > 0 ? positive : negative}`;
	if (Math.abs(size * 60 - inMinutes) > 1e-6) return `${Number(size.toFixed(3))}°${side}`;
	const [degrees, rest] = [Math.floor(inMinutes / 60), inMinutes % 60];
	return `${degrees}°${rest ? ` ${String(rest).padStart(2, '0')}${minuteMark}` : ''}${side}`;
}
