import type { Ink, Reader } from '../palettes/palette.ts';
import type { FrameReport } from './frame-report.ts';
import type { DrawnLettering } from './labels/set-name.ts';
import type { DrawnShape } from './shapes.ts';

/**
 * One description of a drawn sheet, read by every painter (SVG, canvas, PDF). Lengths are whole
 * hundredths of a millimetre from the top left corner of the paper, x to the right, y down.
 */
export interface Drawing {
	widthMm: number;
	heightMm: number;
	title: string;
	description: string;
	/** whose eyesight the colours are shown for */
	reader: Reader;
	/** the whole palette, in the order of ink numbers; `shown` is the colour as the reader sees it */
	inks: DrawnInk[];
	/** projected arcs: x, y interleaved; quantised once for all painters */
	arcPoints: Int32Array;
	/** arcs + 1; an arc of one point has shrunk to nothing and is in no ring and no line */
	arcStarts: Uint32Array;
	/** one fill a region, in region order */
	fills: RegionFill[];
	/**
	 * arcs grouped by rank, drawn in this order: 'region', 'group', 'outer', 'weak', 'weak-core', and
	 * 'leader' for lines from a region to its name
	 */
	lines: LineLayer[];
	/** everything else that is drawn, in no order: `shapes.ts` says what lies over what */
	shapes: DrawnShape[];
	texts: DrawnText[];
	/** collar furniture: legend boxes, scale bar */
	rects: DrawnRect[];
	/** regions whose name stands nowhere on the sheet, and is in the table only */
	unplaced: number[];
	/** how every name is set, and what is to be told of that */
	lettering: DrawnLettering;
	/** longer sentences about the drawing: projection, scale and how true the bar is, insets, legend */
	notes: { projection: string; scale: string; insets: string; legend: string };
	/** what the frame came to, and what could not be done as asked */
	frame: FrameReport;
	/** where the legend stands, so that it can be set anew when the inks in use change */
	legend: LegendPlace | null;
	/** set where the fills are classes of a measure and not a colouring */
	themed?: SheetThemed;
}

export interface SheetThemed {
	/** how many of the inks are classes, lowest first; the others are of regions that are not told */
	told: number;
}

export interface DrawnInk extends Ink {
	shown: string;
}

export interface RegionFill {
	region: number;
	key: string;
	name: string;
	/** ink number from 0, -1 while nothing is coloured */
	ink: number;
	/** the colour as the drawing's reader sees it */
	hex: string;
	locked?: boolean;
	/** signed arcs of each ring: i forward, ~i backward, as in Coverage */
	rings: Int32Array[];
}

export interface LineLayer {
	rank: string;
	/** 0.01 mm */
	width: number;
	hex: string;
	dash?: number[];
	arcs: Uint32Array;
	/**
	 * the same arcs joined into long lines, signed as in rings, where dashes have to run on; drawn in place of
	 * `arcs` where it is there
	 */
	chains?: Int32Array[];
	/** the colour itself, where `hex` is what the reader sees of it */
	own?: string;
}

export interface DrawnText {
	layer: 'label' | 'title' | 'collar' | 'legend' | 'water' | 'graticule' | 'block';
	text: string;
	/** left end of the baseline */
	x: number;
	y: number;
	/** 0.01 mm */
	size: number;
	width: number;
	face: 'sans' | 'sans-bold' | 'serif' | 'serif-bold' | 'serif-italic';
	hex: string;
	/** drawn under border lines, so that none is blotted; of a text `onFill` it is the fill's colour */
	halo?: string;
	/** added between two letters; part of `width` */
	spacing?: number;
	/** the halo is there because the fill is hatched, and goes with the hatch */
	clears?: true;
	region?: number;
	/** the label stands on its region's fill, from which its colour follows */
	onFill?: boolean;
}

export interface DrawnRect {
	layer: 'legend' | 'scale';
	x: number;
	y: number;
	width: number;
	height: number;
	fill: string | null;
	stroke: string | null;
	strokeWidth: number;
}

export interface LegendPlace {
	x: number;
	y: number;
	width: number;
	/** room that is kept for it, enough for every ink of the palette */
	height: number;
	/** type size */
	size: number;
	columns: number;
	/** from one column to the next */
	step: number;
	/** most lines that a name is set in; a row is as high as its longest name needs */
	lines: number;
	/** lines of its heading */
	title: string[];
	order: 'number' | 'name' | 'regions';
	/** whether each ink tells how many regions have it */
	counts: boolean;
	/** what ranks of line stand for */
	ranks: { rank: string; words: string }[];
	/** what the double line stands for, in lines; none where there is none */
	weak: string[];
	/** on the map: the ground under it */
	ground?: LegendGround;
}

/** A white ground, no larger than the entries need, in the corner of the legend's place that is the map's. */
export interface LegendGround {
	/** from the entries to its edge */
	air: number;
	/** width of the line round it, 0 for none */
	line: number;
	right: boolean;
	bottom: boolean;
}
