import { createReadStream, statSync } from 'node:fs';
import { open, type FileHandle } from 'node:fs/promises';
import type { ByteReader, ByteSource } from '../../engines/boundaries/index.ts';

/** A file on disk as the engine reads it, a mebibyte at a time. */
export const fileSource = (path: string, name: string): ByteSource => ({
	name,
	size: statSync(path).size,
	chunks: () => createReadStream(path, { highWaterMark: 1 << 20 }),
	reader: () => fileReader(path),
});

function fileReader(path: string): ByteReader {
	let file: FileHandle | null = null;
	return {
		async read(memory) {
			file ??= await open(path);
			return (await file.read(memory, 0, memory.length)).bytesRead;
		},
		async close() {
			await file?.close();
		},
	};
}
