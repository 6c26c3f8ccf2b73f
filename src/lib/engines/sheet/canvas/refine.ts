import { onlyArcs, withArcs, type LonLatArcs } from '../plane/arc-subsets.ts';
import { projectArcs } from '../plane/project-arcs.ts';
import { quantise } from '../plane/quantise.ts';
import type { PlacedFrame, Placement } from '../place-on-paper.ts';
import { meets, withBoxes, type Area, type Ground } from './ground.ts';

/**
 * A ground with finer lines where one looks. In: the ground of a drawing; a finer level of the same
 * coverage, with the same arcs; where the drawing was placed; an area of the paper. Out: the ground with
 * the arcs that meet the area taken from the finer level and all others as they were, so that the points
 * of one window are all that is added. Ends of arcs stay, so rings close.
 */
export function refineGround(
	ground: Ground,
	finer: LonLatArcs,
	placement: Placement,
	area: Area,
): Ground {
	const frames: PlacedFrame[] = [placement, ...placement.insets];
	const wanted: number[][] = frames.map(() => []);
	for (let arc = 0; arc + 1 < finer.arcStarts.length; arc++) {
		const shrunk = ground.arcStarts[arc + 1] - ground.arcStarts[arc] < 2;
		if (shrunk || !meets(ground.arcBoxes, arc, area)) continue;
		wanted[placement.arcFrame?.[arc] ?? 0].push(arc);
	}
	const patches = frames.map(({ chosen, fit, slack }, frame) => {
		const plane = projectArcs(onlyArcs(finer, wanted[frame]), chosen.projection, slack);
		return { arcs: wanted[frame], points: quantise(plane, fit) };
	});
	return withBoxes({ ...ground, ...withArcs(ground, patches) });
}
