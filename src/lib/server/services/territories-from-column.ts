import type { TerritoryDraft, TerritoryEntry } from '../../engines/territories/territory-draft.ts';
import type { TerritoriesPreview } from '../../schemas/desk-territories.ts';
import { Unfit } from './outcomes.ts';
import { freshKey } from './territory-names.ts';

/** Most territories that a list takes; see the schema of the draft. */
const most = 2_000;

/**
 * Territories as a column of words names them, one word a region. One that the draft has already, by its
 * name in any case, keeps its key and all that is known of it; the others are made, in the order of the
 * column. Regions without a word have no territory. Locks to territories that get no region are dropped.
 */
export function fromColumn(
	draft: TerritoryDraft,
	keys: readonly string[],
	texts: readonly (string | null)[],
): TerritoriesPreview {
	const taken = new Set(draft.territories.map(({ key }) => key));
	const byName = new Map(draft.territories.map((entry) => [folded(entry.name), entry]));
	const assignment: Record<string, string> = {};
	const used: TerritoryEntry[] = [];
	const counts = new Map<string, number>();
	keys.forEach((key, region) => {
		const name = (texts[region] ?? '').trim().slice(0, 120);
		if (name === '') return;
		const entry = byName.get(folded(name)) ?? newEntry(name, taken);
		byName.set(folded(name), entry);
		if (!counts.has(entry.key)) used.push(entry);
		counts.set(entry.key, (counts.get(entry.key) ?? 0) + 1);
		assignment[key] = entry.key;
	});
	if (used.length === 0) throw new Unfit('empty-column', 'The column has no word in it.');
	if (used.length > most) {
		const count = used.length.toLocaleString('en-GB');
		throw new Unfit(
			'too-many-territories',
			`The column names ${count} territories; 2,000 can be kept.`,
		);
	}
	const document = { ...draft, assignment, territories: listed(draft, used, assignment) };
	return {
		document: { ...document, locks: locksThatHold(document) },
		regions: document.territories.map(({ key }) => counts.get(key) ?? 0),
		without: keys.length - Object.keys(assignment).length,
	};
}

const folded = (name: string) => name.trim().toLowerCase();

export const newEntry = (name: string, taken: Set<string>): TerritoryEntry => ({
	key: freshKey(name, taken),
	name,
	...{ person: '', email: '', base: null, capacity: 1 },
	...{ frozen: false, vacant: false, closing: false },
});

/** Those that were there first, in their order; a base outside its own territory is forgotten. */
function listed(
	{ territories }: TerritoryDraft,
	used: TerritoryEntry[],
	assignment: Record<string, string>,
): TerritoryEntry[] {
	const held = new Set(used.map(({ key }) => key));
	const kept = new Set(territories.map(({ key }) => key));
	return [...territories, ...used.filter(({ key }) => !kept.has(key))].map((entry) => {
		const { key, base } = entry;
		const isAway = base !== null && held.has(key) && assignment[base] !== key;
		return isAway ? { ...entry, base: null } : entry;
	});
}

const locksThatHold = ({ locks, territories }: TerritoryDraft): TerritoryDraft['locks'] => {
	const keys = new Set(territories.map(({ key }) => key));
	return Object.fromEntries(Object.entries(locks).filter(([, lock]) => keys.has(lock.territory)));
};
