import { tokenLimits } from './limits.ts';

/** JSON whose objects are maps: a member is what the file says, whatever its name, and nothing else. */
export type Json = string | number | boolean | null | readonly Json[] | JsonObject;
export type JsonObject = ReadonlyMap<string, Json>;

export const isObject = (value: Json | undefined): value is JsonObject => value instanceof Map;

/** Thrown while a file is read and turned into a refusal where the reading began. */
export class TokensRefused extends Error {}

/**
 * The text of a Design Tokens file as a tree.
 * Throws `TokensRefused` in words on what is too long, nests too deep, has too many values, is no JSON
 * object, or has a member that programs mistake for their own (`__proto__`).
 */
export function readDocument(text: string): JsonObject {
	if (text.length > tokenLimits.characters)
		throw new TokensRefused('The file is longer than a million characters, the most that is read.');
	if (nestsDeeper(text, tokenLimits.depth))
		throw new TokensRefused(`The file nests more than ${tokenLimits.depth} levels deep.`);
	const budget = { left: tokenLimits.nodes };
	const read = treeOf(parsed(text.replace(/^\uFEFF/, '')), budget);
	if (!isObject(read)) throw new TokensRefused('The file is JSON, but not an object with tokens.');
	return read;
}

function parsed(text: string): unknown {
	try {
		return JSON.parse(text);
	} catch {
		throw new TokensRefused(
			'The file is not JSON as Design Tokens files are. Comments and commas after the last entry are not allowed in it.',
		);
	}
}

function treeOf(value: unknown, budget: { left: number }): Json {
	if (budget.left-- <= 0)
		throw new TokensRefused(`The file has more than ${tokenLimits.nodes} values.`);
	if (Array.isArray(value)) return value.map((one: unknown) => treeOf(one, budget));
	if (typeof value !== 'object' || value === null) return value as string | number | boolean | null;
	const members = new Map<string, Json>();
	for (const [name, member] of Object.entries(value)) {
		if (name === '__proto__')
			throw new TokensRefused('The file has a member called __proto__, which no token may be.');
		members.set(name, treeOf(member, budget));
	}
	return members;
}

/** Brackets and braces outside of strings, counted before anything is parsed. */
function nestsDeeper(text: string, most: number): boolean {
	let depth = 0;
	let inString = false;
	for (let i = 0; i < text.length; i++) {
		const sign = text[i];
		if (inString) {
			if (sign === '\\') i++;
			else if (sign === '"') inString = false;
		} else if (sign === '"') inString = true;
		else if (sign === '{' || sign === '[') {
			if (++depth > most) return true;
		} else if (sign === '}' || sign === ']') depth--;
	}
	return false;
}
