import type { Coverage } from '../../boundaries/coverage.ts';
import { projectArcs } from '../plane/project-arcs.ts';
import { quantise } from '../plane/quantise.ts';
import type { Placement } from '../place-on-paper.ts';
import { meets, withBoxes, type Area, type Ground } from './ground.ts';

/**
 * A ground with finer lines where one looks. In: the ground of a drawing; a finer level of the same
 * coverage, with the same arcs; where the drawing was placed; an area of the paper. Out: the ground with
 * the arcs that meet the area taken from the finer level and all others as they were, so that the points
 * of one window are all that is added. Ends of arcs stay, so rings close.
 */
export function refineGround(
	ground: Ground,
	finer: Pick<Coverage, 'arcPoints' | 'arcStarts'>,
	{ chosen, fit, slack }: Placement,
	area: Area,
): Ground {
	const wanted: number[] = [];
	for (let arc = 0; arc + 1 < finer.arcStarts.length; arc++) {
		const shrunk = ground.arcStarts[arc + 1] - ground.arcStarts[arc] < 2;
		if (!shrunk && meets(ground.arcBoxes, arc, area)) wanted.push(arc);
	}
	const plane = projectArcs(only(finer, wanted), chosen.projection, slack);
	const fine = quantise(plane, fit);
	return withBoxes({ ...ground, ...spliced(ground, fine, wanted) });
}

function only({ arcPoints, arcStarts }: Pick<Coverage, 'arcPoints' | 'arcStarts'>, arcs: number[]) {
	const starts = new Uint32Array(arcs.length + 1);
	arcs.forEach((arc, i) => (starts[i + 1] = starts[i] + arcStarts[arc + 1] - arcStarts[arc]));
	const points = new Float64Array(2 * starts[arcs.length]);
	arcs.forEach((arc, i) =>
		points.set(arcPoints.subarray(2 * arcStarts[arc], 2 * arcStarts[arc + 1]), 2 * starts[i]),
	);
	return { arcPoints: points, arcStarts: starts };
}

function spliced(
	{ arcPoints, arcStarts }: Ground,
	fine: Pick<Ground, 'arcPoints' | 'arcStarts'>,
	arcs: number[],
) {
	const place = new Int32Array(arcStarts.length - 1).fill(-1);
	arcs.forEach((arc, i) => (place[arc] = i));
	const source = (arc: number) =>
		place[arc] < 0
			? arcPoints.subarray(2 * arcStarts[arc], 2 * arcStarts[arc + 1])
			: fine.arcPoints.subarray(2 * fine.arcStarts[place[arc]], 2 * fine.arcStarts[place[arc] + 1]);
	const starts = new Uint32Array(arcStarts.length);
	for (let arc = 0; arc < place.length; arc++)
		starts[arc + 1] = starts[arc] + source(arc).length / 2;
	const points = new Int32Array(2 * starts[place.length]);
	for (let arc = 0; arc < place.length; arc++) points.set(source(arc), 2 * starts[arc]);
	return { arcPoints: points, arcStarts: starts };
}
