import { unzipSync, zipSync } from 'fflate';

/** Written into every entry in place of the time of writing. */
const fixedTime = '2026-01-01T00:00:00';

/**
 * The same zip with one fixed time on every entry, so that the same content gives the same bytes on any
 * day and in any time zone. Entries keep their order.
 */
export function repeatableZip(bytes: Uint8Array): Uint8Array {
	return zipSync(unzipSync(bytes), { level: 9, mtime: fixedTime });
}
