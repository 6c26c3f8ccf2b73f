import { isAcross } from '../borders/border-list.ts';
import { numbersOf, type TerritoryGround } from './problem-of-draft.ts';
import type { TerritoryDraft, TerritoryEntry } from './territory-draft.ts';

/** Why a draft of territories cannot stand as it is. */
export interface DraftFault {
	code:
		| 'unknown-region'
		| 'unknown-territory'
		| 'doubled-territory'
		| 'doubled-base'
		| 'base-elsewhere'
		| 'paired-with-itself'
		| 'no-water-border';
	/** a sentence; names up to five of `keys` */
	message: string;
	/** all that it is about: regions or territories by key */
	keys: string[];
}

/**
 * Everything in which a draft contradicts its ground or itself, at most one fault of each kind of thing.
 * Whether a plan can be found is another question: that is the engine's to answer.
 */
export function draftFaults(
	ground: Pick<TerritoryGround, 'keys' | 'borders'>,
	draft: TerritoryDraft,
): DraftFault[] {
	return [
		...unknownRegions(ground.keys, draft),
		...doubledTerritories(draft.territories),
		...unknownTerritories(draft),
		...doubledBases(draft.territories),
		...basesElsewhere(draft),
		...selfPairs(draft),
		...missingWater(ground, draft),
	];
}

function unknownRegions(keys: readonly string[], draft: TerritoryDraft): DraftFault[] {
	const unit = numbersOf(keys);
	const named = [
		...Object.keys(draft.assignment),
		...Object.keys(draft.locks),
		...draft.territories.flatMap(({ base }) => base ?? []),
		...[draft.together, draft.apart, draft.waterLinks].flat(2),
		...draft.handLinks.flatMap(({ a, b }) => [a, b]),
	];
	const unknown = [...new Set(named)].filter((key) => unit(key) < 0);
	return told('unknown-region', unknown, (list) => `The sheet has no region ${list}.`);
}

function unknownTerritories({ territories, assignment, locks }: TerritoryDraft): DraftFault[] {
	const place = numbersOf(territories.map(({ key }) => key));
	const named = [
		...Object.values(assignment),
		...Object.values(locks).map(({ territory }) => territory),
	];
	const unknown = [...new Set(named)].filter((key) => place(key) < 0);
	return told('unknown-territory', unknown, (list) => `There is no territory ${list}.`);
}

const doubledTerritories = (territories: readonly TerritoryEntry[]): DraftFault[] =>
	told(
		'doubled-territory',
		doubled(territories.map(({ key }) => key)),
		(list) => `More than one territory has the key ${list}.`,
	);

const doubledBases = (territories: readonly TerritoryEntry[]): DraftFault[] =>
	told(
		'doubled-base',
		doubled(territories.flatMap(({ base }) => base ?? [])),
		(list) => `More than one territory has its base in ${list}.`,
	);

/** A territory that has no regions yet, such as a new hire's, may name its base anywhere. */
function basesElsewhere({ territories, assignment }: TerritoryDraft): DraftFault[] {
	const held = new Set(Object.values(assignment));
	const wrong = territories.filter(
		({ key, base }) => base !== null && held.has(key) && assignment[base] !== key,
	);
	return told(
		'base-elsewhere',
		wrong.map(({ key }) => key),
		(list) => `The base lies outside its own territory: ${list}.`,
		(key) => wrong.find((entry) => entry.key === key)?.name ?? key,
	);
}

function selfPairs({ together, apart, waterLinks, handLinks }: TerritoryDraft): DraftFault[] {
	const pairs = [...together, ...apart, ...waterLinks, ...handLinks.map(({ a, b }) => [a, b])];
	const wrong = pairs.filter(([a, b]) => a === b).map(([a]) => a);
	return told('paired-with-itself', wrong, (list) => `A region is paired with itself: ${list}.`);
}

function missingWater(
	{ keys, borders }: Pick<TerritoryGround, 'keys' | 'borders'>,
	{ waterLinks }: TerritoryDraft,
): DraftFault[] {
	if (waterLinks.length === 0) return [];
	const unit = numbersOf(keys);
	const known = new Set<number>();
	borders.kind.forEach((kind, i) => {
		if (isAcross(kind)) known.add(borders.a[i] * keys.length + borders.b[i]);
	});
	const missing = waterLinks.filter(([one, two]) => {
		const [a, b] = [unit(one), unit(two)].sort((x, y) => x - y);
		return a >= 0 && a !== b && !known.has(a * keys.length + b);
	});
	const said = missing.map(([a, b]) => `${a} and ${b}`);
	return told('no-water-border', said, (list) => `There is no border across water: ${list}.`);
}

function doubled(keys: readonly string[]): string[] {
	const seen = new Set<string>();
	return [...new Set(keys.filter((key) => seen.size === seen.add(key).size))];
}

function told(
	code: DraftFault['code'],
	keys: string[],
	sentence: (list: string) => string,
	nameOf: (key: string) => string = (key) => key,
): DraftFault[] {
	if (keys.length === 0) return [];
	const shown = keys.slice(0, 5).map((key) => `“${nameOf(key)}”`);
	const more = keys.length > 5 ? ` and ${keys.length - 5} more` : '';
	return [{ code, message: sentence(shown.join(', ') + more), keys }];
}
