import { createReadStream, statSync } from 'node:fs';
import type { ByteSource } from '../../engines/boundaries/index.ts';

/** A file on disk as the engine reads it, a mebibyte at a time. */
export const fileSource = (path: string, name: string): ByteSource => ({
	name,
	size: statSync(path).size,
	chunks: () => createReadStream(path, { highWaterMark: 1 << 20 }),
});
