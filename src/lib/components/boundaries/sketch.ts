import type { Sketch } from '$lib/engines/boundaries/question';

/** A sketch as one path in a frame 1,000 units wide, y down as SVG has it. */
export interface SketchedFrame {
	width: number;
	height: number;
	path: string;
}

/** Flat or thin files keep a frame one can see. */
const [leastHeight, mostHeight] = [200, 1600];
const width = 1000;
const rim = 20;

/**
 * Lays the lines of a sketch into a frame. Where the coordinates can be degrees, they are narrowed as the
 * middle parallel asks, so that the shape is the one a map shows.
 */
export function sketchFrame({ box, lines }: Sketch): SketchedFrame {
	const [west, south, east, north] = box;
	const degrees = west >= -360 && east <= 360 && south >= -90 && north <= 90;
	const narrow = degrees ? Math.max(0.05, Math.cos((((south + north) / 2) * Math.PI) / 180)) : 1;
	const across = Math.max((east - west) * narrow, Number.MIN_VALUE);
	const up = Math.max(north - south, Number.MIN_VALUE);
	const height = Math.min(mostHeight, Math.max(leastHeight, (width * up) / across));
	const scale = Math.min((width - 2 * rim) / across, (height - 2 * rim) / up);
	const [left, top] = [(width - across * scale) / 2, (height - up * scale) / 2];
	const x = (value: number) => Math.round((left + (value - west) * narrow * scale) * 10) / 10;
	const y = (value: number) => Math.round((top + (north - value) * scale) * 10) / 10;
	const path = lines.map((line) => ringPath(line, x, y)).join('');
	return { width, height: Math.round(height), path };
}

function ringPath(line: number[], x: (v: number) => number, y: (v: number) => number): string {
	const steps: string[] = [];
	for (let i = 0; i + 1 < line.length; i += 2) steps.push(`${x(line[i])} ${y(line[i + 1])}`);
	return steps.length > 1 ? `M${steps.join('L')}Z` : '';
}

const fine = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 3 });
const whole = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 0 });

/** The two corners of a box in words: small numbers with their decimals, large ones whole. */
export function cornerWords([west, south, east, north]: Sketch['box']): string {
	const small = [west, south, east, north].every((value) => Math.abs(value) <= 1000);
	const text = (value: number) => (small ? fine : whole).format(value).replace('-', '−');
	return `Lower left ${text(west)}; ${text(south)}. Upper right ${text(east)}; ${text(north)}.`;
}
