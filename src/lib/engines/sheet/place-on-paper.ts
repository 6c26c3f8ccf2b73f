import type { Coverage } from '../boundaries/coverage.ts';
import { drawnRings } from './fills.ts';
import type { SheetLayout } from './layout.ts';
import type { ArcSides } from './lines.ts';
import { chooseProjection } from './plane/choose-projection.ts';
import { drawable } from './plane/drawable.ts';
import { extentOf } from './plane/extent.ts';
import { fitInto, type Box, type Fit } from './plane/fit.ts';
import { projectArcs } from './plane/project-arcs.ts';
import type { ChosenProjection } from './plane/projections.ts';
import { quantise, type SheetArcs } from './plane/quantise.ts';

/** How places on the ground come to places on the paper. */
export interface Placement {
	chosen: ChosenProjection;
	fit: Fit;
	/** radii of the sphere by which a line may be off at its middle */
	slack: number;
}

export interface OnPaper extends Placement {
	arcs: SheetArcs;
	sides: ArcSides;
	rings: Int32Array[][];
}

/** A line may be off by this share of the map's extent before points are added to it. */
const slackShare = 1 / 20_000;

/** Coverage to paper: choose a projection, project, fit into the map's box, quantise. */
export function placeOnPaper(
	coverage: Coverage,
	layout: SheetLayout,
	boxFor: (sentence: string) => Box,
): OnPaper {
	const extent = extentOf(coverage);
	const chosen = chooseProjection(extent, layout);
	const reach = Math.max(extent.north - extent.south, extent.east - extent.west) * (Math.PI / 180);
	const ready = drawable(coverage, extent.crossed);
	const slack = Math.min(reach, 2) * slackShare;
	const plane = projectArcs(ready, chosen.projection, slack);
	const fit = fitInto(plane, boxFor(chosen.sentence));
	const arcs = quantise(plane, fit);
	return { chosen, fit, slack, arcs, sides: ready, rings: drawnRings(ready.rings, arcs) };
}
