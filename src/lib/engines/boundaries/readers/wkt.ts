import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';

const deepest = 8;
const areas = /^(POLYGON|TRIANGLE)$/;
const collections = /^(GEOMETRYCOLLECTION|MULTISURFACE)$/;
const strays = /^(MULTI)?(POINT|LINESTRING)$/;
const kinds =
	'POINT|LINESTRING|POLYGON|TRIANGLE|MULTIPOINT|MULTILINESTRING|MULTIPOLYGON|GEOMETRYCOLLECTION|MULTISURFACE' +
	'|CIRCULARSTRING|COMPOUNDCURVE|CURVEPOLYGON|MULTICURVE|CURVE|SURFACE|POLYHEDRALSURFACE|TIN';
const start = new RegExp(
	`^\\s*(?:SRID\\s*=\\s*\\d+\\s*;)?\\s*(?:${kinds})\\s*(?:ZM?|M)?\\s*(?:\\(|EMPTY)`,
	'i',
);
const head = new RegExp(`\\s*(${kinds})\\s*(ZM?|M)?\\s*(?=\\(|EMPTY)`, 'iy');
const system = /\s*SRID\s*=\s*(\d+)\s*;/iy;

/** Whether a text begins as well-known text does. */
export const looksLikeWkt = (text: string): boolean => start.test(text.slice(0, 80));

/** Whether a text begins as the well-known text of an area, or of a collection. */
export const looksLikeArea = (text: string): boolean =>
	looksLikeWkt(text) && /POLYGON|SURFACE|COLLECTION|TRIANGLE/i.test(text.slice(0, 80));

/**
 * Well-known text (OGC 06-103r4, clause 7) with an optional `SRID=n;` before it; heights and measures
 * are passed over. Areas go into the layer, points and lines are counted, curves are refused by name.
 * Answers the number of the system, null where there is none.
 */
export function readWkt(text: string, layer: RawLayer, place: string): number | null {
	return new Wkt(text, layer, place).read();
}

class Wkt {
	private at = 0;

	constructor(
		private text: string,
		private layer: RawLayer,
		private place: string,
	) {}

	read(): number | null {
		const srid = this.match(system);
		this.geometry(0);
		if (this.peek() !== '') throw this.unexpected();
		return srid ? Number(srid[1]) : null;
	}

	private geometry(level: number): void {
		if (level > deepest) throw this.damaged(`it nests deeper than ${deepest} levels`);
		const found = this.match(head);
		if (!found) throw this.unexpected();
		const kind = found[1].toUpperCase();
		const isEmpty = /\s*EMPTY/iy;
		if (this.match(isEmpty)) return;
		if (areas.test(kind)) this.polygon();
		else if (kind === 'MULTIPOLYGON') this.list(() => this.polygon());
		else if (collections.test(kind)) this.list(() => this.member(kind, level));
		else if (strays.test(kind)) this.pass(kind);
		else {
			const message = `${this.place} is a ${kind}; curves and surfaces in space are not read. Turn it into polygons first.`;
			throw new Refusal('unsupported-format', message);
		}
	}

	/** A surface that is one of several may be a polygon without its name. */
	private member(kind: string, level: number): void {
		if (kind === 'MULTISURFACE' && this.peek() === '(') this.polygon();
		else this.geometry(level + 1);
	}

	private polygon(): void {
		if (this.match(/\s*EMPTY/iy)) return;
		this.layer.startPart();
		this.list(() => {
			this.layer.startRing();
			this.list(() => this.position());
		});
	}

	private position(): void {
		const x = this.number();
		const y = this.number();
		this.layer.point(x, y);
		for (let more = 0; this.peek() !== ',' && this.peek() !== ')'; more++) {
			if (more === 2) throw this.damaged(`a position has more than four numbers`);
			this.number();
		}
	}

	private number(): number {
		this.peek();
		const from = this.at;
		let at = from;
		for (let c = this.text.charCodeAt(at); isNumberCode(c); c = this.text.charCodeAt(++at));
		const value = at > from ? Number(this.text.slice(from, at)) : NaN;
		if (Number.isFinite(value)) {
			this.at = at;
			return value;
		}
		if (at >= this.text.length) throw this.cutOff();
		const shown = this.text.slice(from, from + 12).split(/[\s,)]/)[0];
		const message = `${this.place} has a coordinate that is not a number ("${shown}").`;
		throw new Refusal('bad-coordinate', message);
	}

	/** Passes over a point or line: brackets and what they hold. */
	private pass(kind: string): void {
		this.layer.stray(kind);
		let depth = 0;
		do {
			const c = this.peek();
			if (c === '') throw this.cutOff();
			if (c === '(') depth++;
			if (c === ')') depth--;
			if (depth > deepest) throw this.damaged(`it nests deeper than ${deepest} levels`);
			this.at++;
		} while (depth > 0);
	}

	private list(item: () => void): void {
		this.take('(');
		do item();
		while (this.another());
	}

	private another(): boolean {
		const c = this.peek();
		if (c !== ',' && c !== ')') throw this.unexpected();
		this.at++;
		return c === ',';
	}

	private take(c: string): void {
		if (this.peek() !== c) throw this.unexpected();
		this.at++;
	}

	/** The next character that is not white space, not taken; empty at the end. */
	private peek(): string {
		for (let c = this.text.charCodeAt(this.at); c <= 32; c = this.text.charCodeAt(++this.at));
		return this.text.charAt(this.at);
	}

	private match(pattern: RegExp): RegExpExecArray | null {
		pattern.lastIndex = this.at;
		const found = pattern.exec(this.text);
		if (found) this.at = pattern.lastIndex;
		return found;
	}

	private unexpected(): Refusal {
		if (this.peek() === '') return this.cutOff();
		const shown = this.text.slice(this.at, this.at + 12);
		return this.damaged(`"${shown}" is not expected at character ${this.at + 1}`);
	}

	private cutOff(): Refusal {
		const message = `${this.place} has a geometry that ends before its last bracket.`;
		return new Refusal('file-truncated', message);
	}

	private damaged(what: string): Refusal {
		return new Refusal('file-damaged', `${this.place} has no geometry that can be read: ${what}.`);
	}
}

/** Digits, letters (an exponent, or what is no number), signs and the point. */
const isNumberCode = (c: number): boolean =>
	(c >= 48 && c <= 57) ||
	c === 45 ||
	c === 46 ||
	c === 43 ||
	(c >= 65 && c <= 90) ||
	(c >= 97 && c <= 122);
