import { SaxesParser } from 'saxes';
import { damaged } from './damaged.ts';
import type { WorkbookPackage } from './package.ts';

/** Parts of workbooks nest a few elements deep. */
const mostDepth = 100;
/** A cell holds at most 32,767 characters; a tag or text far beyond that would only fill the memory. */
const mostBytesWithoutTag = 4 * 1024 ** 2;

export type Attributes = Record<string, string>;

/** Called with names that have no prefix, whatever prefix the writer chose. */
export interface XmlHandlers {
	open(name: string, attributes: Attributes): void;
	close?(name: string): void;
	text?(text: string): void;
	/** after each helping of bytes, with their number */
	read?(bytes: number): void;
}

const bare = (name: string): string => name.slice(name.indexOf(':') + 1);

/** Parses a part as it is unpacked. Entities of a document type are not known and none are fetched. */
export function parsePart(pack: WorkbookPackage, name: string, handlers: XmlHandlers): void {
	const parser = new SaxesParser({ position: false });
	let depth = 0;
	let sinceTag = 0;
	parser.on('error', (error) => {
		throw damaged(`"${name}" is not well-formed (${error.message})`);
	});
	parser.on('doctype', () => {
		throw damaged(`"${name}" has a document type, which no workbook has`);
	});
	parser.on('opentag', (tag) => {
		sinceTag = 0;
		if (++depth > mostDepth) throw damaged(`"${name}" is nested too deeply`);
		handlers.open(bare(tag.name), tag.attributes as Attributes);
	});
	parser.on('closetag', (tag) => {
		sinceTag = 0;
		depth--;
		handlers.close?.(bare(tag.name));
	});
	const text = (value: string) => handlers.text?.(value);
	parser.on('text', text);
	parser.on('cdata', text);
	let decoder: TextDecoder | null = null;
	for (const piece of pack.unpack(name)) {
		decoder ??= decoderFor(piece);
		sinceTag += piece.length;
		parser.write(decoder.decode(piece, { stream: true }));
		if (sinceTag > mostBytesWithoutTag) throw damaged(`"${name}" goes on without a tag`);
		handlers.read?.(piece.length);
	}
	parser.write(decoder?.decode() ?? '').close();
}

/** Parts are in UTF-8 or UTF-16 (ECMA-376 part 2, 6.2.5). */
function decoderFor([a, b]: Uint8Array): TextDecoder {
	if (a === 0xff && b === 0xfe) return new TextDecoder('utf-16le');
	return new TextDecoder(a === 0xfe && b === 0xff ? 'utf-16be' : 'utf-8');
}

/** An attribute by its name without prefix. */
export function attribute(attributes: Attributes, name: string): string | undefined {
	if (name in attributes) return attributes[name];
	const found = Object.keys(attributes).find((key) => bare(key) === name);
	return found === undefined ? undefined : attributes[found];
}
