import { mendWindows1252 } from '../../boundaries/readers/windows-1252.ts';
import { note } from '../note.ts';
import { TableRefusal } from '../refusal.ts';
import type { TableNote } from '../table.ts';

const sampleBytes = 64 * 1024;
const chunkBytes = 1024 * 1024;

export interface FoundEncoding {
	encoding: string;
	notes: TableNote[];
}

/**
 * The encoding of a text: as told, else by its byte order mark, else UTF-16 by the zero bytes of its
 * Latin letters, else UTF-8 if all of it is valid, else windows-1252 with a note.
 */
export function findEncoding(bytes: Uint8Array, told?: string): FoundEncoding {
	const encoding = told === undefined ? byMark(bytes) : known(told);
	if (encoding) return { encoding, notes: [] };
	const wide = byZeroBytes(bytes);
	if (wide) return { encoding: wide, notes: [] };
	if (isUtf8(bytes)) return { encoding: 'utf-8', notes: [] };
	const message =
		'The file does not say how its letters are written; they were read as windows-1252. Check letters with accents.';
	return { encoding: 'windows-1252', notes: [note('warning', 'encoding-guessed', message)] };
}

function byMark([a, b, c]: Uint8Array): string | null {
	if (a === 0xef && b === 0xbb && c === 0xbf) return 'utf-8';
	if (a === 0xff && b === 0xfe) return 'utf-16le';
	return a === 0xfe && b === 0xff ? 'utf-16be' : null;
}

function known(label: string): string {
	try {
		return new TextDecoder(label).encoding;
	} catch {
		throw new TableRefusal('unknown-encoding', `There is no encoding called "${label}".`);
	}
}

function byZeroBytes(bytes: Uint8Array): string | null {
	const length = Math.min(bytes.length, sampleBytes) & ~1;
	const zeros = [0, 0];
	for (let i = 0; i < length; i++) if (bytes[i] === 0) zeros[i & 1]++;
	const pairs = length / 2;
	if (zeros[1] > pairs / 2 && zeros[0] === 0) return 'utf-16le';
	return zeros[0] > pairs / 2 && zeros[1] === 0 ? 'utf-16be' : null;
}

function isUtf8(bytes: Uint8Array): boolean {
	const strict = new TextDecoder('utf-8', { fatal: true });
	try {
		for (let at = 0; at < bytes.length; at += chunkBytes) {
			strict.decode(bytes.subarray(at, at + chunkBytes), { stream: true });
		}
		strict.decode();
		return true;
	} catch {
		return false;
	}
}

/** The text piece by piece, without a byte order mark, with how many bytes are behind each piece. */
export function* decodedPieces(
	bytes: Uint8Array,
	encoding: string,
): Generator<{ text: string; read: number }> {
	const decoder = new TextDecoder(encoding);
	const mend = encoding === 'windows-1252' ? mendWindows1252 : (text: string) => text;
	for (let at = 0; at < bytes.length; at += chunkBytes) {
		const read = Math.min(bytes.length, at + chunkBytes);
		const text = decoder.decode(bytes.subarray(at, read), { stream: read < bytes.length });
		yield { text: mend(text), read };
	}
}
