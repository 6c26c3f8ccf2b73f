/** Lines cut at boxes, straight segment by straight segment (Liang and Barsky 1984). */
import type { Box } from '../plane/fit.ts';

export type Line = [number, number][];

/** From where to where, as shares of its length, a segment runs inside a box; null where it does not. */
function sharesInside(
	[x0, y0]: Line[number],
	[x1, y1]: Line[number],
	box: Box,
): [number, number] | null {
	let [from, to] = [0, 1];
	const limits = [
		[x0 - x1, x0 - box.x],
		[x1 - x0, box.x + box.width - x0],
		[y0 - y1, y0 - box.y],
		[y1 - y0, box.y + box.height - y0],
	];
	for (const [step, room] of limits) {
		if (step === 0 && room < 0) return null;
		if (step < 0) from = Math.max(from, room / step);
		if (step > 0) to = Math.min(to, room / step);
	}
	return from < to ? [from, to] : null;
}

const between = ([x0, y0]: Line[number], [x1, y1]: Line[number], share: number): Line[number] =>
	share === 0
		? [x0, y0]
		: share === 1
			? [x1, y1]
			: [x0 + (x1 - x0) * share, y0 + (y1 - y0) * share];

/** The stretches of a line made of the given parts of each of its segments. */
function stretches(
	line: Line,
	kept: (a: Line[number], b: Line[number]) => [number, number][],
): Line[] {
	const pieces: Line[] = [];
	let open = false;
	for (let i = 1; i < line.length; i++) {
		const [a, b] = [line[i - 1], line[i]];
		const parts = kept(a, b);
		if (!parts.length) open = false;
		for (const [from, to] of parts) {
			if (!open || from > 0) pieces.push([between(a, b, from)]);
			pieces[pieces.length - 1].push(between(a, b, to));
			open = to === 1;
		}
	}
	return pieces;
}

export const insideOf = (line: Line, box: Box): Line[] =>
	stretches(line, (a, b) => {
		const inside = sharesInside(a, b, box);
		return inside ? [inside] : [];
	});

export const outsideOf = (line: Line, box: Box): Line[] =>
	stretches(line, (a, b) => {
		const inside = sharesInside(a, b, box);
		if (!inside) return [[0, 1]];
		const [from, to] = inside;
		const parts: [number, number][] = [];
		if (from > 0) parts.push([0, from]);
		if (to < 1) parts.push([to, 1]);
		return parts;
	});
