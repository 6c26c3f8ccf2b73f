import { Refusal } from '../refusal.ts';
import { markedEncoding } from './decoded.ts';

const latin1 = new TextDecoder('latin1');

/**
 * The encoding of an XML file: by its mark, else by its declaration, else UTF-8 (XML 1.0, appendix F).
 * Refuses a name that the platform does not know.
 */
export function xmlEncoding(first: Uint8Array): string {
	const marked = markedEncoding(first);
	if (marked) return marked;
	const start = latin1.decode(first.subarray(0, 200));
	const declared = /^\s*<\?xml[^>]*\bencoding\s*=\s*["']([\w.-]+)["']/.exec(start)?.[1];
	if (declared === undefined) return 'utf-8';
	try {
		return new TextDecoder(declared).encoding;
	} catch {
		const message = `The file is written in "${declared}", an encoding that is not known here.`;
		throw new Refusal('unsupported-format', message);
	}
}
