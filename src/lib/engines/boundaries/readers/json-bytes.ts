import { Refusal } from '../refusal.ts';
import { textDecoder } from './windows-1252.ts';

/** Thrown when the bytes at hand end before the value does; the reader takes more and starts it again. */
export const needMore = Symbol('more bytes');

export const byte = {
	quote: 34,
	comma: 44,
	colon: 58,
	open: 91,
	escape: 92,
	close: 93,
	openObject: 123,
	closeObject: 125,
} as const;

const powers = Array.from({ length: 23 }, (_, k) => Number(`1e${k}`));
const latin1 = new TextDecoder('latin1');
const utf8 = new TextDecoder('utf-8', { fatal: true });

/** Reads JSON values (RFC 8259) out of a window of bytes that slides along a file. */
export class JsonBytes {
	bytes: Uint8Array = new Uint8Array(0);
	/** the same with a zero behind it, so that a walk along digits ends without asking where the bytes do */
	private padded = this.bytes;
	at = 0;
	/** file offset of the window's first byte */
	base = 0;
	/** no bytes follow the window */
	last = false;
	/** which feature is being read, for messages */
	feature = 0;
	/** the encoding that text was found to be in */
	encoding = 'UTF-8';

	constructor(private nesting: number) {}

	/** Takes the first `length` bytes of a memory for its window; the byte after them is lost, if there is one. */
	hold(memory: Uint8Array, length: number): void {
		this.bytes = this.padded = memory.subarray(0, length);
		if (memory.length === length) return;
		memory[length] = 0;
		this.padded = memory.subarray(0, length + 1);
	}

	/** The next byte that is not white space, not taken. */
	peek(): number {
		const bytes = this.bytes;
		for (let at = this.at; at < bytes.length; at++) {
			const c = bytes[at];
			if (c !== 32 && c !== 10 && c !== 13 && c !== 9) {
				this.at = at;
				return c;
			}
		}
		this.at = bytes.length;
		return this.ended();
	}

	take(expected: number): void {
		if (this.peek() !== expected) {
			throw this.notJson(`expected "${String.fromCharCode(expected)}"`);
		}
		this.at++;
	}

	/** After an item: true when another follows, false when the list is closed. */
	another(close: number): boolean {
		const c = this.peek();
		if (c !== byte.comma && c !== close)
			throw this.notJson('expected a comma or a closing bracket');
		this.at++;
		return c === byte.comma;
	}

	/** Takes the next byte that is not white space if it is this one. */
	takes(wanted: number): boolean {
		if (this.padded[this.at] !== wanted && this.peek() !== wanted) return false;
		this.at++;
		return true;
	}

	/**
	 * Exactly the nearest double to the decimal written, as `Number` would give: a whole number below 2^53
	 * divided by a power of ten that is itself exact is rounded once.
	 */
	number(): number {
		const bytes = this.padded;
		const end = this.bytes.length;
		if (!(bytes[this.at] > 32)) this.peek();
		const start = this.at;
		let at = start;
		let c = bytes[at];
		const negative = c === 45;
		if (negative) c = bytes[++at];
		const first = at;
		let whole = 0;
		for (; c >= 48 && c <= 57; c = bytes[++at]) whole = whole * 10 + (c - 48);
		let digits = at - first;
		let fraction = 0;
		let scale = 0;
		if (c === 46) {
			const point = ++at;
			for (c = bytes[at]; c >= 48 && c <= 57; c = bytes[++at]) fraction = fraction * 10 + (c - 48);
			scale = at - point;
			if (scale === 0 && at < end) digits = 0;
		}
		if (at >= end) this.ended();
		if (digits === 0) throw this.badNumber();
		this.at = at;
		if (scale < 23 && c !== 101 && c !== 69) {
			const mantissa = whole * powers[scale] + fraction;
			if (mantissa < 9007199254740992) {
				const value = mantissa / powers[scale];
				return negative ? -value : value;
			}
		}
		return this.longNumber(start);
	}

	/** Text between quotes, escapes resolved. */
	string(): string {
		const start = (this.peek(), this.at);
		if (this.bytes[start] !== byte.quote) throw this.notJson('expected a text in quotes');
		this.skipString();
		return this.parsed(start) as string;
	}

	/** Passes over any value without looking inside; refuses to nest too deep. */
	skip(): void {
		let depth = 0;
		do {
			const c = this.peek();
			if (c === byte.quote) this.skipString();
			else if (c === byte.open || c === byte.openObject) {
				if (++depth > this.nesting) throw this.tooDeep();
				this.at++;
			} else if (c === byte.close || c === byte.closeObject) {
				depth--;
				this.at++;
			} else if (c === byte.comma || c === byte.colon) this.at++;
			else this.skipWord();
			if (depth < 0) throw this.notJson('a bracket closes that was not opened');
		} while (depth > 0);
	}

	/** Any value, by the built-in parser; whole numbers too long for a double stay text. */
	value(): unknown {
		const start = (this.peek(), this.at);
		this.skip();
		return this.parsed(start);
	}

	notJson(what: string): Refusal {
		return new Refusal('not-json', `This is not valid JSON: ${what} at ${this.place()}.`);
	}

	tooDeep(): Refusal {
		const message = `The JSON nests deeper than ${this.nesting} levels at ${this.place()}.`;
		return new Refusal('not-geojson', message);
	}

	place(): string {
		const where = `byte ${this.base + this.at}`;
		return this.feature ? `${where}, feature ${this.feature}` : where;
	}

	/** The window is used up: more is needed, or the file is cut off. */
	ended(): never {
		if (!this.last) throw needMore;
		const inside = this.feature ? ` inside feature ${this.feature}` : '';
		throw new Refusal(
			'file-truncated',
			`The file ends at byte ${this.base + this.bytes.length}${inside}, before its last bracket.`,
		);
	}

	private longNumber(start: number): number {
		const bytes = this.bytes;
		let at = this.at;
		while (isWordByte(bytes[at])) at++;
		if (at >= bytes.length) this.ended();
		this.at = at;
		const value = Number(latin1.decode(bytes.subarray(start, at)));
		if (!Number.isFinite(value)) throw this.badNumber();
		return value;
	}

	private badNumber(): Refusal {
		const rest = latin1.decode(this.bytes.subarray(this.at, this.at + 12)).split(/[\s,\]}]/)[0];
		const message = `A coordinate is not a number ("${rest}") at ${this.place()}.`;
		return new Refusal('bad-coordinate', message);
	}

	private skipString(): void {
		const bytes = this.bytes;
		for (let at = this.at + 1; at < bytes.length; at++) {
			const c = bytes[at];
			if (c === byte.escape) at++;
			else if (c === byte.quote) {
				this.at = at + 1;
				return;
			}
		}
		this.ended();
	}

	private skipWord(): void {
		const start = this.at;
		let at = start;
		while (isWordByte(this.bytes[at])) at++;
		if (at >= this.bytes.length) this.ended();
		if (at === start) throw this.notJson('an unexpected character');
		this.at = at;
	}

	private parsed(start: number): unknown {
		const text = this.text(start);
		try {
			return JSON.parse(/\d{16}/.test(text) ? text.replace(longWholeNumbers, quoteIfLong) : text);
		} catch {
			throw this.notJson('a value cannot be read');
		}
	}

	private text(start: number): string {
		const slice = this.bytes.subarray(start, this.at);
		if (this.encoding === 'UTF-8') {
			try {
				return utf8.decode(slice);
			} catch {
				this.encoding = 'windows-1252';
			}
		}
		return textDecoder('windows-1252').decode(slice);
	}
}

/** Letters, digits, signs and the point: what numbers, true, false and null are written with. */
function isWordByte(c: number): boolean {
	return (
		(c >= 48 && c <= 57) ||
		(c >= 97 && c <= 122) ||
		(c >= 65 && c <= 90) ||
		c === 43 ||
		c === 45 ||
		c === 46
	);
}

/** Texts, so that numbers within them are passed over, and long numbers that no point goes before. */
const longWholeNumbers = /"(?:[^"\\]|\\.)*"|(?<![\d.])-?\d{16,}(?![\d.eE])/g;
const quoteIfLong = (found: string) =>
	found[0] === '"' || Number.isSafeInteger(Number(found)) ? found : `"${found}"`;
