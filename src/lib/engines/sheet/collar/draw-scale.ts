import type { DrawnRect, DrawnText } from '../drawing.ts';
import type { SheetArcs } from '../plane/quantise.ts';
import { groundScaleAt, type GroundScale } from '../plane/ground-scale.ts';
import { spreadPlaces } from '../plane/spread-places.ts';
import type { OnPaper, PlacedFrame } from '../place-on-paper.ts';
import type { Collar } from './collar.ts';
import { drawScaleBar } from './draw-scale-bar.ts';
import { plainWithin, scaleBar, scaleError } from './scale-bar.ts';

/** About how many places the scale is measured at. */
const mostPlaces = 160;

/** The scale at places spread evenly over all borders of one frame, those furthest out among them. */
export function sampledScales(
	{ arcs, arcFrame }: Pick<OnPaper, 'arcs' | 'arcFrame'>,
	frame: number,
	{ chosen, fit }: PlacedFrame,
): GroundScale[] {
	const points = arcFrame
		? pointsOfFrame(arcs, arcFrame, frame)
		: Uint32Array.from({ length: arcs.arcPoints.length / 2 }, (_, i) => i);
	const scales: GroundScale[] = [];
	for (const point of spreadPlaces(arcs.arcPoints, points, mostPlaces)) {
		const [x, y] = [arcs.arcPoints[2 * point], arcs.arcPoints[2 * point + 1]];
		const scale = groundScaleAt(chosen.projection, fit, x, y);
		if (scale) scales.push(scale);
	}
	return scales;
}

function pointsOfFrame({ arcStarts }: SheetArcs, arcFrame: Uint8Array, frame: number): number[] {
	const points: number[] = [];
	arcFrame.forEach((own, arc) => {
		if (own !== frame) return;
		for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) points.push(point);
	});
	return points;
}

export interface DrawnScale {
	rects: DrawnRect[];
	texts: DrawnText[];
	sentence: string;
}

/** The scale bar, if there is an honest one and it is wanted, and the scale in a sentence. */
export function drawScale(placed: OnPaper, bar: Collar['bar']): DrawnScale {
	const none = { rects: [], texts: [] };
	const centre = groundScaleAt(
		placed.chosen.projection,
		placed.fit,
		placed.middle.x,
		placed.middle.y,
	);
	if (!centre)
		return { ...none, sentence: 'The scale at the centre of the sheet cannot be measured.' };
	const places = sampledScales(placed, 0, placed);
	const perUnit = Math.sqrt(centre.across * centre.down);
	const error = scaleError(perUnit, [centre, ...places]);
	// metres a hundredth of a millimetre are 100,000 to one
	const ratio = Number((perUnit * 100_000).toPrecision(3)).toLocaleString('en-GB');
	const about = `About 1 : ${ratio} at the centre`;
	const percent = `${(error * 100).toFixed(error < 0.1 ? 1 : 0)} %`;
	const trueBar = scaleBar(centre, places, bar?.longest ?? 1000);
	if (!trueBar) {
		const why = `lengths differ by up to ${percent} over the sheet`;
		return { ...none, sentence: `${about}; no scale bar, because ${why}.` };
	}
	const trust =
		error <= plainWithin
			? `lengths are true within ${percent} all over the sheet`
			: `lengths differ by up to ${percent} away from it`;
	const drawn = bar ? drawScaleBar(trueBar, bar.x, bar.y, bar.size) : none;
	return { ...drawn, sentence: `${about}; ${trust}.` };
}
