import { channelsOf, hexOf, type Triple } from './hex.ts';

/**
 * One sRGB channel made linear in light, 0 to 1.
 * Source: IEC 61966-2-1; the threshold 0.04045 is also that of WCAG 2.2.
 */
export function toLinear(channel: number): number {
	return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
}

/** The inverse of `toLinear`. Source: IEC 61966-2-1. */
export function fromLinear(light: number): number {
	return light <= 0.0031308 ? light * 12.92 : 1.055 * light ** (1 / 2.4) - 0.055;
}

/** Linear red, green and blue of a colour in hex digits, 0 to 1. Throws on text that is no colour. */
export function linearOf(hex: string): Triple {
	const [red, green, blue] = channelsOf(hex);
	return [toLinear(red), toLinear(green), toLinear(blue)];
}

/** The nearest `#rrggbb` to linear red, green and blue; what lies outside 0 to 1 is clipped. */
export function hexOfLinear(linear: Triple): string {
	const [red, green, blue] = clipped(linear);
	return hexOf([fromLinear(red), fromLinear(green), fromLinear(blue)]);
}

/** Each channel brought into 0 to 1. */
export function clipped([red, green, blue]: Triple): Triple {
	return [clip(red), clip(green), clip(blue)];
}

function clip(channel: number): number {
	return Math.min(1, Math.max(0, channel));
}

/** A 3 by 3 matrix, rows in turn, applied to three channels. */
export function times(matrix: readonly number[], [x, y, z]: Triple): Triple {
	return [
		matrix[0] * x + matrix[1] * y + matrix[2] * z,
		matrix[3] * x + matrix[4] * y + matrix[5] * z,
		matrix[6] * x + matrix[7] * y + matrix[8] * z,
	];
}
