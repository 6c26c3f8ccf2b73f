import {
	carriedRow,
	quoted,
	type CarriedRow,
	type CarryGround,
} from '../boundaries/recut/index.ts';
import type { TerritoryDraft, TerritoryEntry } from './territory-draft.ts';

/** The territories with their bases in new regions: see `carryTerritories`. */
export function carryBases(
	ground: CarryGround,
	draft: TerritoryDraft,
	assignment: TerritoryDraft['assignment'],
): { territories: TerritoryEntry[]; rows: CarriedRow[] } {
	const now = new Map(Object.entries(assignment));
	const held = new Set(now.values());
	const taken = new Set<string>();
	const rows: CarriedRow[] = [];
	const carried = (entry: TerritoryEntry): TerritoryEntry => {
		if (entry.base === null) return { ...entry };
		const { base, row } = carryBase(ground, entry, entry.base, (region) => {
			if (taken.has(region)) return 'another territory has its base there';
			const isOwn = now.get(region) === entry.key || !held.has(entry.key);
			return isOwn ? null : 'its region is in another territory now';
		});
		if (base !== null) taken.add(base);
		rows.push(row);
		return { ...entry, base };
	};
	// a territory without regions may have its base anywhere, so it comes after those that may not
	const order = [...draft.territories].sort(
		(a, b) => Number(held.has(b.key)) - Number(held.has(a.key)),
	);
	const done = new Map(order.map((entry) => [entry, carried(entry)]));
	return { territories: draft.territories.map((entry) => done.get(entry)!), rows };
}

/** The first heir, the largest piece first, that nothing speaks against. */
function carryBase(
	ground: CarryGround,
	{ key, name }: TerritoryEntry,
	base: string,
	against: (region: string) => string | null,
): { base: string | null; row: CarriedRow } {
	const subject = `The base of ${quoted(name || key)} in ${quoted(base)}`;
	const carrying = { what: 'base', keys: [base], subject };
	let reason = 'the region is gone';
	for (const region of ground.heirsOf(base).map(ground.key)) {
		const fault = against(region);
		if (fault === null) return { base: region, row: carriedRow(carrying, 'followed', [region]) };
		reason = fault;
	}
	return { base: null, row: carriedRow(carrying, 'dropped', [], reason) };
}
