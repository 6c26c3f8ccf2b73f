/**
 * Everything on the sheet beside the map, and the box it leaves for the map. In: what is to be said.
 * Out: texts and rects inside the margins, and places for the legend and the scale bar. Where the
 * paper is too small, all type shrinks together until the map has at least two fifths of its height.
 */
import type { Reader } from '../../palettes/palette.ts';
import type { DrawnInk, DrawnText, LegendPlace } from '../drawing.ts';
import type { SheetLayout } from '../layout.ts';
import { hundredths, paperScale, paperSize } from '../paper.ts';
import type { Box } from '../plane/fit.ts';
import { cleanText } from '../type/clean-text.ts';
import { foot } from './foot.ts';
import { heading } from './heading.ts';
import { textBlocks, type SetTextBlock } from './text-blocks.ts';
import { planLegend, type LegendPlan } from './legend-plan.ts';
import { besideMap, onMap } from './place-legend.ts';

export interface Collar {
	map: Box;
	texts: DrawnText[];
	legend: LegendPlace | null;
	/** a legend that is still to find its corner on the map */
	floating: LegendPlan | null;
	bar: { x: number; y: number; longest: number; size: number } | null;
	/** text blocks and what hides the map under them */
	blocks: SetTextBlock[];
	/** where no name of the map may stand */
	obstacles: Box[];
	/** type and line scale that was used */
	scale: number;
}

export interface CollarInput {
	layout: SheetLayout;
	inks: DrawnInk[];
	coloured: boolean;
	/** who could miss some of the borders drawn double; none where none is */
	weak: ReadonlySet<Reader>;
	/** how many there are */
	regions: number;
	projection: string;
	issue: string;
}

/** Legend and scale figures on A4: 7.5 point. */
const legendSize = 265;
/** Least share of the paper's height that the map gets. */
const mapShare = 0.4;

export function collar(input: CollarInput): Collar {
	const { widthMm, heightMm } = paperSize(input.layout);
	let scale = paperScale(widthMm, heightMm);
	let laid = layOut(input, scale);
	for (let round = 0; round < 20 && laid.map.height < mapShare * hundredths(heightMm); round++) {
		scale *= 0.9;
		laid = layOut(input, scale);
	}
	return laid;
}

function layOut(input: CollarInput, scale: number): Collar {
	const { layout, inks, coloured } = input;
	const { widthMm, heightMm } = paperSize(layout);
	const margin = hundredths(
		Math.min(Math.max(layout.marginMm, 2), Math.min(widthMm, heightMm) / 5),
	);
	const [left, top] = [margin, margin];
	const width = hundredths(widthMm) - 2 * margin;
	const bottom = hundredths(heightMm) - margin;
	const [title, subtitle] = [cleanText(layout.title), cleanText(layout.subtitle)];
	const head = heading(title, subtitle, scale, left, top, width);
	const base = foot(layout, input.projection, input.issue, scale, left, bottom, width);
	const size = Math.round(legendSize * scale);
	const air = Math.round(size * 1.2);

	const at = layout.collar.legendAt;
	const barWidth = layout.scaleBar ? Math.round(width * 0.3) : 0;
	const showLegend = layout.legend && coloured && inks.length > 0;
	const legendWidth = width - (barWidth ? barWidth + 2 * size : 0);
	const below = showLegend && at === 'foot' ? planLegend(input, size, legendWidth) : null;
	const legendHigh = below?.height ?? 0;
	const barHigh = layout.scaleBar ? Math.round(size * 2.3) : 0;
	const high = Math.max(legendHigh, barHigh);
	const row = bottom - base.height - (high ? high + air : 0);

	const paper = { x: 0, y: 0, width: hundredths(widthMm), height: hundredths(heightMm) };
	const small = { x: left, y: bottom - base.height, width, height: base.height };
	const blocks = textBlocks(layout.collar.blocks, paper, small);
	const mapTop = top + (head.height ? head.height + air : 0);
	const map = { x: left, y: mapTop, width, height: row - air - mapTop };
	const beside =
		showLegend && (at === 'left' || at === 'right') ? besideMap(input, at, map, size) : null;
	const legend = below && { ...below, x: left + width - legendWidth, y: row };
	return {
		map: beside?.map ?? map,
		texts: [...head.texts, ...base.texts],
		legend: beside?.legend ?? legend,
		floating: showLegend && at === 'corner' ? onMap(input, map, size) : null,
		blocks,
		obstacles: blocks.map(({ box }) => box),
		bar: layout.scaleBar ? { x: left, y: row, longest: Math.round(width * 0.2), size } : null,
		scale,
	};
}
