import { borderKinds, standingUnder, type BorderList } from '../borders/index.ts';
import type { Rule } from '../colouring/problem.ts';
import {
	dropAdded,
	dropForbidden,
	dropGroup,
	dropLock,
	dropPair,
	dropReserved,
	strikeOut,
	type DropRule,
} from './drop-rule.ts';
import type { Draft } from './draft.ts';
import { inkName } from './ink-name.ts';

/** What a rule of an explanation is looked up by. */
export interface SourceGround {
	keys: readonly string[];
	/** names to speak of regions by; keys where absent or empty */
	names?: readonly string[];
	/** borders as found, before the sheet's rule */
	borders: BorderList;
}

/** An entry of a draft behind a rule. */
export interface RuleSource {
	/** `tie`: a lock or a forbidden ink that an adjoining sheet asks for */
	kind:
		| 'lock'
		| 'forbidden'
		| 'tie'
		| 'alike'
		| 'apart'
		| 'group'
		| 'reserved'
		| 'added-border'
		| 'file-border';
	/** a plain sentence without a full stop, names as they are: "Nord and Süd are kept alike" */
	words: string;
	/**
	 * The draft without this entry; the draft given is not changed, and one that has no such entry comes
	 * back as it was, so it may be another draft than that the source was found in. A file's border is
	 * struck out instead, with a reason.
	 */
	drop: DropRule;
}

/**
 * The entries of a draft behind a rule that an explanation blames, so that it can be dropped. The rule
 * no longer holds once every one of them is dropped; mostly there is one. None for the number of inks
 * (using more is another way out), and none for a rule that the draft does not say.
 * In: the draft the explanation is about, its regions and borders as found, the rule by region numbers.
 */
export function ruleSources(draft: Draft, ground: SourceGround, rule: Rule): RuleSource[] {
	switch (rule.kind) {
		case 'border':
			return borderSources(draft, ground, rule.a, rule.b);
		case 'alike':
		case 'apart':
			return [
				...pairSources(draft, ground, rule.kind, rule),
				...groupSources(draft, ground, rule.kind, rule),
			];
		case 'forbidden':
			return forbiddenSources(draft, ground, rule.region, rule.ink);
		case 'reserved':
			return reservedSources(draft, rule.ink);
		case 'inks':
			return [];
	}
}

/** The lock of a region, set by hand or asked for by an adjoining sheet; none where there is none. */
export function lockSource(draft: Draft, ground: SourceGround, region: number): RuleSource | null {
	const key = ground.keys[region];
	const lock = Object.hasOwn(draft.locks, key) ? draft.locks[key] : null;
	if (!lock) return null;
	const said = `${called(ground, region)} is locked to ${inkName(draft, lock.ink)}`;
	const words = `${said}${tieWords(draft, lock.tie)}`;
	return { kind: lock.tie === undefined ? 'lock' : 'tie', words, drop: dropLock(key) };
}

const called = ({ keys, names }: SourceGround, region: number) => names?.[region] || keys[region];

const both = (ground: SourceGround, a: number, b: number) =>
	`${called(ground, a)} and ${called(ground, b)}`;

const samePair = (a: string, b: string, p: string, q: string) =>
	(a === p && b === q) || (a === q && b === p);

function tieWords(draft: Draft, tie: number | undefined): string {
	if (tie === undefined) return '';
	const name = draft.ties.find(({ sheet }) => sheet === tie)?.name;
	return `, as the adjoining sheet ${name ? `“${name}”` : `no. ${tie}`} asks`;
}

function borderSources(draft: Draft, ground: SourceGround, a: number, b: number): RuleSource[] {
	const [p, q] = [ground.keys[a], ground.keys[b]];
	const sources: RuleSource[] = [];
	if (draft.added.some((pair) => samePair(pair.a, pair.b, p, q))) {
		const words = `a border between ${both(ground, a, b)} was added by hand`;
		sources.push({ kind: 'added-border', words, drop: dropAdded(p, q) });
	}
	const found = foundBorder(ground.borders, a, b);
	const struck = draft.struck.some((pair) => samePair(pair.a, pair.b, p, q));
	if (found < 0 || struck) return sources;
	const { kind, metres } = ground.borders;
	if (standingUnder(draft, kind[found], metres[found]) !== 'counts') return sources;
	const words = `${both(ground, a, b)} ${meetingWords[borderKinds[kind[found]]]}`;
	sources.push({ kind: 'file-border', words, drop: strikeOut(p, q) });
	return sources;
}

const meetingWords = {
	line: 'share a border',
	point: 'meet in a point',
	water: 'lie across water from each other',
	gap: 'lie across water from each other',
	hand: 'are a border added by hand',
};

function foundBorder(borders: BorderList, a: number, b: number): number {
	const [low, high] = [Math.min(a, b), Math.max(a, b)];
	return borders.a.findIndex((one, i) => one === low && borders.b[i] === high);
}

type NumberedPair = { a: number; b: number };

function pairSources(
	draft: Draft,
	ground: SourceGround,
	kind: 'alike' | 'apart',
	{ a, b }: NumberedPair,
): RuleSource[] {
	const [p, q] = [ground.keys[a], ground.keys[b]];
	if (!draft[kind].some((pair) => samePair(pair[0], pair[1], p, q))) return [];
	const words = `${both(ground, a, b)} are kept ${kind}`;
	return [{ kind, words, drop: dropPair(kind, p, q) }];
}

function groupSources(
	draft: Draft,
	{ keys }: SourceGround,
	kind: 'alike' | 'apart',
	{ a, b }: NumberedPair,
): RuleSource[] {
	const groupKind = kind === 'alike' ? 'alike' : 'different';
	return draft.groups
		.filter((group) => group.kind === groupKind)
		.filter((group) => group.keys.includes(keys[a]) && group.keys.includes(keys[b]))
		.map(({ name, keys: members }) => ({
			kind: 'group',
			words: `all ${members.length} regions of “${name}” are ${groupWords[groupKind]}`,
			drop: dropGroup(groupKind, name),
		}));
}

const groupWords = { alike: 'kept alike', different: 'kept different from each other' };

function forbiddenSources(
	draft: Draft,
	ground: SourceGround,
	region: number,
	ink: number,
): RuleSource[] {
	const key = ground.keys[region];
	const ties = new Set(
		draft.forbidden.filter((f) => f.key === key && f.ink === ink).map((f) => f.tie),
	);
	return [...ties].map((tie) => ({
		kind: tie === undefined ? 'forbidden' : 'tie',
		words: `${called(ground, region)} may not be ${inkName(draft, ink)}${tieWords(draft, tie)}`,
		drop: dropForbidden(key, ink, tie),
	}));
}

function reservedSources(draft: Draft, ink: number): RuleSource[] {
	if (!draft.reserved.includes(ink)) return [];
	const words = `${inkName(draft, ink)} is reserved for regions locked to it`;
	return [{ kind: 'reserved', words, drop: dropReserved(ink) }];
}
