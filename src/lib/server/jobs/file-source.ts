import { createReadStream, statSync } from 'node:fs';
import { open, type FileHandle } from 'node:fs/promises';
import type { ByteReader, ByteSource } from '../../engines/boundaries/index.ts';

const chunkBytes = 1 << 20;

/** A file on disk as the engine reads it, a mebibyte at a time. */
export const fileSource = (path: string, name: string): ByteSource => ({
	name,
	size: statSync(path).size,
	chunks: () => createReadStream(path, { highWaterMark: chunkBytes }),
	reader: () => new FileReader(path),
});

/** Two memories in turn: one is filled from the file while what is in the other is worked on. */
class FileReader implements ByteReader {
	private file: FileHandle | null = null;
	private memories = [new Uint8Array(chunkBytes), new Uint8Array(chunkBytes)];
	private coming: Promise<Uint8Array> | null = null;
	private rest: Uint8Array = new Uint8Array(0);

	constructor(private path: string) {}

	async read(memory: Uint8Array): Promise<number> {
		if (this.rest.length === 0) {
			this.rest = await (this.coming ?? this.filled());
			this.coming = this.filled();
			// told to who waits for it, or to nobody when reading ends before
			this.coming.catch(() => undefined);
		}
		const taken = this.rest.subarray(0, memory.length);
		memory.set(taken);
		this.rest = this.rest.subarray(taken.length);
		return taken.length;
	}

	async close(): Promise<void> {
		await this.coming?.catch(() => undefined);
		await this.file?.close();
	}

	private async filled(): Promise<Uint8Array> {
		this.file ??= await open(this.path);
		this.memories.reverse();
		const [memory] = this.memories;
		const { bytesRead } = await this.file.read(memory, 0, chunkBytes);
		return memory.subarray(0, bytesRead);
	}
}
