import type { DrawnRect, DrawnText, LegendPlace } from '../drawing.ts';
import type { DrawnShape } from '../shapes.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened, wrapText } from '../type/wrap-text.ts';
import { leading, roomIn } from './legend-plan.ts';

export interface DrawnLegend {
	rects: DrawnRect[];
	texts: DrawnText[];
	shapes: DrawnShape[];
}

export const noLegend: DrawnLegend = { rects: [], texts: [], shapes: [] };

/** Words in as many lines as the place allows, centred on a height. */
export function wordsBeside(place: LegendPlace, text: string, x: number, middle: number) {
	const { size, lines } = place;
	const room = roomIn(place);
	const all = wrapText('sans', size, text, room);
	const kept = lines === 1 ? [shortened('sans', size, text, room)] : all.slice(0, lines);
	if (lines > 1 && all.length > lines)
		kept[lines - 1] = shortened('sans', size, `${kept[lines - 1]}…`, room);
	const first = Math.round(middle) - size * leading * ((kept.length - 1) / 2);
	return kept.filter(Boolean).map((line, i) => ({
		...word('sans', size, line, '#000000'),
		x,
		y: Math.round(first + Math.round(size * 0.33) + size * leading * i),
	}));
}

export function word(
	face: 'sans' | 'sans-bold',
	size: number,
	text: string,
	hex: string,
): DrawnText {
	const width = Math.ceil(textWidth(face, size, text));
	return { layer: 'legend', text, x: 0, y: 0, size, width, face, hex };
}
