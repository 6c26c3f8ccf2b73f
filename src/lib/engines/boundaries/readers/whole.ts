import type { ByteSource } from '../options.ts';
import { Refusal } from '../refusal.ts';

/** All bytes of a source, refused when there are more than `most`. */
export async function wholeFile(source: ByteSource, most: number): Promise<Uint8Array> {
	const pieces: Uint8Array[] = [];
	let length = 0;
	for await (const piece of source.chunks()) {
		length += piece.length;
		if (length > most) {
			const message = `The file is larger than ${most} bytes, which is the most this format may have.`;
			throw new Refusal('too-large-unpacked', message);
		}
		pieces.push(piece);
	}
	if (length === 0) throw new Refusal('empty-file', 'The file is empty.');
	return joined(pieces, length);
}

/** The first bytes of a source: a few thousand at least, where it has as many. */
export async function firstBytes(source: ByteSource): Promise<Uint8Array> {
	const pieces: Uint8Array[] = [];
	let length = 0;
	for await (const piece of source.chunks()) {
		pieces.push(piece);
		length += piece.length;
		if (length >= enough) break;
	}
	if (length === 0) throw new Refusal('empty-file', 'The file is empty.');
	return joined(pieces, length);
}

const enough = 4096;

function joined(pieces: Uint8Array[], length: number): Uint8Array {
	if (pieces.length === 1) return pieces[0];
	const bytes = new Uint8Array(length);
	let at = 0;
	for (const piece of pieces) {
		bytes.set(piece, at);
		at += piece.length;
	}
	return bytes;
}
