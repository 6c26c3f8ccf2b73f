import type { Ink } from '../palette.ts';
import { readColour } from './colour-value.ts';
import { isObject, readDocument, TokensRefused, type JsonObject } from './document.ts';
import { Groups, isToken } from './groups.ts';
import { tokenLimits } from './limits.ts';
import { follow, referenceOf, typeOf, valueOf } from './values.ts';

export type TokensRead =
	| {
			status: 'read';
			inks: Ink[];
			/** sentences about what was read in a way that must be told, or left out */
			notes: string[];
	  }
	| {
			status: 'refused';
			message: string;
			/** groups to choose from when there are too many colours */ groups?: string[];
	  };

/** Other types of tokens that are told one by one. */
const mostTypesTold = 12;

interface Found {
	path: string[];
	hex: string;
}

/**
 * Reads the colours of a Design Tokens file as the inks of a palette.
 *
 * In: the text of the file; optionally a group, by its path with dots, to take colours from alone.
 * Out: inks in the order of the file, named by their token, and notes; or a refusal in words: no JSON, too
 * large or deep, aliases or groups in a circle, a token that is a group as well, no colour at all, more
 * colours than a palette has inks. Tokens of other types are left out and said. An alias of a colour that
 * is taken already is no second ink. Never throws on what a file holds.
 * Source: Design Tokens Format Module and Color Module 2025.10, Design Tokens Community Group.
 */
export function readDesignTokens(text: string, within = ''): TokensRead {
	try {
		return new Reading(new Groups(readDocument(text))).of(within);
	} catch (problem) {
		if (problem instanceof TokensRefused) return { status: 'refused', message: problem.message };
		throw problem;
	}
}

class Reading {
	private readonly found: Found[] = [];
	private readonly notes: string[] = [];
	private readonly aliases: { path: string[]; from: string[]; hex: string }[] = [];
	private readonly others = new Map<string | null, number>();
	private walked = 0;

	constructor(private readonly groups: Groups) {}

	of(within: string): TokensRead {
		const path = within ? within.split('.') : [];
		const start = this.groups.at(path);
		if (!isObject(start) || start.has('$value'))
			return { status: 'refused', message: `There is no group ${within} in this file.` };
		this.group(start, path, this.inherited(path));
		this.takeAliases();
		if (this.found.length === 0) return { status: 'refused', message: this.nothing() };
		if (this.found.length > tokenLimits.inks) return this.tooMany(within);
		return { status: 'read', inks: this.inks(), notes: [...this.notes, ...this.leftOut()] };
	}

	private inherited(path: readonly string[]): string | null {
		let type: string | null = null;
		for (let length = 0; length < path.length; length++) {
			const above = this.groups.at(path.slice(0, length));
			if (isObject(above)) type = typeOf(above) ?? type;
		}
		return type;
	}

	private group(raw: JsonObject, path: string[], above: string | null) {
		if (path.length > tokenLimits.depth)
			throw new TokensRefused(
				`Groups that extend others nest more than ${tokenLimits.depth} levels deep.`,
			);
		const group = this.groups.open(raw, path);
		const type = typeOf(group) ?? above;
		for (const [name, node] of group) {
			if ((name.startsWith('$') && name !== '$root') || !isObject(node)) continue;
			if (++this.walked > tokenLimits.nodes)
				throw new TokensRefused(`The file comes to more than ${tokenLimits.nodes} tokens.`);
			const here = [...path, name];
			if (isToken(node, this.groups)) this.token(node, here, type);
			else this.group(node, here, type);
		}
	}

	private token(token: JsonObject, path: string[], above: string | null) {
		const name = path.join('.');
		if ([...token].some(([member, node]) => !member.startsWith('$') && isObject(node)))
			throw new TokensRefused(`${name} has a value and tokens within it: it cannot be both.`);
		const value = valueOf(token) ?? null;
		const alias = referenceOf(value) !== null;
		const reached = follow(this.groups, value, [name]);
		// 5.2.2: its own type, else that of the token it refers to, else that of the nearest group
		const targetType = reached?.from ? (reached.type ?? this.inherited(reached.from)) : null;
		const type = typeOf(token) ?? (alias ? targetType : null) ?? above;
		if (type !== 'color') return this.other(type);
		if (!reached) return void this.notes.push(`${name} is left out: its alias leads nowhere.`);
		const read = readColour(this.groups, reached.value);
		if ('unfit' in read) return void this.notes.push(`${name} is left out: ${read.unfit}.`);
		if (alias && reached.from)
			return void this.aliases.push({ path, from: reached.from, hex: read.hex });
		this.found.push({ path, hex: read.hex });
		this.notes.push(...read.told.map((told) => `${name} ${told}.`));
		if (token.get('$deprecated')) this.notes.push(`${name} is marked as deprecated; it was read.`);
	}

	private other(type: string | null) {
		this.others.set(type, (this.others.get(type) ?? 0) + 1);
	}

	/** An alias is an ink of its own only where the colour it names is not among the inks. */
	private takeAliases() {
		const taken = new Set(this.found.map(({ path }) => path.join('.')));
		let left = 0;
		for (const { path, from, hex } of this.aliases) {
			if (taken.has(from.join('.'))) left++;
			else {
				taken.add(from.join('.'));
				this.found.push({ path, hex });
			}
		}
		if (left)
			this.notes.push(
				`${left} ${left === 1 ? 'alias names a colour that is' : 'aliases name colours that are'} among the inks already: taken once.`,
			);
	}

	/** "1 token of type dimension is no colour and is left out.", a sentence a type. */
	private leftOut(): string[] {
		const others = [...this.others].map(([type, count]) => {
			const [tokens, are] = count === 1 ? ['token', 'is'] : ['tokens', 'are'];
			return type === null
				? `${count} ${tokens} without a type ${are} left out.`
				: `${count} ${tokens} of type ${type.slice(0, 40)} ${are} no ${count === 1 ? 'colour' : 'colours'} and ${are} left out.`;
		});
		const more = others.length - mostTypesTold;
		return more > 0
			? [...others.slice(0, mostTypesTold), `Tokens of ${more} more types are left out.`]
			: others;
	}

	private nothing(): string {
		const notes = [...this.notes, ...this.leftOut()].slice(0, 5).join(' ');
		return `There is no colour in this file that can be an ink. ${notes}`.trimEnd();
	}

	private tooMany(within: string): TokensRead {
		const depth = within ? within.split('.').length : 0;
		const groups = new Map<string, number>();
		for (const { path } of this.found)
			for (let length = depth + 1; length < path.length; length++) {
				const group = path.slice(0, length).join('.');
				groups.set(group, (groups.get(group) ?? 0) + 1);
			}
		const fitting = [...groups]
			.filter(([, count]) => count <= tokenLimits.inks)
			.map(([name]) => name);
		return {
			status: 'refused',
			message: `There are ${this.found.length} colours here, and a palette has ${tokenLimits.inks} inks at most. Name one of the file’s groups.`,
			groups: fitting.slice(0, 100),
		};
	}

	/** Named by the token, with the group before it where two tokens have one name. */
	private inks(): Ink[] {
		const short = ({ path }: Found) =>
			wordsOf(path.at(-1) === '$root' ? path.slice(-2, -1) : path.slice(-1));
		const uses = new Map<string, number>();
		for (const one of this.found) uses.set(short(one), (uses.get(short(one)) ?? 0) + 1);
		return this.found.map((one) => {
			const whole = one.path.filter((name) => name !== '$root');
			const name = uses.get(short(one)) === 1 ? short(one) : wordsOf(whole.slice(-2));
			return { name: name.slice(0, 80) || 'Ink', hex: one.hex };
		});
	}
}

const wordsOf = (path: readonly string[]) => path.join(' ').trim();
