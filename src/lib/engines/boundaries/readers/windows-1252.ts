/** What windows-1252 has at 0x80 to 0x9f; the five places it leaves open stay as they are. */
const upper = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

/**
 * Text that was decoded as windows-1252, mended where the decoder took it for ISO 8859-1, as Node 20's
 * does, so that œ and š came out as control characters. Text decoded right is unchanged.
 * Source: WHATWG Encoding Standard, index windows-1252.
 */
export const mendWindows1252 = (text: string): string =>
	text.replace(/[\u0080-\u009f]/g, (c) => upper[c.charCodeAt(0) - 0x80]);

/** A decoder of the platform that also holds for windows-1252. */
export function textDecoder(encoding: string): { decode(bytes: Uint8Array): string } {
	const decoder = new TextDecoder(encoding);
	if (decoder.encoding !== 'windows-1252') return decoder;
	return { decode: (bytes) => mendWindows1252(decoder.decode(bytes)) };
}
