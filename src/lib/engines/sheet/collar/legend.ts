import { labelInk } from '../../colour/index.ts';
import type { DrawnInk, DrawnRect, DrawnText, LegendPlace } from '../drawing.ts';
import { cleanText } from '../type/clean-text.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened } from '../type/wrap-text.ts';

/** Parts of the type size. */
const boxWide = 2;
const boxHigh = 1.5;
const rowHigh = 2;
const gap = 0.5;
const between = 1.6;

const weakWords = 'Double line: two inks that some readers could not tell apart';

const nameOf = (ink: DrawnInk, number: number): string =>
	cleanText(ink.name) || `Ink ${number + 1}`;

/** Rows of a legend with room for so many inks. */
export function legendRows({ columns, weak }: Pick<LegendPlace, 'columns' | 'weak'>, inks: number) {
	return Math.ceil(inks / columns) + (weak ? 1 : 0);
}

export const legendHeight = (rows: number, size: number): number =>
	Math.ceil(rows * rowHigh * size);

/** As many columns as the longest name allows in a width; at least one, and never wider than that. */
export function legendColumns(inks: DrawnInk[], size: number, width: number) {
	const names = inks.map((ink, number) => textWidth('sans', size, nameOf(ink, number)));
	const step = Math.ceil(Math.max(...names, 0) + size * (boxWide + gap + between));
	const columns = Math.floor((width + size * between) / step);
	return columns < 1
		? { columns: 1, step: Math.floor(width + size * between) }
		: { columns: Math.min(columns, inks.length), step };
}

/**
 * The legend: a box for every ink in use, with its number, and its name beside it. In: `inUse` in
 * ascending order; those beyond the palette have no colour yet and no box. Out: rects and texts of layer `legend`; names too long for a column are shortened.
 */
export function drawLegend(place: LegendPlace, inks: DrawnInk[], inUse: number[]) {
	const used = inUse.filter((ink) => ink < inks.length);
	const { size, columns, step } = place;
	const rows = Math.ceil(used.length / columns);
	const rects: DrawnRect[] = [];
	const texts: DrawnText[] = [];
	used.forEach((ink, i) => {
		const x = Math.round(place.x + step * Math.floor(i / rows));
		const y = Math.round(place.y + size * rowHigh * (i % rows));
		const [wide, high] = [Math.round(size * boxWide), Math.round(size * boxHigh)];
		rects.push(box(x, y, wide, high, inks[ink].shown));
		const number = word('sans-bold', size, String(ink + 1), labelInk(inks[ink].shown));
		const base = y + Math.round(high / 2 + size * 0.33);
		texts.push({ ...number, x: Math.round(x + (wide - number.width) / 2), y: base });
		const room = step - size * (boxWide + gap + between);
		const name = shortened('sans', size, nameOf(inks[ink], ink), room);
		const left = Math.round(x + size * (boxWide + gap));
		if (name) texts.push({ ...word('sans', size, name, '#000000'), x: left, y: base });
	});
	return place.weak ? withWeak(place, rects, texts, rows) : { rects, texts };
}

function withWeak(place: LegendPlace, rects: DrawnRect[], texts: DrawnText[], rows: number) {
	const { size, x } = place;
	const y = Math.round(place.y + size * (rowHigh * rows + boxHigh / 2));
	const wide = Math.round(size * boxWide);
	const line = Math.max(8, Math.round(size / 10));
	const sample = [-1.5, 0.5].map((step) => ({
		...box(x, Math.round(y + step * line), wide, line, '#000000'),
		stroke: null,
		strokeWidth: 0,
	}));
	const words = shortened('sans', size, weakWords, place.width - size * (boxWide + gap));
	const text = {
		...word('sans', size, words, '#000000'),
		x: Math.round(x + size * (boxWide + gap)),
	};
	return {
		rects: [...rects, ...sample],
		texts: [...texts, { ...text, y: Math.round(y + size * 0.33) }],
	};
}

function box(x: number, y: number, width: number, height: number, fill: string): DrawnRect {
	const strokeWidth = Math.max(8, Math.round(height / 25));
	return { layer: 'legend', x, y, width, height, fill, stroke: '#000000', strokeWidth };
}

function word(face: 'sans' | 'sans-bold', size: number, text: string, hex: string): DrawnText {
	const width = Math.ceil(textWidth(face, size, text));
	return { layer: 'legend', text, x: 0, y: 0, size, width, face, hex };
}
