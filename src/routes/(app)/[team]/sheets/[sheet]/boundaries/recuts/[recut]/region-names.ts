import type { RecutGroup } from '$lib/schemas/recut';
import type { LoadedSides } from '$lib/state/recut-drawer';

/** What the region of a key is called on either side: "Merrennes (0512)", or the key where it has no name. */
export interface RegionNames {
	before: (key: string) => string;
	after: (key: string) => string;
}

/** Names from the groups, and from the geometry once that is there. */
export function regionNames(groups: readonly RecutGroup[], sides: LoadedSides | null): RegionNames {
	return { before: called('before', groups, sides), after: called('after', groups, sides) };
}

function called(
	side: 'before' | 'after',
	groups: readonly RecutGroup[],
	sides: LoadedSides | null,
): (key: string) => string {
	const names = new Map<string, string>();
	sides?.[side].keys.forEach((key, region) => names.set(key, sides[side].names[region]));
	for (const group of groups) for (const { key, name } of group[side]) names.set(key, name);
	return (key) => {
		const name = names.get(key);
		return name && name !== key ? `${name} (${key})` : key;
	};
}
