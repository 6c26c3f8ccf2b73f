import { strToU8, unzipSync, zipSync, type ZippableFile } from 'fflate';

/** Written into every entry in place of the time of writing. */
const fixedTime = '2026-01-01T00:00:00';

/**
 * The same zip with one fixed time on every entry, so that the same content gives the same bytes on any
 * day and in any time zone. Entries keep their order; `mended` may put others in their place.
 */
export function repeatableZip(
	bytes: Uint8Array,
	mended: (name: string, entry: Uint8Array) => Uint8Array = (_, entry) => entry,
): Uint8Array {
	const entries = Object.entries(unzipSync(bytes)).map(([name, entry]) => [
		name,
		mended(name, entry),
	]);
	return zipSync(Object.fromEntries(entries), { level: 9, mtime: fixedTime });
}

/** Texts by file name as one zip, in that order; the same bytes on any day. */
export function zipOf(files: Record<string, string>): Uint8Array {
	const entries = Object.entries(files).map(([name, text]) => [name, strToU8(text)]);
	return zipSync(Object.fromEntries(entries), { level: 9, mtime: fixedTime });
}

/** Files by name as one zip, in that order; what is packed already is stored as it is. */
export function zipOfFiles(files: readonly { name: string; bytes: Uint8Array }[]): Uint8Array {
	const entries = files.map(({ name, bytes }): [string, ZippableFile] => [
		name,
		[bytes, { level: packed.test(name) ? 0 : 6 }],
	]);
	return zipSync(Object.fromEntries(entries), { mtime: fixedTime });
}

const packed = /\.(pdf|png|svgz|xlsx|zip)$/;
