import type { DrawnText } from '../drawing.ts';
import type { FrameLayout } from '../layout/frame.ts';
import type { OnPaper } from '../place-on-paper.ts';
import type { Box } from '../plane/fit.ts';
import type { DrawnShape } from '../shapes.ts';
import { graticuleFigures } from './figures.ts';
import { graticuleLines, mostLines } from './lines.ts';
import { graticuleSteps, type GraticuleSteps } from './step.ts';

/** Width on A4: finer than any border. */
const width = 7;
const grey = '#6e6e6e';

export interface DrawnGraticule {
	shapes: DrawnShape[];
	texts: DrawnText[];
	steps: GraticuleSteps | null;
	told: string[];
}

/** The graticule that the layout asks for. In: `labels`, the names on the map; `taken`, what else stands on it. */
export function drawGraticule(
	placed: OnPaper,
	{ graticule }: Pick<FrameLayout, 'graticule'>,
	scale: number,
	labels: DrawnText[],
	taken: readonly Box[],
): DrawnGraticule {
	if (!graticule) return { shapes: [], texts: [], steps: null, told: [] };
	const steps = graticuleSteps(graticule.step, placed.extent);
	const drawn = graticuleLines(placed, steps);
	const told = drawn.lines.length
		? []
		: [
				`No graticule is drawn: at ${steps.lat}° no line crosses the map, or more than ${mostLines} would.`,
			];
	const lines = drawn.lines.flatMap(({ pieces }) => pieces);
	const ground = { box: placed.box, globe: placed.globe !== null, scale, labels, taken };
	return {
		shapes: lines.length
			? [
					{
						...shapeOf(lines),
						layer: 'graticule',
						closed: false,
						fill: null,
						stroke: grey,
						strokeWidth: Math.max(5, Math.round(width * scale)),
					},
				]
			: [],
		texts: graticule.figures ? graticuleFigures(drawn, ground) : [],
		steps,
		told,
	};
}

/** Paths as a drawing holds them, places that fall together taken once. */
export function shapeOf(paths: [number, number][][]): Pick<DrawnShape, 'points' | 'starts'> {
	const points: number[] = [];
	const starts = [0];
	for (const path of paths) {
		const first = points.length;
		for (const place of path) {
			const [x, y] = place.map(Math.round);
			const end = points.length;
			if (end > first && points[end - 2] === x && points[end - 1] === y) continue;
			points.push(x, y);
		}
		if (points.length - first < 4) points.length = first;
		else starts.push(points.length / 2);
	}
	return { points: Int32Array.from(points), starts: Uint32Array.from(starts) };
}
