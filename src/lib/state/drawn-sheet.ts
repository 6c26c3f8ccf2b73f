import type { Drawing } from '$lib/engines/sheet/drawing';
import type { Drawn } from './drawer';
import { arcsPath } from './sheet-places';

/** What the page needs to know of a drawn sheet beside the SVG itself; hundredths of a millimetre. */
export interface DrawnSheet {
	drawing: Drawing;
	svg: string;
	/** x, y of a place inside the largest part of each region, interleaved */
	anchors: Float64Array;
	/** how large each region shows, mm */
	sizesMm: Float64Array;
	/** path of the line along a border; '' where it is a point or a gap */
	borderPath: (border: number) => string;
	/** where a finding's place lies on the sheet */
	places: Float64Array;
	/** name of the projection, in words */
	projection: string;
}

export const drawnSheet = ({
	drawing,
	svg,
	anchors,
	sizesMm,
	borderArcs: { starts, arcs },
	places,
}: Drawn): DrawnSheet => ({
	drawing,
	svg,
	anchors,
	sizesMm,
	places,
	borderPath: (border) => arcsPath(drawing, arcs.subarray(starts[border], starts[border + 1])),
	projection: drawing.notes.projection.split(',')[0],
});
