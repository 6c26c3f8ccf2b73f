/**
 * JSON in the one form that is digested: members sorted by the code units of their names, no white
 * space, numbers as ECMAScript writes them. Source: RFC 8785, JSON Canonicalization Scheme.
 *
 * In: null, booleans, finite numbers, well-formed strings, arrays and plain objects of these; members
 * that are `undefined` are left out, as `JSON.stringify` does. Throws TypeError for anything else.
 */
export function canonicalJson(value: unknown): string {
	if (value === null || typeof value === 'boolean') return String(value);
	if (typeof value === 'number') return numberText(value);
	if (typeof value === 'string') return stringText(value);
	if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
	if (isPlain(value)) {
		const names = Object.keys(value).filter((name) => value[name] !== undefined);
		// the default order of sort is by code units, as section 3.2.3 asks
		const members = names.sort().map((name) => `${stringText(name)}:${canonicalJson(value[name])}`);
		return `{${members.join(',')}}`;
	}
	throw new TypeError(`no canonical JSON for ${typeof value}`);
}

function isPlain(value: unknown): value is Record<string, unknown> {
	if (typeof value !== 'object' || value === null) return false;
	const prototype = Object.getPrototypeOf(value);
	return prototype === Object.prototype || prototype === null;
}

function numberText(value: number): string {
	if (!Number.isFinite(value)) throw new TypeError(`no canonical JSON for ${value}`);
	return JSON.stringify(value);
}

/** Half of a surrogate pair has no UTF-8 form and so no digest. */
const loneSurrogate = /\p{Cs}/u;

function stringText(text: string): string {
	if (loneSurrogate.test(text)) throw new TypeError('no canonical JSON for a lone surrogate');
	return JSON.stringify(text);
}
