/**
 * Everything that belongs to the map's frame and is neither region nor name: water around the regions,
 * graticule, insets' frames, neat line, north arrow; and the report of what could not be done as asked.
 */
import { labelInk } from '../../colour/index.ts';
import type { Reader } from '../../palettes/palette.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import type { DrawnRect, DrawnText } from '../drawing.ts';
import type { FrameReport } from '../frame-report.ts';
import { drawGraticule } from '../graticule/draw-graticule.ts';
import { clusterName, whereabouts } from '../insets/cluster-name.ts';
import { drawInsets } from '../insets/draw-insets.ts';
import { freeGrid } from '../insets/free-grid.ts';
import { ratioWords } from '../insets/inset-size.ts';
import type { SheetLayout } from '../layout.ts';
import type { OnPaper } from '../place-on-paper.ts';
import type { Box } from '../plane/fit.ts';
import type { DrawnShape } from '../shapes.ts';
import { cleanText } from '../type/clean-text.ts';
import { enclosedGaps } from './lakes.ts';
import { northArrow } from './north-arrow.ts';
import { paperThatFits } from './paper-that-fits.ts';

export interface DrawnFrame {
	shapes: DrawnShape[];
	texts: DrawnText[];
	rects: DrawnRect[];
	report: FrameReport;
	/** insets in a sentence, for who does not see the sheet; '' without any */
	sentence: string;
}

export interface FrameInput {
	coverage: Coverage;
	groups: (string | null)[];
	layout: SheetLayout;
	placed: OnPaper;
	scale: number;
	/** names on the map, which the arrow and figures keep clear of */
	labels: DrawnText[];
	/** where something of the collar stands on the map's box */
	obstacles: readonly Box[];
	/** the box that another layout would leave for the map, between its figures */
	roomOn: (layout: SheetLayout) => Box;
	reader: Reader;
	see: (hex: string, reader: Reader) => string;
}

/** Width of the neat line on A4, and of the globe's outline where none is asked for. */
const neat = { line: 25, outline: 12 };

export function drawFrame(input: FrameInput): DrawnFrame {
	const { layout, placed, scale, labels, coverage } = input;
	const { frame } = layout;
	const gaps = frame.lakes ? enclosedGaps(coverage, placed.arcs, placed.sides) : [];
	const seaInk = labelInk(frame.sea ?? '#ffffff');
	const taken = [...input.obstacles, ...placed.insets.map(({ outer }) => outer)];
	const graticule = drawGraticule(placed, frame, scale, labels, taken);
	const insets = drawInsets(placed, scale, layout.scaleBar, seaInk);
	const arrow = frame.northArrow ? arrowOf(input, graticule.texts) : noArrow;
	return {
		shapes: [
			...(frame.sea ? [tint('sea', [groundOf(placed)], frame.sea, input)] : []),
			...(gaps.length ? [tint('lakes', gaps, frame.lakes!, input)] : []),
			...graticule.shapes,
			...insets.shapes,
			...neatLine(placed, layout, scale),
			...arrow.shapes,
		],
		texts: [
			...graticule.texts,
			...insets.texts,
			...arrow.texts.map((text) => ({ ...text, hex: seaInk })),
		],
		rects: insets.rects,
		report: reportOf(
			input,
			[...toldOf(input), ...graticule.told],
			arrow.reason,
			graticule.steps,
			gaps.length,
		),
		sentence: sentenceOf(placed),
	};
}

const noArrow = { shapes: [], texts: [], reason: null };

function arrowOf({ placed, scale, labels, obstacles }: FrameInput, figures: DrawnText[]) {
	const grid = freeGrid(placed.arcs, placed.rings, placed.box);
	return northArrow(placed, grid, scale, [...labels, ...figures], obstacles);
}

/** What could not be done as asked. */
function toldOf({ placed, layout, roomOn }: FrameInput): string[] {
	if (!placed.tooLarge) return placed.told;
	return [...placed.told, paperThatFits(placed.tooLarge, layout, roomOn)];
}

const corners = ({ x, y, width, height }: Box): number[] => [
	...[x, y, x + width, y],
	...[x + width, y + height, x, y + height],
];

/** What the map covers: the globe where it shows the whole of it, else its box. */
const groundOf = ({ globe, box }: OnPaper): number[] => (globe ? [...globe] : corners(box));

function tint(
	layer: 'sea' | 'lakes',
	paths: number[][],
	hex: string,
	{ see, reader }: FrameInput,
): DrawnShape {
	let end = 0;
	return {
		layer,
		points: Int32Array.from(paths.flat()),
		starts: Uint32Array.from([0, ...paths.map((path) => (end += path.length / 2))]),
		...{ closed: true, fill: see(hex, reader), set: hex, stroke: null, strokeWidth: 0 },
	};
}

function neatLine(placed: OnPaper, { frame }: SheetLayout, scale: number): DrawnShape[] {
	if (!frame.neatLine && !placed.globe) return [];
	const path = groundOf(placed);
	return [
		{
			layer: 'neat-line',
			points: Int32Array.from(path),
			starts: Uint32Array.of(0, path.length / 2),
			...{ closed: true, fill: null, stroke: '#000000' },
			strokeWidth: Math.max(8, Math.round((frame.neatLine ? neat.line : neat.outline) * scale)),
		},
	];
}

function sentenceOf({ insets }: OnPaper): string {
	const drawn = insets.filter(({ ratio }) => ratio > 0);
	const list = drawn.map(({ name, ratio }) => `${name}, ${ratioWords(ratio)}`);
	return list.length ? `In boxes of their own: ${list.join('; ')}.` : '';
}

function reportOf(
	{ placed, coverage, groups }: FrameInput,
	told: string[],
	noArrow: string | null,
	graticule: FrameReport['graticule'],
	lakes: number,
): FrameReport {
	const { chosen, insets } = placed;
	const { kind, why, refused, equalArea, figures } = chosen;
	return {
		projection: {
			kind,
			why,
			refused,
			equalArea,
			parallels: figures.parallels,
			centre: figures.centre,
		},
		...{ ratio: placed.ratio, told, noArrow, graticule, lakes },
		clusters: placed.clusters.map((cluster) => {
			const box = insets.find(({ id, ratio }) => id === cluster.id && ratio > 0);
			const { id, regions, areaKm2, place, suits, speck } = cluster;
			return {
				...{ id, areaKm2, place, suits, speck, regions: regions.length },
				name: cleanText(`${clusterName(coverage, groups, cluster)}${whereabouts(cluster)}`),
				ratio: box?.ratio ?? null,
				cornerMm: box ? [box.outer.x / 100, box.outer.y / 100] : null,
			};
		}),
	};
}
