import type { Drawing, Ground } from '$lib/engines/sheet';
import type { Drawn } from './drawer';
import { arcsPath } from './sheet-places';

/** What the page needs to know of a drawn sheet beside the SVG itself; hundredths of a millimetre. */
export interface DrawnSheet {
	drawing: Drawing;
	/** '' where a canvas shows it */
	svg: string;
	/** the geometry that a canvas paints; null for an SVG */
	ground: Ground | null;
	unitsPerMetre: number;
	/** x, y of a place inside the largest part of each region, interleaved */
	anchors: Float64Array;
	/** arcs along a border; none where it is a point or a gap */
	borderArcs: (border: number) => Uint32Array;
	/** path of the line along a border; '' where it is a point or a gap */
	borderPath: (border: number) => string;
	/** where a finding's place lies on the sheet */
	places: Float64Array;
	/** name of the projection, in words */
	projection: string;
}

export function drawnSheet({
	drawing,
	borderArcs: { starts, arcs },
	...rest
}: Omit<Drawn, 'id' | 'sizesMm'>): DrawnSheet {
	const borderArcs = (border: number) => arcs.subarray(starts[border], starts[border + 1]);
	return {
		...rest,
		drawing,
		borderArcs,
		borderPath: (border) => arcsPath(drawing, borderArcs(border)),
		projection: drawing.notes.projection.split(',')[0],
	};
}
