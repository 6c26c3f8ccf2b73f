import { caution } from '../sheet/layout.ts';
import type { Draft } from './draft.ts';
import type { FrozenTerritories } from './frozen-territories.ts';
import type { FrozenTheme } from './frozen-theme.ts';

/**
 * What an edition is: everything that decides how its sheet looks and why it may be trusted, as plain
 * JSON. Number, date and note stand beside it, so that two issues of the same content share a digest.
 */
export interface EditionContent {
	/** version of this shape; a reader refuses one it does not know */
	shape: 1;
	boundaries: {
		/** SHA-256 of the stored coverage and its attributes, hex */
		digest: string;
		regions: number;
	};
	/** decisions of people: palette, locks, rules, border rules, layout */
	draft: Draft;
	/** region key -> ink number from 0 */
	colouring: Record<string, number>;
	inksUsed: number;
	lowerBound: number;
	/** as the colouring engine gave it, regions by key */
	proof: unknown;
	/** the classes shown in place of the colouring; absent where the sheet shows its colouring */
	theme?: FrozenTheme;
	/** which territory every region is in; absent where the sheet has none */
	territories?: FrozenTerritories;
	caution: string;
}

export interface EditionInput {
	boundariesDigest: string;
	/** in region order */
	keys: string[];
	draft: Draft;
	/** in region order, every region coloured */
	colouring: ArrayLike<number>;
	lowerBound: number;
	proof: unknown;
	/** needed where the draft has a theme */
	theme?: FrozenTheme | null;
	territories?: FrozenTerritories | null;
}

export type EditionOutcome =
	| { status: 'complete'; content: EditionContent }
	| {
			status: 'incomplete';
			reason: 'not-coloured' | 'duplicate-keys' | 'no-classes';
			keys: string[];
	  };

/**
 * Puts an edition together. Refused when a region has no ink of the draft's palette, when two regions
 * share a key (the content names regions by key), or when the draft has a theme and regions are without a
 * class of it. Copies what it is given; nothing is shared.
 */
export function editionContent(input: EditionInput): EditionOutcome {
	const { keys, colouring, draft } = input;
	const inks = draft.palette.inks.length;
	const bare = keys.filter((_, i) => !(colouring[i] >= 0 && colouring[i] < inks));
	if (bare.length) return { status: 'incomplete', reason: 'not-coloured', keys: bare };
	const seen = new Set<string>();
	const twice = keys.filter((key) => seen.has(key) || !seen.add(key));
	if (twice.length) return { status: 'incomplete', reason: 'duplicate-keys', keys: twice };
	const { theme, territories } = input;
	const unclassed = draft.theme ? keys.filter((key) => !isClassed(theme, key)) : [];
	if (unclassed.length) return { status: 'incomplete', reason: 'no-classes', keys: unclassed };
	return {
		status: 'complete',
		content: {
			shape: 1,
			boundaries: { digest: input.boundariesDigest, regions: keys.length },
			draft: structuredClone(draft),
			colouring: Object.fromEntries(keys.map((key, i) => [key, colouring[i]])),
			inksUsed: keys.reduce((most, _, i) => Math.max(most, colouring[i] + 1), 0),
			lowerBound: input.lowerBound,
			proof: structuredClone(input.proof),
			...(draft.theme && theme && { theme: structuredClone(theme) }),
			...(territories && { territories: structuredClone(territories) }),
			caution,
		},
	};
}

const isClassed = (theme: FrozenTheme | null | undefined, key: string): boolean =>
	theme !== null &&
	theme !== undefined &&
	Object.hasOwn(theme.classes, key) &&
	theme.classes[key] >= 0 &&
	theme.classes[key] < theme.inks.length;
