import type { Reader } from '../../palettes/palette.ts';
import { toWhom } from '../../palettes/sentence.ts';
import type { DrawnInk, LegendPlace } from '../drawing.ts';
import type { SheetLayout } from '../layout.ts';
import { cleanText } from '../type/clean-text.ts';
import { textWidth } from '../type/text-width.ts';
import { wrapText } from '../type/wrap-text.ts';

/** Parts of the type size. */
export const boxWide = 2;
export const boxHigh = 1.5;
export const gap = 0.5;
export const between = 1.6;
export const leading = 1.15;
const rowHigh = 2;
const titleHigh = 1.75;

export const titleSize = (size: number): number => Math.round(size * 1.12);

/** Names are set in no more lines than this. */
const mostLines = 3;
/** Where names in one line ask for more rows than this, longer ones are wrapped. */
const rowsBeforeWrapping = 3;

const weakWords = (readers: ReadonlySet<Reader>) =>
	`Double line: two inks that look rather alike ${toWhom(readers)}`;

export interface LegendInput {
	layout: SheetLayout;
	inks: DrawnInk[];
	/** who could miss some of the borders drawn double */
	weak: ReadonlySet<Reader>;
	/** how many there are on the sheet */
	regions: number;
}

export type LegendPlan = Omit<LegendPlace, 'x' | 'y'>;

export const nameOf = (ink: DrawnInk, number: number): string =>
	cleanText(ink.name) || `Ink ${number + 1}`;

/** How many regions have an ink, after its name. */
export const countWords = (count: number): string =>
	`${count.toLocaleString('en-GB')} ${count === 1 ? 'region' : 'regions'}`;

/** The widest text of as many digits: a figure with fewer narrow ones may not ask for more room. */
function widestOf(text: string, size: number): string {
	const wide = (digit: string) => textWidth('sans', size, digit);
	const widest = [...'0123456789'].reduce((most, one) => (wide(one) > wide(most) ? one : most));
	return text.replace(/\d/g, widest);
}

/** Height of a row whose names take so many lines. */
export const rowHeight = (size: number, lines: number): number =>
	size * (lines <= 1 ? rowHigh : 0.5 + leading * lines);

/** Room for a name in a column. */
export const roomIn = ({ step, size }: Pick<LegendPlan, 'step' | 'size'>): number =>
	step - size * (boxWide + gap + between);

/** Where the inks begin below the legend's upper edge. */
export const headHeight = ({ title, size }: Pick<LegendPlan, 'title' | 'size'>): number =>
	Math.ceil(title.length * titleHigh * size);

/**
 * A legend of a palette within a width. In: type size and the greatest width. Out: columns, rows and the room
 * it needs whichever of the inks are in use; at least one column, names in one line where that takes few
 * rows, else wrapped.
 */
export function planLegend(input: LegendInput, size: number, width: number): LegendPlan {
	const { inks, layout, regions } = input;
	const { legendTitle, legendCounts, legendOrder, legendColumns } = layout.collar;
	const heading = cleanText(legendTitle);
	const title = heading ? wrapText('sans-bold', titleSize(size), heading, width) : [];
	const ranks = rankWords(layout);
	const counted = legendCounts ? `, ${widestOf(countWords(regions), size)}` : '';
	const words = [
		...inks.map((ink, number) => nameOf(ink, number) + counted),
		...ranks.map((rank) => rank.words),
	];
	const grid = gridOf(words, inks.length, size, width, legendColumns);
	const weak = input.weak.size
		? wrapText('sans', size, weakWords(input.weak), width - size * (boxWide + gap))
		: [];
	const plan = {
		...{ width, height: 0, size, title, ranks, weak, ...grid },
		...{ order: legendOrder, counts: legendCounts },
	};
	const height = heightOf(plan, words.slice(0, inks.length), words.slice(inks.length));
	return { ...plan, height, width: Math.min(width, naturalWidth(plan)) };
}

function naturalWidth({ columns, step, size, weak, title }: LegendPlan): number {
	const wide = (face: 'sans' | 'sans-bold', type: number, lines: string[]) =>
		Math.max(0, ...lines.map((line) => textWidth(face, type, line)));
	return Math.ceil(
		Math.max(
			columns * step - size * between,
			weak.length ? size * (boxWide + gap) + wide('sans', size, weak) : 0,
			wide('sans-bold', titleSize(size), title),
		),
	);
}

export const rowsOf = (columns: number, entries: number): number => Math.ceil(entries / columns);

/** Lines that a text takes in its column. */
export function linesOf(plan: Pick<LegendPlan, 'lines' | 'step' | 'size'>, text: string): number {
	if (plan.lines === 1) return 1;
	return Math.min(plan.lines, wrapText('sans', plan.size, text, roomIn(plan)).length);
}

/**
 * A row is as high as the longest of its names needs, so whichever inks are in use and in whatever order, the
 * rows are together no higher than those of as many of the longest names.
 */
function heightOf(plan: LegendPlan, inks: string[], ranks: string[]): number {
	const { size, columns, weak } = plan;
	const tallest = (texts: string[]) =>
		texts
			.map((text) => rowHeight(size, linesOf(plan, text)))
			.sort((a, b) => b - a)
			.slice(0, rowsOf(columns, texts.length))
			.reduce((sum, high) => sum + high, 0);
	const below = weak.length ? rowHeight(size, weak.length) : 0;
	return headHeight(plan) + Math.ceil(tallest(inks) + tallest(ranks) + below);
}

function rankWords({ collar, groupColumn }: SheetLayout): LegendPlan['ranks'] {
	if (!collar.legendLines) return [];
	const { outer, group, region } = collar.lineNames;
	return [
		{ rank: 'outer', words: cleanText(outer) || 'Outer boundary' },
		...(groupColumn
			? [{ rank: 'group', words: cleanText(group) || 'Boundary of the level above' }]
			: []),
		{ rank: 'region', words: cleanText(region) || 'Boundary of regions' },
	];
}

type Grid = Pick<LegendPlan, 'columns' | 'step' | 'lines'>;

function gridOf(
	words: string[],
	inks: number,
	size: number,
	width: number,
	asked: number | null,
): Grid {
	const longest = Math.max(0, ...words.map((one) => textWidth('sans', size, one)));
	const step = Math.ceil(longest + size * (boxWide + gap + between));
	const natural = Math.min(Math.floor((width + size * between) / step), Math.max(1, inks));
	if (asked === null && natural >= 1 && rowsOf(natural, inks) <= rowsBeforeWrapping)
		return { columns: natural, step, lines: 1 };
	const most = asked ?? Math.max(1, Math.min(inks, Math.floor(width / (size * 11))));
	const even = evenGrid(
		words,
		size,
		width,
		Math.max(1, Math.min(asked ?? most, Math.max(1, inks))),
	);
	const narrow = step <= even.step ? { ...even, step, lines: 1 } : even;
	if (asked !== null) return narrow;
	const tall = ({ columns }: Grid) => rowsOf(columns, inks);
	const one = { columns: natural, step, lines: 1 };
	return natural >= 1 && tall(one) <= tall(narrow) + 1 ? one : narrow;
}

/** Columns of one width, names wrapped in them. */
function evenGrid(words: string[], size: number, width: number, columns: number): Grid {
	const step = Math.floor((width + size * between) / columns);
	const room = roomIn({ step, size });
	const lines = words.map((one) => wrapText('sans', size, one, room).length);
	return { columns, step, lines: Math.min(mostLines, Math.max(1, ...lines)) };
}
