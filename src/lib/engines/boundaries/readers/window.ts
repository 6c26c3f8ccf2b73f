import { Refusal } from '../refusal.ts';
import type { ByteSource } from '../options.ts';
import type { JsonBytes } from './json-bytes.ts';

const usualBytes = 1024 * 1024;

/**
 * Slides the reader's window along a file: what was not used is kept, and what follows is added.
 * When nothing at all was used the next helping is as large as the window, so that a feature of any
 * size is started again only a few times. The window's memory is used again for every helping.
 */
export class Window {
	done = false;
	private chunks: AsyncIterator<Uint8Array>;
	private readBytes = 0;
	private memory = new Uint8Array(2 * usualBytes);

	constructor(
		private source: ByteSource,
		private json: JsonBytes,
	) {
		this.chunks = source.chunks()[Symbol.asyncIterator]();
	}

	/** True when there is something to read; false when the reader is done. */
	async more(): Promise<boolean> {
		const { json } = this;
		if (this.done) {
			await this.chunks.return?.();
			return false;
		}
		const kept = json.bytes.subarray(json.at);
		const helping = Math.max(usualBytes, kept.length);
		this.reserve(kept.length + helping);
		this.memory.set(kept);
		let length = kept.length;
		while (length < kept.length + helping && !json.last) {
			const { value, done } = await this.chunks.next();
			if (done) json.last = true;
			else {
				this.reserve(length + value.length, length);
				this.memory.set(value, length);
				length += value.length;
			}
		}
		const added = length - kept.length;
		json.base += json.at;
		json.at = 0;
		json.bytes = this.memory.subarray(0, length);
		if (this.readBytes === 0) this.checkStart();
		this.readBytes += added;
		return true;
	}

	/** Makes room for so many bytes; the first `held` are kept. */
	private reserve(bytes: number, held = 0): void {
		if (bytes <= this.memory.length) return;
		const larger = new Uint8Array(Math.ceil(bytes * 1.5));
		larger.set(this.memory.subarray(0, held));
		this.memory = larger;
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
