/** The chunks of a PNG file. Source: PNG specification, third edition (W3C 2025), sections 5 and 11. */
const signature = [137, 80, 78, 71, 13, 10, 26, 10];

export interface Chunk {
	/** four letters */
	type: string;
	data: Uint8Array;
}

/** In: a PNG file. Out: its chunks in order, data shared with the file. Throws RangeError for anything else. */
export function readChunks(png: Uint8Array): Chunk[] {
	if (signature.some((byte, i) => png[i] !== byte)) throw new RangeError('not a PNG file');
	const view = new DataView(png.buffer, png.byteOffset, png.byteLength);
	const chunks: Chunk[] = [];
	for (let at = signature.length; at + 12 <= png.length;) {
		const length = view.getUint32(at);
		if (at + 12 + length > png.length) throw new RangeError('a PNG file that ends too early');
		const type = String.fromCharCode(...png.subarray(at + 4, at + 8));
		chunks.push({ type, data: png.subarray(at + 8, at + 8 + length) });
		at += 12 + length;
	}
	return chunks;
}

export function writeChunks(chunks: readonly Chunk[]): Uint8Array {
	const size = chunks.reduce((sum, { data }) => sum + 12 + data.length, signature.length);
	const png = new Uint8Array(size);
	const view = new DataView(png.buffer);
	png.set(signature);
	let at = signature.length;
	for (const { type, data } of chunks) {
		view.setUint32(at, data.length);
		[...type].forEach((letter, i) => view.setUint8(at + 4 + i, letter.charCodeAt(0)));
		png.set(data, at + 8);
		view.setUint32(at + 8 + data.length, crc(png.subarray(at + 4, at + 8 + data.length)));
		at += 12 + data.length;
	}
	return png;
}

const table = Uint32Array.from({ length: 256 }, (_, byte) => {
	let rest = byte;
	for (let bit = 0; bit < 8; bit++) rest = rest & 1 ? 0xedb88320 ^ (rest >>> 1) : rest >>> 1;
	return rest;
});

/** Cyclic redundancy check of annex D. */
function crc(bytes: Uint8Array): number {
	let rest = 0xffffffff;
	for (const byte of bytes) rest = table[(rest ^ byte) & 0xff] ^ (rest >>> 8);
	return (rest ^ 0xffffffff) >>> 0;
}
