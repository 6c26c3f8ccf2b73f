import type { BorderList } from '../borders/index.ts';
import {
	carriedRow,
	listedKeys,
	quoted,
	type CarriedRow,
	type CarryGround,
} from '../boundaries/recut/index.ts';
import type { GroupRule } from './draft.ts';

/**
 * Rules for many regions at once, on the new regions.
 *
 * In: groups by old keys; `differ`: pairs of new regions that must differ (null: none known); `apart`:
 * pairs of new keys that are kept apart. Out: groups of two regions or more, in the order given, and a row
 * of the report for each.
 *
 * `alike`: every piece of a split region is in the group, but no piece and no merged region that must
 * differ from one that is in it already; regions that go on one as one always are. `different`: of a
 * split region the largest piece alone, since pieces of one region had one ink before and nothing asks
 * for more; regions that have become one count once. Linear in keys and borders.
 */
export function carryGroups(
	ground: CarryGround,
	groups: readonly GroupRule[],
	differ: Pick<BorderList, 'a' | 'b'> | null,
	apart: readonly [string, string][],
): { list: GroupRule[]; rows: CarriedRow[] } {
	const unlike = groups.some(({ kind }) => kind === 'alike')
		? differingFrom(ground, differ, apart)
		: new Map<number, number[]>();
	const list: GroupRule[] = [];
	const rows = groups.map((group) => {
		const now =
			group.kind === 'alike' ? alikeHeirs(ground, group, unlike) : firstHeirs(ground, group);
		if (now.length >= 2) list.push({ ...group, keys: now.map(ground.key) });
		return rowOf(ground, group, now);
	});
	return { list, rows };
}

type Neighbours = ReadonlyMap<number, readonly number[]>;

function differingFrom(
	{ match }: CarryGround,
	differ: Pick<BorderList, 'a' | 'b'> | null,
	apart: readonly [string, string][],
): Neighbours {
	const unlike = new Map<number, number[]>();
	const put = (a: number, b: number) => {
		const list = unlike.get(a);
		if (list) list.push(b);
		else unlike.set(a, [b]);
	};
	const both = (a: number, b: number) => {
		put(a, b);
		put(b, a);
	};
	differ?.a.forEach((a, i) => both(a, differ.b[i]));
	if (apart.length === 0) return unlike;
	const numbers = new Map(match.after.keys.map((key, region) => [key, region]));
	for (const [a, b] of apart) both(numbers.get(a) ?? -1, numbers.get(b) ?? -1);
	return unlike;
}

/** Regions that go on as one first, then the largest piece of each other one, then smaller pieces. */
function alikeHeirs(ground: CarryGround, { keys }: GroupRule, unlike: Neighbours): number[] {
	const { heirs, old, heirsOf } = ground;
	const taken = new Set<number>();
	const isPlain = (key: string) => heirs.isOne[old(key) ?? -1] ?? false;
	for (const key of keys) if (isPlain(key)) taken.add(heirsOf(key)[0]);
	const take = (fresh: number) => {
		if (!unlike.get(fresh)?.some((other) => taken.has(other))) taken.add(fresh);
	};
	for (const key of keys) if (!isPlain(key)) heirsOf(key).slice(0, 1).forEach(take);
	for (const key of keys) if (!isPlain(key)) heirsOf(key).slice(1).forEach(take);
	const inOrder = new Set(keys.flatMap((key) => heirsOf(key).filter((fresh) => taken.has(fresh))));
	return [...inOrder];
}

const firstHeirs = ({ heirsOf }: CarryGround, { keys }: Pick<GroupRule, 'keys'>): number[] => [
	...new Set(keys.flatMap((key) => heirsOf(key).slice(0, 1))),
];

function rowOf(ground: CarryGround, group: GroupRule, fresh: number[]): CarriedRow {
	const { kind, name, keys } = group;
	const subject = `That all of ${quoted(name)} are ${kind === 'alike' ? 'kept alike' : 'different'}`;
	const carrying = { what: 'group', keys: [...keys], subject };
	const reasons = reasonsFor(ground, group, fresh);
	if (fresh.length < 2) {
		const left = reasons === '' ? 'fewer than two of its regions are left' : reasons;
		return carriedRow(carrying, 'dropped', [], left);
	}
	const outcome = fresh.length > keys.length ? 'copied' : 'followed';
	return carriedRow(carrying, outcome, fresh.map(ground.key), reasons);
}

/** What does not follow of a group, and why. */
function reasonsFor(ground: CarryGround, { keys, kind }: GroupRule, fresh: number[]): string {
	const isIn = new Set(fresh);
	const gone = keys.filter((key) => ground.heirsOf(key).length === 0);
	const all = new Set(keys.flatMap(ground.heirsOf));
	const merged = firstHeirs(ground, { keys }).length < keys.length - gone.length;
	const left = [...all].filter((heir) => !isIn.has(heir)).map(ground.key);
	const named = (list: string[]) => listedKeys(list.map(quoted));
	const is = (list: string[]) => (list.length === 1 ? 'is' : 'are');
	const why = kind === 'alike' ? 'must differ from the others now' : 'count with a larger piece';
	return [
		gone.length > 0 ? `${named(gone)} ${is(gone)} gone` : '',
		left.length > 0 ? `${named(left)} ${is(left)} left out (${why})` : '',
		merged ? 'regions of it have become one' : '',
	]
		.filter((reason) => reason !== '')
		.join('; ');
}
