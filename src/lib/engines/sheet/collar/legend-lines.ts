import type { DrawnRect, LegendPlace, LineLayer } from '../drawing.ts';
import type { DrawnShape } from '../shapes.ts';
import { boxHigh, boxWide, gap, leading } from './legend-plan.ts';
import type { Cell } from './legend-grid.ts';
import { noLegend, word, wordsBeside, type DrawnLegend } from './legend-parts.ts';

interface KnownRank {
	line: LineLayer;
	words: string;
}

/** The ranks that a legend is to explain and that are drawn. */
export const knownRanks = ({ ranks }: LegendPlace, lines: LineLayer[]): KnownRank[] =>
	ranks.flatMap(({ rank, words }) => {
		const line = lines.find((one) => one.rank === rank);
		return line ? [{ line, words }] : [];
	});

/** Samples of ranks of line, each in its cell. */
export function rankSamples(place: LegendPlace, ranks: KnownRank[], cells: Cell[]): DrawnLegend[] {
	const { size } = place;
	const wide = Math.round(size * boxWide);
	return ranks.map(({ line, words }, i) => {
		const { x, y: top, high } = cells[i];
		const y = Math.round(top + (high - size * 0.5) / 2);
		return {
			rects: [],
			texts: wordsBeside(place, words, Math.round(x + size * (boxWide + gap)), y),
			shapes: [sample(line, x, y, wide)],
		};
	});
}

function sample({ hex, width, dash }: LineLayer, x: number, y: number, wide: number): DrawnShape {
	return {
		layer: 'legend',
		points: Int32Array.of(x, y, x + wide, y),
		starts: Uint32Array.of(0, 2),
		closed: false,
		fill: null,
		stroke: hex,
		strokeWidth: width,
		...(dash && { dash }),
	};
}

/** Two strokes, as borders that some readers could miss are drawn, and what they mean. */
export function weakSample(place: LegendPlace, top: number): DrawnLegend {
	if (place.weak.length === 0) return noLegend;
	const { size, x, weak } = place;
	const y = Math.round(top + (size * boxHigh) / 2);
	const wide = Math.round(size * boxWide);
	const line = Math.max(8, Math.round(size / 10));
	const strokes = [-1.5, 0.5].map((step): DrawnRect => ({
		layer: 'legend',
		x,
		y: Math.round(y + step * line),
		...{ width: wide, height: line, fill: '#000000', stroke: null, strokeWidth: 0 },
	}));
	const texts = weak.map((text, i) => ({
		...word('sans', size, text, '#000000'),
		x: Math.round(x + size * (boxWide + gap)),
		y: Math.round(y + size * 0.33 + size * leading * i),
	}));
	return { rects: strokes, texts, shapes: [] };
}
