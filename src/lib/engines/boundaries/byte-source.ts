import type { ByteSource } from './options.ts';

/** Bytes in memory as a source, for tests and for files that a browser has already read. */
export function sourceOf(name: string, bytes: Uint8Array, chunkBytes = 1 << 20): ByteSource {
	return {
		name,
		size: bytes.length,
		async *chunks() {
			for (let at = 0; at < bytes.length; at += chunkBytes) {
				yield bytes.subarray(at, at + chunkBytes);
			}
		},
	};
}
