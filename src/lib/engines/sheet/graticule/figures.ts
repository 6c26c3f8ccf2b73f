/**
 * Figures of the graticule at the edge of the map: meridians above and below, parallels left and right;
 * round a pole meridians on all sides, and parallels along a meridian. No two overlap.
 */
import type { DrawnText } from '../drawing.ts';
import type { Box } from '../plane/fit.ts';
import { textWidth } from '../type/text-width.ts';
import { figureSize } from './figure-room.ts';
import type { Graticule, GraticuleLine } from './lines.ts';
import { figureOf } from './step.ts';

type Side = 'left' | 'right' | 'top' | 'bottom';
type Place = [number, number];

export interface FigureGround {
	box: Box;
	/** whether lines end at the outline of the globe and not at the box */
	globe: boolean;
	scale: number;
	/** names on the map, which figures along a meridian keep clear of */
	labels: DrawnText[];
	/** what stands on the map, which they keep clear of as well: insets, a legend, texts */
	taken: readonly Box[];
}

const wordsOf = ({ kind, value }: GraticuleLine): string =>
	kind === 'meridian' ? figureOf(value, 'E', 'W') : figureOf(value, 'N', 'S');

/** Side of the box that a place lies on. */
function sideOf([x, y]: Place, { x: left, y: top, width, height }: Box): Side | null {
	if (Math.abs(y - top - height) < 1) return 'bottom';
	if (Math.abs(y - top) < 1) return 'top';
	if (Math.abs(x - left) < 1) return 'left';
	return Math.abs(x - left - width) < 1 ? 'right' : null;
}

/** Ends of a line at the outline of the globe: parallels left and right, meridians above and below. */
function globeSide(kind: GraticuleLine['kind'], [x, y]: Place, [ox, oy]: Place): Side {
	if (kind === 'parallel') return x < ox ? 'left' : 'right';
	return y > oy ? 'bottom' : 'top';
}

/** Left end of the baseline of a figure outside an edge. */
function beside([x, y]: Place, side: Side, size: number, width: number): Place {
	const gap = size * 0.35;
	if (side === 'bottom') return [x - width / 2, y + gap + size * 0.75];
	if (side === 'top') return [x - width / 2, y - gap];
	if (side === 'left') return [x - gap - width, y + size * 0.26];
	return [x + gap, y + size * 0.26];
}

const boxOf = ({ x, y, width, size }: DrawnText) =>
	[x - 0.25 * size, y - 0.9 * size, x + width + 0.25 * size, y + 0.3 * size] as const;

export function overlaps(a: DrawnText, b: DrawnText): boolean {
	const [[l, t, r, u], [l2, t2, r2, u2]] = [boxOf(a), boxOf(b)];
	return l < r2 && l2 < r && t < u2 && t2 < u;
}

function isOver(figure: DrawnText, { x, y, width, height }: Box): boolean {
	const [left, top, right, bottom] = boxOf(figure);
	return left < x + width && x < right && top < y + height && y < bottom;
}

export function graticuleFigures({ lines, seen }: Graticule, ground: FigureGround): DrawnText[] {
	const size = figureSize(ground.scale);
	const figures: DrawnText[] = [];
	const put = (text: string, place: (width: number) => Place, more: DrawnText[] = []): boolean => {
		const width = Math.ceil(textWidth('sans', size, text));
		const [x, y] = place(width).map(Math.round);
		const figure: DrawnText = {
			layer: 'graticule',
			text,
			x,
			y,
			size,
			width,
			face: 'sans',
			hex: '#000000',
		};
		if (more.length) figure.halo = '#ffffff';
		if ([...figures, ...ground.labels].some((other) => overlaps(figure, other))) return false;
		if (ground.taken.some((box) => isOver(figure, box))) return false;
		figures.push(figure);
		return true;
	};
	for (const line of lines) {
		for (const { at, side } of endsOf(line, ground)) {
			const fits =
				line.kind === 'meridian'
					? side === 'top' || side === 'bottom'
					: side === 'left' || side === 'right';
			if (seen.pole ? line.kind === 'meridian' : fits)
				put(wordsOf(line), (width) => beside(at, side, size, width));
		}
	}
	if (seen.pole) alongMeridians(lines, size, ground, put);
	return figures;
}

function endsOf({ kind, pieces }: GraticuleLine, { box, globe }: FigureGround) {
	return pieces.flatMap((piece) => {
		const [first, last] = [piece[0], piece[piece.length - 1]];
		return [
			{ at: first, other: last },
			{ at: last, other: first },
		].flatMap(({ at, other }) => {
			const side = globe ? globeSide(kind, at, other) : sideOf(at, box);
			return side ? [{ at, side }] : [];
		});
	});
}

/** Round a pole a parallel meets no edge: its figure stands on it, on the first place that is free. */
function alongMeridians(
	lines: GraticuleLine[],
	size: number,
	{ box, labels }: FigureGround,
	put: (text: string, place: (width: number) => Place, more: DrawnText[]) => boolean,
): void {
	const within = ([x, y]: Place, width: number) =>
		x - width / 2 > box.x + size &&
		x + width / 2 < box.x + box.width - size &&
		y > box.y + size &&
		y < box.y + box.height - size;
	for (const line of lines.filter(({ kind }) => kind === 'parallel')) {
		const text = wordsOf(line);
		const width = textWidth('sans', size, text);
		const places = line.pieces.flat().filter((place) => within(place, width));
		for (let i = 0; i < places.length; i += Math.max(1, Math.floor(places.length / 24))) {
			const [x, y] = places[i];
			const blocked = labels.length ? labels : [];
			if (put(text, (wide) => [x - wide / 2, y + size * 0.26], blocked)) break;
		}
	}
}
