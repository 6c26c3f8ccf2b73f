/** Three channels, red first. What they measure is said by the function that takes them. */
export type Triple = readonly [number, number, number];

/**
 * Reads a colour written as hex digits.
 *
 * In: `#rrggbb` or `#rgb`, upper or lower case, with or without the `#`, blanks around it ignored.
 * Out: `#rrggbb` in lower case, or null when the text is anything else (a colour with transparency
 * included: fills are opaque, or two neighbours would mix with what lies below).
 */
export function readHex(text: string): string | null {
	const digits = /^\s*#?([0-9a-f]{3}|[0-9a-f]{6})\s*$/i.exec(text)?.[1]?.toLowerCase();
	if (!digits) return null;
	return digits.length === 6 ? `#${digits}` : `#${digits.replace(/./g, '$&$&')}`;
}

/**
 * The three sRGB channels of a colour, 0 to 1.
 *
 * In: a colour as `readHex` accepts it. Throws a RangeError on any other text: whoever takes colours
 * from outside reads them with `readHex` first.
 */
export function channelsOf(hex: string): Triple {
	const read = readHex(hex);
	if (!read) throw new RangeError(`Not a colour in hex digits: ${hex}`);
	const value = parseInt(read.slice(1), 16);
	return [(value >> 16) / 255, ((value >> 8) & 255) / 255, (value & 255) / 255];
}

/** Writes sRGB channels (0 to 1, anything outside is clipped) as `#rrggbb`, rounded to 8 bits. */
export function hexOf(channels: Triple): string {
	return `#${channels.map(byteOf).join('')}`;
}

function byteOf(channel: number): string {
	const byte = Math.round(Math.min(1, Math.max(0, channel)) * 255);
	return byte.toString(16).padStart(2, '0');
}
