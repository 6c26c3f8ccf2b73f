import { Refusal } from '../refusal.ts';
import type { ByteReader, ByteSource } from '../options.ts';
import type { JsonBytes } from './json-bytes.ts';

const usualBytes = 1024 * 1024;

/** Reads chunks into a memory; what does not fit of one is kept for the next time. */
function readerOf(source: AsyncIterable<Uint8Array>): ByteReader {
	const chunks = source[Symbol.asyncIterator]();
	let rest: Uint8Array = new Uint8Array(0);
	return {
		async read(memory) {
			while (rest.length === 0) {
				const { value, done } = await chunks.next();
				if (done) return 0;
				rest = value;
			}
			const taken = rest.subarray(0, memory.length);
			memory.set(taken);
			rest = rest.subarray(taken.length);
			return taken.length;
		},
		async close() {
			await chunks.return?.();
		},
	};
}

/**
 * Slides the reader's window along a file: what was not used is kept, and what follows is added.
 * When nothing at all was used the next helping is as large as the window, so that a feature of any
 * size is started again only a few times. The window's memory is used again for every helping.
 */
export class Window {
	done = false;
	private input: ByteReader;
	private readBytes = 0;
	private memory = new Uint8Array(2 * usualBytes);

	constructor(
		private source: ByteSource,
		private json: JsonBytes,
	) {
		this.input = source.reader?.() ?? readerOf(source.chunks());
	}

	/** True when there is something to read; false when the reader is done. */
	async more(): Promise<boolean> {
		const { json } = this;
		if (this.done) return false;
		const kept = json.bytes.subarray(json.at);
		const wanted = kept.length + Math.max(usualBytes, kept.length);
		// one byte more, for the end mark that the reader sets
		if (wanted >= this.memory.length) this.memory = new Uint8Array(Math.ceil(wanted * 1.5));
		this.memory.set(kept);
		let length = kept.length;
		while (length < wanted && !json.last) {
			const added = await this.input.read(this.memory.subarray(length, wanted));
			if (added === 0) json.last = true;
			length += added;
		}
		const added = length - kept.length;
		json.base += json.at;
		json.at = 0;
		json.hold(this.memory, length);
		if (this.readBytes === 0) this.checkStart();
		this.readBytes += added;
		return true;
	}

	/** Lets go of the source, whether or not all of it was read. */
	async close(): Promise<void> {
		await this.input.close();
	}

	share(): number {
		return this.source.size ? Math.min(1, (this.json.base + this.json.at) / this.source.size) : 0;
	}

	/** Skips a UTF-8 mark; refuses the marks of other encodings. */
	private checkStart(): void {
		const { json } = this;
		const [a, b, c] = json.bytes;
		if (json.bytes.length === 0) throw new Refusal('empty-file', 'The file is empty.');
		if (a === 0xef && b === 0xbb && c === 0xbf) json.at = 3;
		if ((a === 0xff && b === 0xfe) || (a === 0xfe && b === 0xff)) {
			throw new Refusal('not-json', 'The file is in UTF-16; GeoJSON is written in UTF-8.');
		}
	}
}
