import { isObject, TokensRefused, type Json, type JsonObject } from './document.ts';
import { tokenLimits } from './limits.ts';

const own = ['$value', '$ref'];

/** A token has a value, or is a reference to one: a `$ref` that leads to a group makes a group of it. */
export function isToken(node: JsonObject, groups: Groups): boolean {
	if (node.has('$value')) return true;
	const target = node.get('$ref');
	return typeof target === 'string' && !groups.isGroupPointer(target);
}

/** The places of a file by name, with groups that extend others filled in as the report says (6.4). */
export class Groups {
	private readonly filled = new Map<JsonObject, JsonObject>();
	private readonly filling: string[] = [];
	private budget = tokenLimits.nodes;

	constructor(readonly root: JsonObject) {}

	/** The members of a group, those it extends among them. */
	open(group: JsonObject, path: readonly string[]): JsonObject {
		const known = this.filled.get(group);
		if (known) return known;
		const target = this.extended(group);
		const place = path.join('.') || 'the file itself';
		if (target === null) return group;
		const loops = path.length >= target.length && target.every((name, i) => name === path[i]);
		if (this.filling.includes(place) || loops || this.filling.length > tokenLimits.chain) {
			const chain = [...this.filling, place, target.join('.')].slice(-6);
			throw new TokensRefused(`Groups extend each other in a circle: ${chain.join(' to ')}.`);
		}
		this.filling.push(place);
		const base = this.at(target);
		if (!isObject(base) || base.has('$value'))
			throw new TokensRefused(
				`The group ${place} extends ${target.join('.')}, which is no group of this file.`,
			);
		const merged = this.merge(this.open(base, target), group);
		this.filling.pop();
		this.filled.set(group, merged);
		return merged;
	}

	/** What stands at a path of names; undefined where nothing does. */
	at(path: readonly string[]): Json | undefined {
		let node: Json | undefined = this.root;
		const walked: string[] = [];
		for (const name of path) {
			if (Array.isArray(node))
				node = /^\d+$/.test(name) ? (node as Json[])[Number(name)] : undefined;
			else if (isObject(node)) {
				const inside: JsonObject = own.some((one) => (node as JsonObject).has(one))
					? node
					: this.open(node, walked);
				node = inside.get(name);
			} else return undefined;
			walked.push(name);
		}
		return node;
	}

	/** Whether a JSON pointer leads to a group: an object that is no token and lies in no value. */
	isGroupPointer(pointer: string): boolean {
		const path = pointerPath(pointer);
		if (!path || path.includes('$value')) return false;
		const node = this.raw(path);
		return isObject(node) && !own.some((one) => node.has(one));
	}

	private raw(path: readonly string[]): Json | undefined {
		let node: Json | undefined = this.root;
		for (const name of path) node = isObject(node) ? node.get(name) : undefined;
		return node;
	}

	private extended(group: JsonObject): string[] | null {
		const said = group.get('$extends') ?? group.get('$ref');
		if (typeof said !== 'string' || group.has('$value')) return null;
		return curlyPath(said) ?? pointerPath(said);
	}

	private merge(base: JsonObject, local: JsonObject): JsonObject {
		if ((this.budget -= base.size + local.size) < 0)
			throw new TokensRefused(
				`Groups that extend others come to more than ${tokenLimits.nodes} values.`,
			);
		const merged = new Map(base);
		for (const [name, node] of local) {
			const before = merged.get(name);
			const both = isObject(before) && isObject(node) && !name.startsWith('$');
			const groups = both && !before.has('$value') && !node.has('$value');
			merged.set(name, groups ? this.merge(before, node) : node);
		}
		merged.delete('$extends');
		return merged;
	}
}

/** `{group.token}` as names; null for other text. */
export function curlyPath(text: string): string[] | null {
	const inside = /^\{([^{}]+)\}$/.exec(text.trim())?.[1];
	return inside ? inside.split('.') : null;
}

/** A JSON pointer within the file (RFC 6901, as a URI fragment) as names; null for any other address. */
export function pointerPath(text: string): string[] | null {
	if (!text.startsWith('#/')) return null;
	return text
		.slice(2)
		.split('/')
		.map((name) => decoded(name).replace(/~1/g, '/').replace(/~0/g, '~'));
}

function decoded(name: string): string {
	try {
		return decodeURIComponent(name);
	} catch {
		return name;
	}
}
