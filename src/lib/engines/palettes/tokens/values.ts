import { isObject, TokensRefused, type Json, type JsonObject } from './document.ts';
import { curlyPath, pointerPath, type Groups } from './groups.ts';
import { tokenLimits } from './limits.ts';

/** A value with every reference in it followed, and the token it was taken from when it is an alias. */
export interface Followed {
	value: Json;
	/** names of the token that holds the value itself; null when the value stands where it was asked for */
	from: string[] | null;
	/** `$type` of that token, where it says one */
	type: string | null;
}

/**
 * Follows aliases: `{group.token}` leads to the value of a token, `{"$ref": "#/..."}` to any place of the
 * file (Design Tokens Format Module 2025.10, section 7).
 * Null where a reference leads nowhere. Throws `TokensRefused` naming the tokens of a circle.
 */
export function follow(groups: Groups, node: Json, chain: readonly string[] = []): Followed | null {
	const path = referenceOf(node);
	if (!path) return { value: node, from: null, type: null };
	const name = path.filter((part) => part !== '$value').join('.');
	if (chain.includes(name) || chain.length > tokenLimits.chain) {
		const circle = [...chain.slice(chain.indexOf(name)), name].slice(-8);
		throw new TokensRefused(`Aliases lead round in a circle: ${circle.join(' to ')}.`);
	}
	const target = groups.at(path);
	if (target === undefined) return null;
	const links = [...chain, name];
	const inValue = path.includes('$value');
	if (isObject(target) && !inValue) return ofToken(groups, target, path, links);
	const found = follow(groups, target, links);
	if (!found) return null;
	const whole = inValue && path.at(-1) === '$value';
	const token = whole ? groups.at(path.slice(0, -1)) : undefined;
	const from = found.from ?? (whole ? path.slice(0, -1) : null);
	return { ...found, from, type: found.type ?? (isObject(token) ? typeOf(token) : null) };
}

function ofToken(
	groups: Groups,
	token: JsonObject,
	path: string[],
	links: string[],
): Followed | null {
	const inside = valueOf(token);
	if (inside === undefined) return null;
	const found = follow(groups, inside, links);
	return found && { ...found, from: found.from ?? path, type: found.type ?? typeOf(token) };
}

/** A token's own value: what it says, or its reference as if it stood there. */
export const valueOf = (token: JsonObject): Json | undefined =>
	token.get('$value') ??
	(token.has('$ref') ? new Map([['$ref', token.get('$ref') ?? null]]) : undefined);

export function typeOf(node: JsonObject): string | null {
	const said = node.get('$type');
	return typeof said === 'string' ? said : null;
}

/** Where a value leads that is nothing but a reference; null for all others. */
export function referenceOf(node: Json): string[] | null {
	if (typeof node === 'string') return curlyPath(node);
	if (!isObject(node)) return null;
	const said = node.get('$ref');
	if (typeof said !== 'string') return null;
	return curlyPath(said) ?? pointerPath(said) ?? ['', said];
}
