import { shapesIn, type DrawnShape, type ShapeLayer } from '../shapes.ts';
import type { Area } from './ground.ts';
import type { Pen } from './paint-area.ts';

/** Paths in one stroke: one for all of a long list takes seconds. */
const pathsAStroke = 400;

/** Paints the shapes of some layers, in their order; paths that cannot show in the area are passed over. */
export function paintShapes(
	pen: Pen,
	shapes: DrawnShape[],
	layers: readonly ShapeLayer[],
	area: Area,
): void {
	for (const layer of layers)
		for (const shape of shapesIn({ shapes }, layer)) paint(pen, shape, area);
}

function paint(pen: Pen, shape: DrawnShape, area: Area): void {
	pen.lineJoin = 'round';
	pen.lineCap = 'butt';
	const { fill, stroke, strokeWidth, dash, starts } = shape;
	const seen: number[] = [];
	for (let path = 0; path + 1 < starts.length; path++)
		if (shows(shape, path, area, stroke ? strokeWidth : 0)) seen.push(path);
	if (fill && seen.length) {
		pen.fillStyle = fill;
		pen.beginPath();
		for (const path of seen) trace(pen, shape, path);
		pen.fill('evenodd');
	}
	if (!stroke) return;
	pen.strokeStyle = stroke;
	pen.lineWidth = strokeWidth;
	pen.setLineDash(dash ?? []);
	for (let from = 0; from < seen.length; from += pathsAStroke) {
		pen.beginPath();
		for (const path of seen.slice(from, from + pathsAStroke)) trace(pen, shape, path);
		pen.stroke();
	}
	pen.setLineDash([]);
}

function shows({ points, starts }: DrawnShape, path: number, area: Area, width: number): boolean {
	if (starts[path + 1] - starts[path] < 2) return false;
	let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = starts[path]; i < starts[path + 1]; i++) {
		left = Math.min(left, points[2 * i]);
		right = Math.max(right, points[2 * i]);
		top = Math.min(top, points[2 * i + 1]);
		bottom = Math.max(bottom, points[2 * i + 1]);
	}
	return (
		left - width <= area.right &&
		right + width >= area.left &&
		top - width <= area.bottom &&
		bottom + width >= area.top
	);
}

function trace(pen: Pen, { points, starts, closed }: DrawnShape, path: number): void {
	pen.moveTo(points[2 * starts[path]], points[2 * starts[path] + 1]);
	for (let i = starts[path] + 1; i < starts[path + 1]; i++)
		pen.lineTo(points[2 * i], points[2 * i + 1]);
	if (closed) pen.closePath();
}
