import type { BorderList } from '../borders/border-list.ts';
import type { Finding } from './finding.ts';
import type { Joined } from './node-outlines.ts';

const keysOf = (regions: Iterable<number>, keys: string[]) =>
	[...regions].sort((a, b) => a - b).map((r) => keys[r]);

export function joinedFinding(joined: Joined, keys: string[]): Finding[] {
	if (joined.places === 0) return [];
	return [
		{
			code: 'vertices-joined',
			severity: 'note',
			message: `Borders drawn with different corners on either side were matched in ${joined.places} places, within 2 cm.`,
			regions: keysOf(joined.regions, keys),
			at: joined.at,
		},
	];
}

export function toleranceFinding(joined: Joined, keys: string[], tolerance: number): Finding[] {
	if (joined.places === 0) return [];
	return [
		{
			code: 'tolerance-joined',
			severity: 'warning',
			message: `Borders up to ${tolerance} m apart were joined in ${joined.places} places.`,
			regions: keysOf(joined.regions, keys),
			at: joined.at,
		},
	];
}

/** Every pair that the tolerance made or unmade, one finding each way with the pairs named. */
export function gainedAndLost(
	before: BorderList,
	after: BorderList,
	keys: string[],
	tolerance: number,
): Finding[] {
	const gained = missingFrom(before, after);
	const lost = missingFrom(after, before);
	const said = (code: string, pairs: number[], list: BorderList, verb: string): Finding[] => {
		if (pairs.length === 0) return [];
		const named = pairs.map((i) => `${keys[list.a[i]]} and ${keys[list.b[i]]}`);
		return [
			{
				code,
				severity: 'warning',
				message: `Joining within ${tolerance} m ${verb}: ${named.join('; ')}.`,
				regions: keysOf(new Set(pairs.flatMap((i) => [list.a[i], list.b[i]])), keys),
				at: [list.at[2 * pairs[0]], list.at[2 * pairs[0] + 1]],
			},
		];
	};
	return [
		...said('pairs-gained', gained, after, 'made these neighbours'),
		...said('pairs-lost', lost, before, 'parted these neighbours'),
	];
}

function missingFrom(list: BorderList, pairs: BorderList): number[] {
	const code = (l: BorderList, i: number) => `${l.a[i]} ${l.b[i]} ${l.kind[i]}`;
	const known = new Set(Array.from(list.a, (_, i) => code(list, i)));
	return Array.from(pairs.a, (_, i) => i).filter((i) => !known.has(code(pairs, i)));
}
