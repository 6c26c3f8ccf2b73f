import type { Drawing, Ground } from '$lib/engines/sheet';
import type { Drawn } from './drawer';
import { arcsPath, type BorderArcs } from './sheet-places';

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
	/** arcs along a border; none where it is a point or a gap, or while they are not known yet */
	borderArcs: (border: number) => Uint32Array;
	/** takes in the arcs along borders where they followed */
	learn: (later: BorderArcs) => void;
	/** path of the line along a border; '' where it is a point or a gap */
	borderPath: (border: number) => string;
	/** where a finding's place lies on the sheet */
	places: Float64Array;
	/** name of the projection, in words */
	projection: string;
}

const none = new Uint32Array(0);

export function drawnSheet({
	drawing,
	borderArcs: given,
	...rest
}: Omit<Drawn, 'id' | 'sizesMm' | 'fills'>): DrawnSheet {
	let known = given;
	const borderArcs = (border: number) =>
		known ? known.arcs.subarray(known.starts[border], known.starts[border + 1]) : none;
	return {
		...rest,
		drawing,
		borderArcs,
		learn: (later) => void (known = later),
		borderPath: (border) => arcsPath(drawing, borderArcs(border)),
		projection: drawing.notes.projection.split(',')[0],
	};
}
