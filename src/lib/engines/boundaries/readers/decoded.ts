import type { ByteSource } from '../options.ts';
import { mendWindows1252 } from './windows-1252.ts';

/** Thrown when bytes are not in the encoding that they were taken to be in. */
export class WrongEncoding extends Error {}

/** The encoding that the first bytes mark (Unicode byte order marks), else null. */
export function markedEncoding([a, b, c]: Uint8Array): string | null {
	if (a === 0xef && b === 0xbb && c === 0xbf) return 'utf-8';
	if (a === 0xff && b === 0xfe) return 'utf-16le';
	return a === 0xfe && b === 0xff ? 'utf-16be' : null;
}

/** A file's text piece by piece, its mark dropped; letters cut by a piece's end are put together. */
export async function* decoded(source: ByteSource, encoding: string): AsyncGenerator<string> {
	const decoder = new TextDecoder(encoding, { fatal: true });
	const mend = decoder.encoding === 'windows-1252' ? mendWindows1252 : (text: string) => text;
	const decode = (bytes: Uint8Array | undefined) => {
		try {
			return mend(decoder.decode(bytes, { stream: bytes !== undefined }));
		} catch {
			throw new WrongEncoding();
		}
	};
	for await (const piece of source.chunks()) yield decode(piece);
	yield decode(undefined);
}
