import type { BorderList } from '$lib/engines/borders/border-list';
import { borderKinds } from '../engines/borders/border-list.ts';
import type { Draft } from '$lib/engines/editions/draft';

/** Region numbers by key. */
export type RegionNumbers = ReadonlyMap<string, number>;

export const numberRegions = (keys: readonly string[]): RegionNumbers =>
	new Map(keys.map((key, number) => [key, number]));

const line = borderKinds.indexOf('line');
const point = borderKinds.indexOf('point');

/** Number of a pair of regions, the same in either order. */
export const pairNumber = (a: number, b: number): number =>
	Math.min(a, b) * 2 ** 26 + Math.max(a, b);

/** Numbers of the pairs that a list of hand-made rules names; pairs of unknown regions are passed over. */
export function pairsNamed(
	pairs: readonly { a: string; b: string }[],
	numbers: RegionNumbers,
): Map<number, string> {
	const named = new Map<number, string>();
	for (const pair of pairs) {
		const [a, b] = [numbers.get(pair.a), numbers.get(pair.b)];
		if (a === undefined || b === undefined) continue;
		named.set(pairNumber(a, b), 'reason' in pair ? String(pair.reason) : '');
	}
	return named;
}

/** Why a border of the sheet does or does not ask for two inks. */
export type Standing = 'counts' | 'point-not-counted' | 'struck';

/** For each border whether it counts under the draft's rules. */
export function standings(
	borders: BorderList,
	draft: Pick<Draft, 'pointTouches' | 'struck'>,
	numbers: RegionNumbers,
): Standing[] {
	const struck = pairsNamed(draft.struck, numbers);
	return Array.from(borders.a, (a, border) => {
		if (struck.has(pairNumber(a, borders.b[border]))) return 'struck';
		return borders.kind[border] === point && !draft.pointTouches ? 'point-not-counted' : 'counts';
	});
}

export const isLine = (borders: BorderList, border: number): boolean =>
	borders.kind[border] === line;
