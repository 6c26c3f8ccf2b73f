/**
 * One description of a drawn sheet, read by every painter (SVG, canvas, PDF). Lengths are whole
 * hundredths of a millimetre from the top left corner of the paper, x to the right, y down.
 */
export interface Drawing {
	widthMm: number;
	heightMm: number;
	title: string;
	description: string;
	/** projected arcs: x, y interleaved; quantised once for all painters */
	arcPoints: Int32Array;
	arcStarts: Uint32Array;
	/** one fill a region, in region order */
	fills: RegionFill[];
	/** arcs grouped by rank: 'outer' | 'group' | 'region' | 'weak' ... drawn in this order */
	lines: LineLayer[];
	texts: DrawnText[];
	/** collar furniture: legend boxes, scale bar, frame */
	rects: DrawnRect[];
	/** labels that did not fit and are listed instead */
	unplaced: number[];
	/** longer sentences about the drawing: projection, scale, how true the bar is */
	notes: { projection: string; scale: string };
}

export interface RegionFill {
	region: number;
	key: string;
	name: string;
	ink: number;
	hex: string;
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
}

export interface DrawnText {
	layer: 'label' | 'title' | 'collar';
	text: string;
	/** left end of the baseline */
	x: number;
	y: number;
	/** 0.01 mm */
	size: number;
	width: number;
	face: 'sans' | 'sans-bold' | 'serif' | 'serif-bold' | 'serif-italic';
	hex: string;
	halo?: string;
	region?: number;
}

export interface DrawnRect {
	layer: string;
	x: number;
	y: number;
	width: number;
	height: number;
	fill: string | null;
	stroke: string | null;
	strokeWidth: number;
}
