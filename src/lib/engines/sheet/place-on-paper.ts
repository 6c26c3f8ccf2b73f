/**
 * Coverage to paper: which parts share a frame, a projection for each frame, where each stands and at
 * which scale, and all arcs in whole hundredths of a millimetre.
 */
import type { Coverage } from '../boundaries/coverage.ts';
import { drawnRings } from './fills.ts';
import { figureRoom } from './graticule/figure-room.ts';
import { graticuleSteps } from './graticule/step.ts';
import { insetsOnPaper, type PlacedInset } from './insets/insets-on-paper.ts';
import { arcsOfFrame, missingWords, partition, withAdded } from './insets/partition.ts';
import type { SharedOut } from './insets/share-out.ts';
import type { SheetLayout } from './layout.ts';
import type { ArcSides } from './lines.ts';
import { onlyArcs, partsOnly, withArcs } from './plane/arc-subsets.ts';
import { chooseProjection, type ProjectionChoice } from './plane/choose-projection.ts';
import { drawable, type Drawable } from './plane/drawable.ts';
import { extentOf, type Extent } from './plane/extent.ts';
import { fitMap, planeBoxOf, type PlaneBox } from './plane/fit-map.ts';
import type { Box, Fit } from './plane/fit.ts';
import { globeOutline } from './plane/globe-outline.ts';
import { projectArcs, type PlaneArcs } from './plane/project-arcs.ts';
import type { ChosenProjection } from './plane/projections.ts';
import { quantise, type SheetArcs } from './plane/quantise.ts';
import { slackOf } from './plane/slack.ts';

/** How places on the ground come to places on the paper, in one frame. */
export interface PlacedFrame {
	chosen: ChosenProjection;
	fit: Fit;
	/** radii of the sphere by which a line may be off at its middle */
	slack: number;
}

/** The frames of a sheet: the map's own and those of its insets. */
export interface Placement extends PlacedFrame {
	insets: PlacedFrame[];
	/** frame of each arc: 0 the map's own, from 1 an inset's, 255 none; null where all are in the map's */
	arcFrame: Uint8Array | null;
}

export interface OnPaper extends Placement {
	chosen: ProjectionChoice;
	insets: PlacedInset[];
	arcs: SheetArcs;
	sides: ArcSides;
	rings: Int32Array[][];
	/** the map's place, within the figures at its edge */
	box: Box;
	/** the middle of the map's own regions */
	middle: { x: number; y: number };
	extent: Extent;
	/** outline of the globe, x and y interleaved, where the map shows the whole of it */
	globe: Int32Array | null;
	/** 1 : n at the middle; null where it cannot be measured */
	ratio: number | null;
	clusters: SharedOut[];
	/** what could not be done as asked */
	told: string[];
	/** the map at the ratio asked for, if that did not fit */
	tooLarge: { widthMm: number; heightMm: number } | null;
}

/** What the collar leaves for the map when a sentence stands at its foot. */
export type FrameFor = (sentence: string) => {
	map: Box;
	scale: number;
	/** where something of the collar stands on the map's box */
	obstacles?: readonly Box[];
};

/** Regions keep so far from an edge that is drawn, on A4. */
const clearOfEdge = 250;

/** From here on a map shows the whole globe. */
const worldSpan = 300;

/** In: `groups`, the level above of every region, by which insets are named. */
export function placeOnPaper(
	coverage: Coverage,
	layout: SheetLayout,
	frameFor: FrameFor,
	groups: (string | null)[] = [],
): OnPaper {
	const parted = partition(coverage, layout, frameFor('').map);
	const extent = extentOf(parted.own ? partsOnly(coverage, parted.own) : coverage);
	const chosen = chooseProjection(extent, layout);
	const missing = missingWords(coverage, groups, parted);
	const {
		map,
		scale,
		obstacles = [],
	} = frameFor(missing ? `${chosen.sentence} ${missing}` : chosen.sentence);
	const ready = drawable(coverage, chosen.cut, (arc) => !parted.arcFrame?.[arc]);
	const arcFrame = parted.arcFrame && withAdded(parted.arcFrame, ready);
	const slack = slackOf(extent);
	const own = ownArcs(ready, arcFrame, chosen, slack);
	const outline = shownGlobe(layout, extent, chosen);
	const bounds = planeBoxOf({
		points: outline ? joined(own.plane.points, outline) : own.plane.points,
	});
	const box = mapBox(map, layout, extent, scale);
	const boxed = parted.boxed.map((cluster, i) => {
		const arcs = arcsOfFrame(arcFrame!, i + 1);
		return { cluster, arcs, lines: onlyArcs(ready, arcs) };
	});
	const set = insetsOnPaper(coverage, layout, groups, boxed, {
		...{ box, scale, chosen, obstacles, rings: ready.rings },
		fitIn: (within) =>
			fitMap(
				bounds,
				chosen.projection,
				outline ? within : padded(within, layout, scale),
				layout.frame,
			),
		arcsAt: (fit) => own.arcsAt(fit, box),
	});
	const { fit, ratio, tooLarge } = set.map;
	return {
		...{ chosen, fit, slack, arcFrame, extent, box, ratio, tooLarge },
		...{ arcs: set.arcs, insets: set.insets, clusters: parted.clusters, sides: ready },
		rings: drawnRings(ready.rings, set.arcs),
		told: [chosen.refused, ...set.map.told, ...set.told].filter((one) => one !== null),
		middle: middleOf(bounds, fit),
		globe:
			outline &&
			Int32Array.from(outline, (at, i) => Math.round(at * fit.scale + (i % 2 ? fit.dy : fit.dx))),
	};
}

/** The arcs of the map's own frame on the plane, and how they come to the paper. */
function ownArcs(
	ready: Drawable,
	arcFrame: Uint8Array | null,
	{ projection }: ProjectionChoice,
	slack: number,
): { plane: PlaneArcs; arcsAt: (fit: Fit, box: Box) => SheetArcs } {
	if (!arcFrame) {
		const plane = projectArcs(ready, projection, slack);
		return { plane, arcsAt: (fit) => quantise(plane, fit) };
	}
	const arcs = arcsOfFrame(arcFrame, 0);
	const plane = projectArcs(onlyArcs(ready, arcs), projection, slack);
	const arcsAt = (fit: Fit, { x, y }: Box) =>
		withArcs(shrunk(arcFrame.length, x, y), [{ arcs, points: quantise(plane, fit) }]);
	return { plane, arcsAt };
}

/** Arcs of one point, which nothing draws. */
function shrunk(count: number, x: number, y: number): SheetArcs {
	const arcPoints = Int32Array.from({ length: 2 * count }, (_, i) => (i % 2 ? y : x));
	return { arcPoints, arcStarts: Uint32Array.from({ length: count + 1 }, (_, i) => i) };
}

/** The outline of the globe where the map goes round it and something is drawn that ends there. */
function shownGlobe({ frame }: SheetLayout, { west, east }: Extent, chosen: ProjectionChoice) {
	const wanted = frame.sea || frame.graticule || frame.neatLine;
	return wanted && east - west >= worldSpan ? globeOutline(chosen) : null;
}

function joined(points: Float64Array, more: Float64Array): Float64Array {
	const all = new Float64Array(points.length + more.length);
	all.set(points);
	all.set(more, points.length);
	return all;
}

/** Within an edge that is drawn the regions keep clear of it. */
export function padded(box: Box, { frame }: SheetLayout, scale: number): Box {
	if (!frame.neatLine && !frame.sea && !frame.graticule) return box;
	const air = Math.round(Math.min(clearOfEdge * scale, box.width / 10, box.height / 10));
	return {
		x: box.x + air,
		y: box.y + air,
		width: box.width - 2 * air,
		height: box.height - 2 * air,
	};
}

function mapBox(map: Box, { frame }: SheetLayout, extent: Extent, scale: number): Box {
	if (!frame.graticule?.figures) return map;
	const { lat, lon } = graticuleSteps(frame.graticule.step, extent);
	return figureRoom(map, scale, !Number.isInteger(lat) || !Number.isInteger(lon));
}

const middleOf = ({ left, right, top, bottom }: PlaneBox, { scale, dx, dy }: Fit) => ({
	x: (scale * (left + right)) / 2 + dx,
	y: (scale * (top + bottom)) / 2 + dy,
});
