import { mostDifferent, type GroupRule } from '$lib/engines/editions/draft';
import { ruleLimits } from '$lib/engines/editions/rule-limits';

/** Regions that a column of the boundary file names alike. */
export interface ColumnGroup {
	value: string;
	keys: string[];
}

/** The values of a column with their regions, as the file first names them; blank ones make no group. */
export function columnGroups(
	keys: readonly string[],
	values: readonly (string | null)[],
): ColumnGroup[] {
	const groups = new Map<string, string[]>();
	values.forEach((value, region) => {
		if (value === null || value.trim() === '') return;
		const list = groups.get(value);
		if (list) list.push(keys[region]);
		else groups.set(value, [keys[region]]);
	});
	return Array.from(groups, ([value, members]) => ({ value, keys: members }));
}

/** Why a value cannot be a group of this kind, or what to mind; '' when all is well. */
export function groupNote(kind: GroupRule['kind'], { keys }: ColumnGroup, inks: number): string {
	if (keys.length < 2) return 'one region only: no rule';
	if (kind === 'alike') return '';
	if (keys.length > mostDifferent) return `more than ${mostDifferent} cannot all differ: no rule`;
	return keys.length > inks ? `needs ${keys.length} inks, the palette has ${inks}` : '';
}

/** The rules that the values of a column make, named after column and value. */
export const groupRules = (
	kind: GroupRule['kind'],
	column: string,
	groups: readonly ColumnGroup[],
): GroupRule[] =>
	groups
		.filter(({ keys }) => keys.length > 1 && (kind === 'alike' || keys.length <= mostDifferent))
		.map(({ value, keys }) => ({
			...{ kind, keys },
			name: `${column}: ${value}`.slice(0, ruleLimits.groupName),
		}));
