import { Inflate } from 'fflate';
import { Refusal } from '../../boundaries/refusal.ts';
import { crc32 } from '../../boundaries/readers/crc32.ts';
import { zipDirectory, type ZipEntry } from '../../boundaries/readers/zip-directory.ts';
import type { TableLimits } from '../options.ts';
import { TableRefusal } from '../refusal.ts';
import { damaged } from './damaged.ts';

/** packed; unpacks to at most a thousand times as much */
const helpingBytes = 4 * 1024;
/** Sheets pack to a tenth or a twentieth; from so many times their packed size on it is no table. */
const mostRatio = 250;
const ratioFromBytes = 64 * 1024 ** 2;

/**
 * The parts of a workbook, which is a zip archive (ECMA-376 part 2). Refused before anything is unpacked
 * where the declared sizes are too much, and while unpacking where a part grows past its declared size.
 */
export class WorkbookPackage {
	private entries: Map<string, ZipEntry>;
	/** bytes of all parts that were unpacked, against `declaredBytes` */
	readonly declaredBytes: number;

	constructor(
		private bytes: Uint8Array,
		limits: TableLimits,
	) {
		const entries = directory(bytes);
		this.declaredBytes = entries.reduce((sum, { declaredBytes }) => sum + declaredBytes, 0);
		if (this.declaredBytes > limits.unpackedBytes || entries.some(isBlownUp)) {
			const message = `The workbook would unpack to ${this.declaredBytes} bytes, which is more than is taken (${limits.unpackedBytes}, and ${mostRatio} times the packed size).`;
			throw new TableRefusal('too-large-unpacked', message);
		}
		// names of parts do not tell capital letters apart (ECMA-376 part 2, 6.2.2.3)
		this.entries = new Map(entries.map((entry) => [entry.name.toLowerCase(), entry]));
	}

	has(name: string): boolean {
		return this.entries.has(name.toLowerCase());
	}

	/** Unpacks a part helping by helping. */
	*unpack(name: string): Generator<Uint8Array> {
		const entry = this.entries.get(name.toLowerCase());
		if (!entry) throw damaged(`its part "${name}" is missing`);
		let length = 0;
		let checksum = 0;
		for (const piece of inflated(packed(this.bytes, entry), entry)) {
			length += piece.length;
			checksum = crc32(piece, checksum);
			if (length > entry.declaredBytes) {
				const message = `"${name}" unpacks to more than the ${entry.declaredBytes} bytes its directory declares.`;
				throw new TableRefusal('too-large-unpacked', message);
			}
			yield piece;
		}
		if (length !== entry.declaredBytes || checksum !== entry.crc) {
			throw damaged(`"${name}" is not what its directory declares`);
		}
	}
}

const isBlownUp = ({ declaredBytes, packedBytes }: ZipEntry) =>
	declaredBytes > ratioFromBytes && declaredBytes > mostRatio * packedBytes;

function directory(bytes: Uint8Array): ZipEntry[] {
	try {
		return zipDirectory(bytes);
	} catch (error) {
		if (!(error instanceof Refusal)) throw error;
		throw damaged(error.message.replace(/^The archive cannot be read: |\.$/g, ''));
	}
}

function packed(bytes: Uint8Array, entry: ZipEntry): Uint8Array {
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	const at = entry.offset;
	if (at + 30 > bytes.length || view.getUint32(at, true) !== 0x04034b50) {
		throw damaged(`"${entry.name}" is not where the directory says`);
	}
	const start = at + 30 + view.getUint16(at + 26, true) + view.getUint16(at + 28, true);
	if (start + entry.packedBytes > bytes.length) throw damaged(`"${entry.name}" is cut off`);
	return bytes.subarray(start, start + entry.packedBytes);
}

function* inflated(bytes: Uint8Array, { name, method }: ZipEntry): Generator<Uint8Array> {
	if (method !== 0 && method !== 8) throw damaged(`"${name}" is packed in an unknown way`);
	let pieces: Uint8Array[] = [];
	const inflate = new Inflate((piece) => pieces.push(piece));
	for (let at = 0; at < bytes.length; at += helpingBytes) {
		const helping = bytes.subarray(at, at + helpingBytes);
		if (method === 0) {
			yield helping;
			continue;
		}
		try {
			inflate.push(helping, at + helpingBytes >= bytes.length);
		} catch (error) {
			throw damaged(
				`"${name}" does not unpack (${error instanceof Error ? error.message : error})`,
			);
		}
		yield* pieces;
		pieces = [];
	}
}
