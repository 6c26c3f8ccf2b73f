import type { Hatch } from '../../palettes/palette.ts';
import { hundredths } from '../paper.ts';
import type { LineFamily } from './cut-lines.ts';

/** No two lines lie closer than this, mm: closer ones print as a tint. */
const leastSpacingMm = 0.3;

/** The directions in which an ink is hatched, one or two. */
export function familiesOf({ kind, angle, spacingMm }: Hatch): LineFamily[] {
	const spacing = hundredths(Math.max(spacingMm, leastSpacingMm));
	const angles = kind === 'crossed' ? [angle, (angle + 90) % 180] : [angle];
	return angles.map((one) => ({ angle: one, spacing }));
}

/** Width of its lines, in hundredths of a millimetre; never as wide as they lie apart. */
export const hatchWidth = ({ widthMm, spacingMm }: Hatch): number =>
	hundredths(Math.min(widthMm, 0.8 * Math.max(spacingMm, leastSpacingMm)));

/** What tells two hatches apart where they are cut: colour and width change no segment. */
export const cutKey = ({ kind, angle, spacingMm }: Hatch): string =>
	`${kind} ${angle} ${spacingMm}`;
