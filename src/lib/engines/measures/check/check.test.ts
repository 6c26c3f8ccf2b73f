import { expect, it } from 'vitest';
import { tableOf } from '../../../../../tests/support/joins.ts';
import {
	checkJoin,
	checkTaken,
	joinTable,
	takeValues,
	typeColumn,
	type Join,
	type TakenValues,
	type TakeRules,
} from '../index.ts';

const regions = { keys: ['01', '02', '03', '3'], names: ['A', 'B', 'C', 'D'] };
const table = tableOf({ Unit: ['01', 2, 'x', '01', '03'], Visits: [1, 2, 4, 8, -1] });
const rules: TakeRules = {
	doubled: 'sum',
	empty: 'missing',
	negative: 'keep',
	notNumber: 'refuse',
};

const joined = () => joinTable(table, { column: 0, by: 'key' }, regions);

it('finds every way in which a join can lie', () => {
	expect(checkJoin(table, joined(), regions)).toEqual([]);
	const lies: [string, (join: Join) => void][] = [
		['does not match', (join) => (join.region[0] = 1)],
		['does not match', (join) => (join.how[1] = 'exact')],
		['could mean several', (join) => (join.how[4] = 'zeros')],
		['without a reason', (join) => (join.region[2] = 0)],
		['without a reason', (join) => (join.how[0] = null)],
		['does not exist', (join) => (join.region[0] = 4)],
		['accounted for', (join) => join.unmatched.pop()],
		['accounted for', (join) => join.leftOut.push(0)],
		['list of doubled', (join) => join.doubled.pop()],
		['list of doubled', (join) => join.doubled.push({ region: 1, rows: [1, 2] })],
		['wrongly listed', (join) => join.missing.pop()],
		['said to match', (join) => join.counts.exact++],
		['of another number of regions', (join) => join.regions++],
		['names a region but', (join) => (join.unmatched[0].text = '01')],
	];
	for (const [fault, tell] of lies) {
		const join = joined();
		tell(join);
		expect([fault, checkJoin(table, join, regions).join(' ')]).toEqual([
			fault,
			expect.stringContaining(fault),
		]);
	}
});

it('finds every way in which taken values can lie', () => {
	const column = typeColumn(table, 1, '.');
	const taken = takeValues(joined(), column, rules) as TakenValues;
	const faults = (changed: Partial<TakenValues>, other: Partial<TakeRules> = {}) =>
		checkTaken(joined(), column, { ...rules, ...other }, { ...taken, ...changed }).join(' ');
	expect(faults({})).toBe('');
	expect(faults({ values: Float64Array.of(9, 2, -1) })).toContain('not one value a region');
	expect(faults({ values: Float64Array.of(8, 2, -1, NaN) })).toContain('#0 is not the sum');
	expect(faults({ values: Float64Array.of(9, 2, -1, 0) })).toContain('#3 has a value from nowhere');
	expect(faults({ values: Float64Array.of(9, 2, NaN, NaN) })).toContain('#2 is not the sum');
	expect(faults({ total: 11 })).toContain('The total');
	expect(faults({ outside: 0 })).toContain('The sum outside');
	expect(faults({}, { negative: 'refuse' })).toContain('Row 4 should have been refused');
	expect(faults({}, { doubled: 'refuse' })).toContain('#0 stands in several rows');
	expect(faults({}, { doubled: 'first' })).toContain(
		'#0 does not have the number of its first row',
	);
});
