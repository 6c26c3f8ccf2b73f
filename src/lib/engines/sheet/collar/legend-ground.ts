import type { LegendGround, LegendPlace } from '../drawing.ts';
import type { DrawnShape } from '../shapes.ts';
import type { DrawnLegend } from './legend-parts.ts';

interface Edges {
	left: number;
	top: number;
	right: number;
	bottom: number;
}

/** What the entries take up: a text from its cap height to its descender. */
function edgesOf({ rects, texts }: DrawnLegend): Edges {
	const boxes = [
		...rects.map(({ x, y, width, height }) => [x, y, x + width, y + height]),
		...texts.map(({ x, y, width, size }) => [x, y - 0.7 * size, x + width, y + 0.25 * size]),
	];
	const most = (i: number, of: (...all: number[]) => number) => of(...boxes.map((box) => box[i]));
	return {
		left: Math.floor(most(0, Math.min)),
		top: Math.floor(most(1, Math.min)),
		right: Math.ceil(most(2, Math.max)),
		bottom: Math.ceil(most(3, Math.max)),
	};
}

function moved({ rects, texts, shapes }: DrawnLegend, dx: number, dy: number): DrawnLegend {
	const to = <T extends { x: number; y: number }>(one: T): T => ({
		...one,
		x: one.x + dx,
		y: one.y + dy,
	});
	return {
		rects: rects.map(to),
		texts: texts.map(to),
		shapes: shapes.map((shape) => ({
			...shape,
			points: shape.points.map((at, i) => at + (i % 2 ? dy : dx)),
		})),
	};
}

/**
 * A legend that stands on the map, moved into its corner of the place that is kept for it, on a white ground
 * no larger than what it says needs. Without a ground, or with nothing to say, it is given back as it is.
 */
export function onGround(drawn: DrawnLegend, place: LegendPlace): DrawnLegend {
	const { ground } = place;
	if (!ground || (!drawn.rects.length && !drawn.texts.length)) return drawn;
	const { left, top, right, bottom } = edgesOf(drawn);
	const dx = Math.round(ground.right ? place.x + place.width - right : place.x - left);
	const dy = Math.round(ground.bottom ? place.y + place.height - bottom : place.y - top);
	const set = moved(drawn, dx, dy);
	const box = { left: left + dx, top: top + dy, right: right + dx, bottom: bottom + dy };
	return { ...set, shapes: [groundShape(box, ground), ...set.shapes] };
}

function groundShape({ left, top, right, bottom }: Edges, { air, line }: LegendGround): DrawnShape {
	const [l, t, r, b] = [left - air, top - air, right + air, bottom + air];
	return {
		layer: 'legend-ground',
		points: Int32Array.of(l, t, r, t, r, b, l, b),
		starts: Uint32Array.of(0, 4),
		closed: true,
		fill: '#ffffff',
		stroke: line ? '#000000' : null,
		strokeWidth: line,
	};
}
