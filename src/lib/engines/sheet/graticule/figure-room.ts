import type { Box } from '../plane/fit.ts';
import { textWidth } from '../type/text-width.ts';
import { minuteMark } from './step.ts';

/** Figures at the edge on A4: 6.5 point. */
export const figureSize = (scale: number): number => Math.round(229 * scale);

/** Widest figure that is reckoned with. */
const widest = { whole: '180° W', minutes: `180° 00${minuteMark} W` };

/** The box of the map within the strips that its figures stand in. */
export function figureRoom(box: Box, scale: number, minutes: boolean): Box {
	const size = figureSize(scale);
	const across = Math.ceil(
		textWidth('sans', size, minutes ? widest.minutes : widest.whole) + size * 0.8,
	);
	const down = Math.round(size * 1.5);
	return {
		x: box.x + across,
		y: box.y + down,
		width: box.width - 2 * across,
		height: box.height - 2 * down,
	};
}
