import { labelInk } from '../../colour/index.ts';
import type { DrawnInk, DrawnRect, DrawnText, Drawing, LegendPlace } from '../drawing.ts';
import { cutLines } from '../hatch/cut-lines.ts';
import { familiesOf } from '../hatch/hatch-look.ts';
import { segmentShape } from '../hatch/hatch-shapes.ts';
import type { DrawnShape } from '../shapes.ts';
import { boxHigh, boxWide, countWords, gap, nameOf, titleSize } from './legend-plan.ts';
import { onGround } from './legend-ground.ts';
import { gridOf, type Cell } from './legend-grid.ts';
import { noLegend, word, wordsBeside, type DrawnLegend } from './legend-parts.ts';
import { knownRanks, rankSamples, weakSample } from './legend-lines.ts';

type Shown = Pick<Drawing, 'inks' | 'fills' | 'lines' | 'themed'>;

/**
 * The legend: a box for every ink in use, with its number (none where it stands for regions that are not
 * told) and its hatch, and its name beside it; then what
 * lines stand for. In: `inUse` in ascending order; those beyond the palette have no colour yet and no box;
 * `see` gives a colour as the reader sees it. Out: rects, texts and shapes of layer `legend`, within the
 * place; a name too long for its lines is shortened. On the map it stands on a white ground.
 */
export function drawLegend(
	place: LegendPlace | null,
	shown: Shown,
	inUse: readonly number[],
	see: (hex: string) => string,
): DrawnLegend {
	if (!place) return noLegend;
	const counts = countsOf(shown);
	const used = ordered(
		inUse.filter((ink) => ink < shown.inks.length),
		place,
		shown.inks,
		counts,
	);
	const words = used.map((ink) => {
		const name = nameOf(shown.inks[ink], ink);
		return place.counts ? `${name}, ${countWords(counts[ink])}` : name;
	});
	const ranks = knownRanks(place, shown.lines);
	const grid = gridOf(
		place,
		words,
		ranks.map((rank) => rank.words),
	);
	const drawn = used.map((ink, i) => {
		const numbered = ink < (shown.themed?.told ?? Infinity);
		return entry(place, grid.inkCells[i], shown.inks[ink], { ink, numbered }, words[i], see);
	});
	const all = joined([
		{ ...noLegend, texts: titleOf(place) },
		...drawn,
		...rankSamples(place, ranks, grid.rankCells),
		weakSample(place, grid.end),
	]);
	return onGround(all, place);
}

const joined = (parts: DrawnLegend[]): DrawnLegend => ({
	rects: parts.flatMap(({ rects }) => rects),
	texts: parts.flatMap(({ texts }) => texts),
	shapes: parts.flatMap(({ shapes }) => shapes),
});

function countsOf({ inks, fills }: Shown): number[] {
	const counts = inks.map(() => 0);
	for (const { ink } of fills) if (ink >= 0 && ink < counts.length) counts[ink]++;
	return counts;
}

function ordered(used: number[], { order }: LegendPlace, inks: DrawnInk[], counts: number[]) {
	if (order === 'regions') return used.sort((a, b) => counts[b] - counts[a] || a - b);
	if (order === 'number') return used;
	const collator = new Intl.Collator('en-GB', { numeric: true });
	return used.sort((a, b) => collator.compare(nameOf(inks[a], a), nameOf(inks[b], b)) || a - b);
}

function titleOf(place: LegendPlace): DrawnText[] {
	const size = titleSize(place.size);
	return place.title.map((line, i) => ({
		...word('sans-bold', size, line, '#000000'),
		x: place.x,
		y: Math.round(place.y + size * (0.8 + 1.5 * i)),
	}));
}

function entry(
	place: LegendPlace,
	{ x, y, high: row }: Cell,
	ink: DrawnInk,
	{ ink: number, numbered }: { ink: number; numbered: boolean },
	words: string,
	see: (hex: string) => string,
): DrawnLegend {
	const { size } = place;
	const [wide, high] = [Math.round(size * boxWide), Math.round(size * boxHigh)];
	const top = Math.round(y + (row - size * 0.5 - high) / 2);
	const label = word('sans-bold', size, String(number + 1), labelInk(ink.shown));
	const figure = {
		...label,
		...(ink.hatch && { halo: ink.shown }),
		x: Math.round(x + (wide - label.width) / 2),
		y: top + Math.round(high / 2 + size * 0.33),
	};
	const left = Math.round(x + size * (boxWide + gap));
	return {
		rects: [box(x, top, wide, high, ink.shown)],
		texts: [...(numbered ? [figure] : []), ...wordsBeside(place, words, left, top + high / 2)],
		shapes: ink.hatch ? hatchedBox(ink, number, x, top, wide, high, see) : [],
	};
}

/** The hatch as on the map; one so wide that a box would not show two of its lines is set closer. */
function hatchedBox(
	{ hatch }: DrawnInk,
	ink: number,
	x: number,
	y: number,
	wide: number,
	high: number,
	see: (hex: string) => string,
): DrawnShape[] {
	if (!hatch) return [];
	const ring = [x, y, x + wide, y, x + wide, y + high, x, y + high];
	const closest = (high / 2.2) * 0.01;
	const look = { ...hatch, spacingMm: Math.min(hatch.spacingMm, closest) };
	const parts = familiesOf(look).map((family) => cutLines([ring], family));
	const shape = segmentShape(parts, look, see);
	return shape ? [{ ...shape, layer: 'legend', ink }] : [];
}

function box(x: number, y: number, width: number, height: number, fill: string): DrawnRect {
	const strokeWidth = Math.max(8, Math.round(height / 25));
	return { layer: 'legend', x, y, width, height, fill, stroke: '#000000', strokeWidth };
}
