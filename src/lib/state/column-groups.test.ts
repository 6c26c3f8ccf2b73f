import { describe, expect, it } from 'vitest';
import { columnGroups, groupNote, groupRules } from './column-groups';

const many = Array.from({ length: 65 }, (_, i) => `m${i}`);
const keys = ['a', 'b', 'c', 'd', ...many];
const groups = columnGroups(keys, ['North', 'South', 'North', null, ...many.map(() => 'Wide')]);

describe('groups by a column', () => {
	it('gather the regions that a value names, blanks left out', () => {
		expect(groups.map(({ value, keys: members }) => [value, members.length])).toEqual([
			['North', 2],
			['South', 1],
			['Wide', 65],
		]);
	});

	it('make a rule of every value that can be one, and say why others cannot', () => {
		expect(groupRules('different', 'Province', groups)).toEqual([
			{ kind: 'different', name: 'Province: North', keys: ['a', 'c'] },
		]);
		expect(groupRules('alike', 'Province', groups)).toHaveLength(2);
		expect(groups.map((group) => groupNote('different', group, 1))).toEqual([
			'needs 2 inks, the palette has 1',
			'one region only: no rule',
			'more than 64 cannot all differ: no rule',
		]);
	});
});
