import type { TerritoryDraft, TerritoryEntry } from '$lib/engines/territories/territory-draft';

/** What people do to the territories of a sheet, each a new draft; the old one is never touched. */
type Edit = (draft: TerritoryDraft) => TerritoryDraft;

/** Hands regions to a territory, or (null) to none. */
export const give =
	(regions: readonly string[], territory: string | null): Edit =>
	(draft) => {
		const assignment = { ...draft.assignment };
		for (const region of regions) {
			if (territory === null) delete assignment[region];
			else assignment[region] = territory;
		}
		return { ...draft, assignment };
	};

/** A territory that closes has no base any more once that region was handed out. */
export const dropClosedBases =
	(regions: readonly string[]): Edit =>
	(draft) => {
		const gone = new Set(regions);
		const loses = ({ base, closing, key }: TerritoryEntry) =>
			closing && base !== null && gone.has(base) && draft.assignment[base] !== key;
		if (!draft.territories.some(loses)) return draft;
		const territories = draft.territories.map((one) => (loses(one) ? { ...one, base: null } : one));
		return { ...draft, territories };
	};

export const addTerritory =
	(entry: TerritoryEntry): Edit =>
	(draft) => ({ ...draft, territories: [...draft.territories, entry] });

/** A key that no territory of this draft has, nor any region's assignment or lock still names. */
export function freshKey(draft: TerritoryDraft): string {
	const taken = new Set([
		...draft.territories.map(({ key }) => key),
		...Object.values(draft.assignment),
		...Object.values(draft.locks).map(({ territory }) => territory),
	]);
	for (let tries = 0; tries < 100; tries++) {
		const key = `t-${crypto.randomUUID().slice(0, 8)}`;
		if (!taken.has(key)) return key;
	}
	throw new Error('no fresh key in a hundred tries');
}

export const newTerritory = (key: string, name: string): TerritoryEntry => ({
	key,
	name,
	person: '',
	email: '',
	base: null,
	capacity: 1,
	frozen: false,
	vacant: false,
	closing: false,
});

export const changeTerritory =
	(key: string, change: Partial<Omit<TerritoryEntry, 'key'>>): Edit =>
	(draft) => ({
		...draft,
		territories: draft.territories.map((entry) =>
			entry.key === key ? { ...entry, ...change } : entry,
		),
	});

/** Puts the base of a territory into a region, which comes along where the territory has regions. */
export const setBase =
	(key: string, region: string | null): Edit =>
	(draft) => {
		const based = changeTerritory(key, { base: region })(draft);
		const holds = Object.values(draft.assignment).includes(key);
		return region !== null && holds ? give([region], key)(based) : based;
	};

/** Takes a territory off the list; its regions are left with none and its locks go with it. */
export const removeTerritory =
	(key: string): Edit =>
	(draft) => ({
		...draft,
		territories: draft.territories.filter((entry) => entry.key !== key),
		assignment: without(draft.assignment, (territory) => territory === key),
		locks: without(draft.locks, ({ territory }) => territory === key),
	});

const without = <T>(record: Record<string, T>, goes: (value: T) => boolean): Record<string, T> =>
	Object.fromEntries(Object.entries(record).filter(([, value]) => !goes(value)));

export const lockRegion =
	(region: string, territory: string, reason: string): Edit =>
	(draft) => ({ ...draft, locks: { ...draft.locks, [region]: { territory, reason } } });

export const unlockRegion =
	(region: string): Edit =>
	(draft) => {
		const { [region]: _, ...locks } = draft.locks;
		return { ...draft, locks };
	};

type Pair = readonly [string, string];
const inOrder = ([a, b]: Pair): [string, string] => (a < b ? [a, b] : [b, a]);
export const samePair = (one: Pair, other: Pair): boolean =>
	(one[0] === other[0] && one[1] === other[1]) || (one[0] === other[1] && one[1] === other[0]);
const lessPair = (pairs: readonly [string, string][], pair: Pair) =>
	pairs.filter((each) => !samePair(each, pair));

/** Two regions that must end in one territory, or in two: a pair is under one of these rules at most. */
export const tie =
	(rule: 'together' | 'apart', pair: Pair): Edit =>
	(draft) => {
		const freed = untie(pair)(draft);
		return { ...freed, [rule]: [...freed[rule], inOrder(pair)] };
	};

export const untie =
	(pair: Pair): Edit =>
	(draft) => ({
		...draft,
		together: lessPair(draft.together, pair),
		apart: lessPair(draft.apart, pair),
	});

/** Whether two regions across water count as joined. */
export const linkAcrossWater =
	(pair: Pair, joined: boolean): Edit =>
	(draft) => {
		const others = lessPair(draft.waterLinks, pair);
		return { ...draft, waterLinks: joined ? [...others, inOrder(pair)] : others };
	};

export const addHandLink =
	(pair: Pair, reason: string): Edit =>
	(draft) => {
		const [a, b] = inOrder(pair);
		return { ...draft, handLinks: [...removeHandLink(pair)(draft).handLinks, { a, b, reason }] };
	};

export const removeHandLink =
	(pair: Pair): Edit =>
	(draft) => ({
		...draft,
		handLinks: draft.handLinks.filter(({ a, b }) => !samePair([a, b], pair)),
	});

/** The largest deviation allowed in a measure; null leaves it free. */
export const setTolerance =
	(measure: string, tolerance: number | null): Edit =>
	(draft) => {
		const { [measure]: _, ...others } = draft.wishes.tolerances;
		const tolerances = tolerance === null ? others : { ...others, [measure]: tolerance };
		return { ...draft, wishes: { ...draft.wishes, tolerances } };
	};

/** Changes what a rebalance is asked for. */
export const setWishes =
	(changes: Partial<TerritoryDraft['wishes']>) =>
	(draft: TerritoryDraft): TerritoryDraft => ({
		...draft,
		wishes: { ...draft.wishes, ...changes },
	});
