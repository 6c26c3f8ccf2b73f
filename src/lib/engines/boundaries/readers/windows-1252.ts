/** What windows-1252 has at 0x80 to 0x9f; the five places it leaves open stay as they are. */
const upper = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

/**
 * A decoder of the platform that also holds for windows-1252: Node 20 decodes that one as ISO 8859-1,
 * so that œ and š become control characters.
 * Source: WHATWG Encoding Standard, index windows-1252.
 */
export function textDecoder(encoding: string): { decode(bytes: Uint8Array): string } {
	const decoder = new TextDecoder(encoding);
	if (decoder.encoding !== 'windows-1252') return decoder;
	return {
		decode: (bytes) =>
			decoder.decode(bytes).replace(/[\u0080-\u009f]/g, (c) => upper[c.charCodeAt(0) - 0x80]),
	};
}
