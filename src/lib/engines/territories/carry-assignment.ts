import {
	carriedRow,
	inPercent,
	listedKeys,
	quoted,
	type CarriedRow,
	type CarryGround,
} from '../boundaries/recut/index.ts';
import type { TerritoryDraft } from './territory-draft.ts';

interface Assigned {
	assignment: TerritoryDraft['assignment'];
	rows: CarriedRow[];
}

/** The territory of every new region: see `carryTerritories`. */
export function carryAssignment(ground: CarryGround, draft: TerritoryDraft): Assigned {
	const { heirs, match } = ground;
	const nameOf = namesOf(draft);
	const held = match.before.keys.map((key) =>
		Object.hasOwn(draft.assignment, key) ? draft.assignment[key] : null,
	);
	const given: [string, string][] = [];
	const rows: CarriedRow[] = [];
	heirs.was.forEach((olds, fresh) => {
		const shares = sharesOf(ground, olds, fresh, held);
		if (shares.length === 0) return;
		const [territory] = shares[0];
		given.push([ground.key(fresh), territory]);
		if (shares.length === 1) return;
		const keys = olds.map((old) => match.before.keys[old]);
		const subject = `The territory of ${quoted(ground.key(fresh))}, which was ${listedKeys(keys.map(quoted))},`;
		const said = shares.map(
			([key, share]) => `${quoted(nameOf(key))} had ${inPercent(share)} of it`,
		);
		const reason = `${listedKeys(said)}; it is in ${quoted(nameOf(territory))} now`;
		rows.push(
			carriedRow({ what: 'region', keys, subject }, 'settled', [ground.key(fresh)], reason),
		);
	});
	rows.push(...regionRows(ground, held, nameOf));
	rows.push(...emptied(draft, given));
	return { assignment: Object.fromEntries(given), rows };
}

const namesOf = ({ territories }: TerritoryDraft) => {
	const names = new Map(territories.map(({ key, name }) => [key, name || key]));
	return (key: string) => names.get(key) ?? key;
};

/** Share of a new region by the territory that had it, the largest first; ground of no territory counts for none. */
function sharesOf(
	{ heirs }: CarryGround,
	olds: number[],
	fresh: number,
	held: (string | null)[],
): [string, number][] {
	const shares = new Map<string, number>();
	for (const old of olds) {
		const territory = held[old];
		if (territory === null) continue;
		shares.set(territory, (shares.get(territory) ?? 0) + heirs.shareOfNew(old, fresh));
	}
	return [...shares].sort((a, b) => b[1] - a[1]);
}

/** Regions of a territory that were split, or are gone. */
function regionRows(
	{ heirs, match, key }: CarryGround,
	held: (string | null)[],
	nameOf: (key: string) => string,
): CarriedRow[] {
	return held.flatMap((territory, old) => {
		if (territory === null || heirs.now[old].length === 1) return [];
		const subject = `${quoted(match.before.keys[old])} of ${quoted(nameOf(territory))}`;
		const carrying = { what: 'region', keys: [match.before.keys[old]], subject };
		const now = heirs.now[old].map(key);
		if (now.length === 0) return [carriedRow(carrying, 'dropped', [], 'the region is gone')];
		return [carriedRow(carrying, 'copied', now)];
	});
}

/** Territories that had regions and have none. */
function emptied(
	{ territories, assignment }: TerritoryDraft,
	given: [string, string][],
): CarriedRow[] {
	const had = new Set(Object.values(assignment));
	const has = new Set(given.map(([, territory]) => territory));
	return territories
		.filter(({ key }) => had.has(key) && !has.has(key))
		.map(({ key, name }) => ({
			what: 'territory',
			keys: Object.keys(assignment).filter((region) => assignment[region] === key),
			now: [],
			outcome: 'dropped' as const,
			words: `${quoted(name || key)} has no regions any more; the territory itself stays.`,
		}));
}
