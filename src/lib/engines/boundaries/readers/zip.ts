import { Inflate } from 'fflate';
import type { Limits } from '../options.ts';
import { Refusal } from '../refusal.ts';
import { crc32 } from './crc32.ts';
import { damaged, zipDirectory, type ZipEntry } from './zip-directory.ts';

const mostHelping = 16 * 1024;

/**
 * A zip archive whose files are unpacked on demand. Refused before anything is unpacked when the
 * declared sizes add up to too much, one is out of all proportion or an archive lies inside; and while unpacking as soon as a file
 * grows past what its directory declared.
 */
export class ZipArchive {
	entries: ZipEntry[];

	constructor(
		private bytes: Uint8Array,
		limits: Limits,
	) {
		this.entries = zipDirectory(bytes).filter((entry) => !entry.name.startsWith('__MACOSX/'));
		const declared = this.entries.reduce((sum, entry) => sum + entry.declaredBytes, 0);
		if (declared > limits.unpackedBytes) {
			const message = `The archive would unpack to ${declared} bytes; at most ${limits.unpackedBytes} are taken.`;
			throw new Refusal('too-large-unpacked', message);
		}
		const blown = this.entries.find(isBlownUp);
		if (blown) throw blownUp(blown);
		const nested = this.entries.find((entry) => /\.(zip|kmz|gz|7z|rar|tar)$/i.test(entry.name));
		if (nested) {
			const message = `The archive holds another archive ("${nested.name}"); unpack it first.`;
			throw new Refusal('unsupported-format', message);
		}
	}

	find(name: string): ZipEntry | undefined {
		const wanted = name.toLowerCase();
		return this.entries.find((entry) => entry.name.toLowerCase() === wanted);
	}

	/** The whole file, its length and checksum agreeing with the directory. */
	unpack(entry: ZipEntry): Uint8Array {
		const out = this.inflate(entry, entry.declaredBytes);
		if (out.length !== entry.declaredBytes) {
			throw damaged(`"${entry.name}" ends after ${out.length} of ${entry.declaredBytes} bytes`);
		}
		if (crc32(out) !== entry.crc) throw damaged(`the checksum of "${entry.name}" is wrong`);
		return out;
	}

	/** The first bytes of a file, fewer where it is shorter. */
	head(entry: ZipEntry, bytes: number): Uint8Array {
		return this.inflate(entry, bytes, true);
	}

	private packed(entry: ZipEntry): Uint8Array {
		const { bytes } = this;
		const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
		const at = entry.offset;
		if (at + 30 > bytes.length || view.getUint32(at, true) !== 0x04034b50) {
			throw damaged(`"${entry.name}" is not where the directory says`);
		}
		const start = at + 30 + view.getUint16(at + 26, true) + view.getUint16(at + 28, true);
		if (start + entry.packedBytes > bytes.length) throw damaged(`"${entry.name}" is cut off`);
		return bytes.subarray(start, start + entry.packedBytes);
	}

	private inflate(entry: ZipEntry, most: number, headOnly = false): Uint8Array {
		const packed = this.packed(entry);
		if (entry.method === 0) {
			if (packed.length > most && !headOnly) throw lies(entry);
			return packed.subarray(0, most);
		}
		if (entry.method !== 8) throw damaged(`"${entry.name}" is packed in an unknown way`);
		const out = new Uint8Array(most);
		let length = 0;
		let over = false;
		const inflate = new Inflate((chunk) => {
			if (over || length + chunk.length > most) over = true;
			out.set(chunk.subarray(0, Math.max(0, most - length)), Math.min(length, most));
			length = Math.min(most, length + chunk.length);
		});
		// what packs best unpacks to a thousand times its size, and a helping is unpacked at once
		const helping = Math.min(mostHelping, Math.max(64, Math.ceil(most / 16)));
		try {
			for (let at = 0; at < packed.length && !over; at += helping) {
				inflate.push(packed.subarray(at, at + helping), at + helping >= packed.length);
			}
		} catch (error) {
			throw new Refusal(
				'zip-damaged',
				`"${entry.name}" in the archive is damaged: ${String(error)}`,
			);
		}
		if (over && !headOnly) throw lies(entry);
		return out.subarray(0, length);
	}
}

/** Boundaries pack to a half or a fifth, tables of blanks to a hundredth; from here on it is no such file. */
const mostRatio = 200;
const ratioFromBytes = 64 * 1024 ** 2;

const isBlownUp = ({ declaredBytes, packedBytes }: ZipEntry) =>
	declaredBytes > ratioFromBytes && declaredBytes > mostRatio * packedBytes;

function blownUp({ name, declaredBytes, packedBytes }: ZipEntry): Refusal {
	const message = `"${name}" would unpack from ${packedBytes} to ${declaredBytes} bytes, more than ${mostRatio} times as much; no boundary file does.`;
	return new Refusal('too-large-unpacked', message);
}

function lies(entry: ZipEntry): Refusal {
	const message = `"${entry.name}" unpacks to more than the ${entry.declaredBytes} bytes its directory declares.`;
	return new Refusal('too-large-unpacked', message);
}
