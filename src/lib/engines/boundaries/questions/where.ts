import type { Sketch } from '../question.ts';

type Box = [number, number, number, number];

/** Where a box of degrees lies, in words: `between 5.9° and 15° east and between 47.3° and 55.1° north`. */
export function whereText([west, south, east, north]: Box): string {
	const lon = between(west, east, 'west', 'east');
	return `${lon} and ${between(south, north, 'south', 'north')}`;
}

function between(low: number, high: number, minus: string, plus: string): string {
	const digits = high - low < 0.2 ? 3 : high - low < 2 ? 2 : 1;
	const shown = (value: number) => `${Number(Math.abs(value).toFixed(digits))}°`;
	if (low >= 0) return `between ${shown(low)} and ${shown(high)} ${plus}`;
	if (high <= 0) return `between ${shown(high)} and ${shown(low)} ${minus}`;
	return `between ${shown(low)} ${minus} and ${shown(high)} ${plus}`;
}

/**
 * A drawing under another reading of its numbers, every so many points of it; null when a position has no
 * place in that reading.
 */
export function redrawn(
	sketch: Sketch | null,
	place: (xy: [number, number]) => [number, number],
	every = 1,
): Sketch | null {
	if (!sketch) return null;
	const box: Box = [Infinity, Infinity, -Infinity, -Infinity];
	const lines: number[][] = [];
	for (const line of sketch.lines) {
		const drawn: number[] = [];
		for (let i = 0; i < line.length; i += 2) {
			if (i % (2 * every) !== 0 && i !== line.length - 2) continue;
			const [x, y] = place([line[i], line[i + 1]]);
			if (!Number.isFinite(x) || !Number.isFinite(y)) return null;
			drawn.push(Number(x.toFixed(6)), Number(y.toFixed(6)));
			box[0] = Math.min(box[0], x);
			box[1] = Math.min(box[1], y);
			box[2] = Math.max(box[2], x);
			box[3] = Math.max(box[3], y);
		}
		lines.push(drawn);
	}
	return { box, lines, leftOut: sketch.leftOut };
}
