/** Chunks of a PNG file, read by the grammar of its standard (third edition, 5.3), with Node's own crc32. */
import { crc32 } from 'node:zlib';

export function chunksOf(png: Uint8Array): { type: string; data: Buffer }[] {
	const bytes = Buffer.from(png);
	const chunks = [];
	for (let at = 8; at < bytes.length;) {
		const length = bytes.readUInt32BE(at);
		const body = bytes.subarray(at + 4, at + 8 + length);
		if (crc32(body) !== bytes.readUInt32BE(at + 8 + length))
			throw new Error(`a wrong sum at ${at}`);
		chunks.push({ type: body.toString('latin1', 0, 4), data: body.subarray(4) });
		at += 12 + length;
	}
	return chunks;
}
