import type { Hatch } from '../../palettes/palette.ts';

/** A hatch in a sentence's part: `hatched, lines at 45° every 1.5 mm, 0.2 mm wide, #333333`. */
export function hatchWords({ kind, angle, spacingMm, widthMm, hex }: Hatch): string {
	const lines = kind === 'crossed' ? 'crossed lines' : 'lines';
	return `hatched, ${lines} at ${angle}° every ${spacingMm} mm, ${widthMm} mm wide, ${hex}`;
}
