import { borderKinds, type BorderList } from '../borders/border-list.ts';
import {
	carryGround,
	carryPairs,
	carryPins,
	everyPair,
	pairTest,
	quoted,
	type CarriedRow,
	type CarryGround,
	type Carrying,
	type Choose,
	type RegionMatch,
} from '../boundaries/recut/index.ts';
import { carryAssignment } from './carry-assignment.ts';
import { carryBases } from './carry-bases.ts';
import type { TerritoryDraft } from './territory-draft.ts';

export interface CarriedTerritories {
	draft: TerritoryDraft;
	/** what became of everything that names regions; regions that go on as one in their territory have none */
	rows: CarriedRow[];
}

/**
 * What people decided about the territories of a sheet, carried over to new boundaries.
 *
 * In: the draft by old keys; the match (corrected by hand or not); borders of the new coverage, where they
 * are known, by which links across water are looked up. Out: a draft that names new regions only, and a
 * report. The draft given is not changed.
 *
 * Rules. All pieces of a split region stay in its territory. A region merged from several goes to the
 * territory with most of its ground, and this is told where they differ; new regions have none. A base
 * goes to the largest piece that is in its territory; a territory whose base is gone has none. Locks are
 * carried as `carryPins` says. Pairs go to each piece; what was between two regions that are one now is
 * dropped, keep-together where keep-apart stands, and a link across water where there is no such border.
 * Guarantee: where `draftFaults` found nothing before, it finds nothing afterwards (borders being given).
 * Over the same boundaries a draft without doubled rules comes back as it was. Never throws.
 */
export function carryTerritories(
	draft: TerritoryDraft,
	match: RegionMatch,
	fresh: { borders?: BorderList } = {},
): CarriedTerritories {
	const ground = carryGround(match);
	const assignment = carryAssignment(ground, draft);
	const bases = carryBases(ground, draft, assignment.assignment);
	const locks = carryLocks(ground, draft);
	const apart = carryRules(ground, draft.apart, 'apart', everyPair);
	const isApart = new Set(apart.list.flatMap(([a, b]) => [`${a}\n${b}`, `${b}\n${a}`]));
	const together = carryRules(ground, draft.together, 'together', (a, b, isPlain) => {
		const all = everyPair(a, b);
		if (isPlain || typeof all === 'string') return all;
		const pairs = all.filter(
			([one, other]) => !isApart.has(`${ground.key(one)}\n${ground.key(other)}`),
		);
		return pairs.length > 0 ? pairs : 'they are kept apart as well';
	});
	const water = carryRules(
		ground,
		draft.waterLinks,
		'water link',
		waterPairs(match, fresh.borders),
	);
	const hand = carryHandLinks(ground, draft.handLinks);
	return {
		draft: {
			...structuredClone(draft),
			territories: bases.territories,
			assignment: assignment.assignment,
			locks: locks.locks,
			together: together.list,
			apart: apart.list,
			waterLinks: water.list,
			handLinks: hand.list,
		},
		rows: [assignment, bases, locks, together, apart, water, hand].flatMap(({ rows }) => rows),
	};
}

function carryLocks(ground: CarryGround, draft: TerritoryDraft) {
	const names = new Map(draft.territories.map(({ key, name }) => [key, name || key]));
	const pins = Object.entries(draft.locks).map(([key, value]) => ({ key, value }));
	const carried = carryPins(ground, pins, {
		said: ({ key, value: { territory } }) => ({
			what: 'lock',
			keys: [key],
			subject: `The lock of ${quoted(key)} in ${quoted(names.get(territory) ?? territory)}`,
		}),
		code: ({ territory }) => territory,
		collide: null,
		against: () => null,
	});
	const entries = carried.pins.map(({ key, value }) => [key, { ...value }] as const);
	return { locks: Object.fromEntries(entries), rows: carried.rows };
}

const subjects = {
	together: (a: string, b: string) => `That ${a} and ${b} stay together`,
	apart: (a: string, b: string) => `That ${a} and ${b} are kept apart`,
	'water link': (a: string, b: string) => `The link of ${a} and ${b} across water`,
	'hand link': (a: string, b: string) => `The link of ${a} and ${b}, made by hand,`,
};

const carryingOf = (what: keyof typeof subjects, a: string, b: string): Carrying => ({
	what,
	keys: [a, b],
	subject: subjects[what](quoted(a), quoted(b)),
});

function carryRules(
	ground: CarryGround,
	rules: [string, string][],
	what: keyof typeof subjects,
	choose: Choose,
) {
	const said = ([a, b]: [string, string]) => carryingOf(what, a, b);
	const { pairs, rows } = carryPairs(ground, rules, (rule) => rule, said, choose);
	return { list: pairs.map(({ a, b }): [string, string] => [a, b]), rows };
}

function carryHandLinks(ground: CarryGround, links: TerritoryDraft['handLinks']) {
	const { pairs, rows } = carryPairs(
		ground,
		links,
		({ a, b }) => [a, b],
		({ a, b }) => carryingOf('hand link', a, b),
		everyPair,
	);
	return { list: pairs.map(({ rule, a, b }) => ({ a, b, reason: rule.reason })), rows };
}

function waterPairs(match: RegionMatch, borders: BorderList | undefined): Choose {
	if (!borders) return everyPair;
	const water = borderKinds.indexOf('water');
	const isWater = pairTest(borders, match.after.keys.length, (i) => borders.kind[i] === water);
	return (a, b) => {
		const all = everyPair(a, b);
		if (typeof all === 'string') return all;
		const pairs = all.filter(([one, other]) => isWater(one, other));
		return pairs.length > 0 ? pairs : 'there is no such border across water now';
	};
}
