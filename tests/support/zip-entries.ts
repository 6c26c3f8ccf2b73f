/** Entries of a zip by the grammar of its central directory (APPNOTE 6.3.10, 4.3.12), unpacked by zlib. */
import { crc32, inflateRawSync } from 'node:zlib';

export function zipEntries(zip: Uint8Array): { name: string; bytes: Buffer }[] {
	const all = Buffer.from(zip);
	const end = all.lastIndexOf(Buffer.from('PK\u0005\u0006', 'latin1'));
	const entries = [];
	let at = all.readUInt32LE(end + 16);
	for (let left = all.readUInt16LE(end + 10); left > 0; left--) {
		const [nameLength, extra, comment] = [28, 30, 32].map((field) => all.readUInt16LE(at + field));
		const name = all.toString('utf8', at + 46, at + 46 + nameLength);
		const local = all.readUInt32LE(at + 42);
		const start = local + 30 + all.readUInt16LE(local + 26) + all.readUInt16LE(local + 28);
		const packed = all.subarray(start, start + all.readUInt32LE(at + 20));
		const bytes = all.readUInt16LE(at + 10) === 8 ? inflateRawSync(packed) : packed;
		if (crc32(bytes) !== all.readUInt32LE(at + 16)) throw new Error(`a wrong sum for ${name}`);
		entries.push({ name, bytes });
		at += 46 + nameLength + extra + comment;
	}
	return entries;
}
