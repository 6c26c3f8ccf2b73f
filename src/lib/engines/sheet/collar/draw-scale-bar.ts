import type { DrawnRect, DrawnText } from '../drawing.ts';
import { textWidth } from '../type/text-width.ts';
import { lengthWords, type ScaleBar } from './scale-bar.ts';

/** The bar standing on a baseline: a line with upright ends, its half marked, figures below. */
export function drawScaleBar(bar: ScaleBar, x: number, y: number, size: number) {
	const stroke = Math.max(8, Math.round(size / 14));
	const tall = Math.round(size * 0.8);
	const rect = (left: number, top: number, width: number, height: number): DrawnRect => ({
		layer: 'scale',
		x: left,
		y: top,
		width,
		height,
		fill: '#000000',
		stroke: null,
		strokeWidth: 0,
	});
	const middle = Math.round(bar.length / 2);
	const low = y + tall - stroke;
	const rects = [
		rect(x, low, bar.length, stroke),
		rect(x, y, stroke, tall),
		rect(
			x + middle - Math.round(stroke / 2),
			y + Math.round(tall / 2),
			stroke,
			Math.round(tall / 2),
		),
		rect(x + bar.length - stroke, y, stroke, tall),
	];
	return { rects, texts: figures(bar, x, y + tall + Math.round(size * 1.1), size) };
}

function figures(bar: ScaleBar, x: number, y: number, size: number): DrawnText[] {
	const whole = lengthWords(bar.metres);
	const half = lengthWords(bar.metres / 2);
	const at = (text: string, left: number, about: number): DrawnText => {
		const width = Math.ceil(textWidth('sans', size, text));
		return {
			layer: 'collar',
			text,
			x: Math.round(left - width * about),
			y,
			size,
			width,
			face: 'sans',
			hex: '#000000',
		};
	};
	const last = `${whole.figure} ${whole.unit}${bar.atCentre ? ' at the centre' : ''}`;
	const overhang = textWidth('sans', size, whole.figure) / 2;
	const texts = [at('0', x, 0), at(last, x + bar.length - overhang, 0)];
	const middle = at(half.figure, x + bar.length / 2, 0.5);
	if (half.unit === whole.unit && bar.length > 4 * size) texts.push(middle);
	return texts;
}
