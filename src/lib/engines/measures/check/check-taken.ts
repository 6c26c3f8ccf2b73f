import type { TypedColumn } from '../columns/typed-column.ts';
import type { Join } from '../join/join.ts';
import type { TakenValues, TakeRules } from '../values/rules.ts';

/** How far two sums of the same numbers in another order may lie apart, against the sum of their sizes. */
const rounding = 1e-12;

/**
 * What is wrong with values taken from a column, in plain sentences; empty when every region has what the
 * rules give it, nothing that should have been refused was taken, and the sums are conserved. Works from the
 * cells' numbers and the join; shares no code with `takeValues`. Linear.
 */
export function checkTaken(
	join: Join,
	column: TypedColumn,
	rules: TakeRules,
	taken: TakenValues,
): string[] {
	if (taken.values.length !== join.regions) return ['There is not one value a region.'];
	const faults: string[] = [];
	const given = Array.from({ length: join.regions }, (): (number | null)[] => []);
	const sums = { inside: 0, outside: 0, sizes: 0 };
	for (let row = 0; row < join.region.length; row++) {
		const written = column.cells[row] === null ? null : column.values[row];
		const region = join.region[row];
		if (written !== null && !Number.isNaN(written)) {
			sums[region < 0 ? 'outside' : 'inside'] +=
				region < 0 || written >= 0 || rules.negative === 'keep' ? written : 0;
			sums.sizes += Math.abs(written);
		}
		if (region < 0) continue;
		const outcome = ruled(written, rules);
		if (outcome === 'refuse') faults.push(`Row ${row} should have been refused.`);
		else given[region].push(outcome);
	}
	faults.push(...regionFaults(given, rules, taken));
	faults.push(...sumFaults(sums, rules, taken));
	return faults;
}

function ruled(written: number | null, rules: TakeRules): number | null | 'refuse' {
	if (written === null) return rules.empty === 'zero' ? 0 : null;
	if (Number.isNaN(written)) return rules.notNumber === 'refuse' ? 'refuse' : null;
	if (written >= 0 || rules.negative === 'keep') return written;
	return rules.negative === 'refuse' ? 'refuse' : null;
}

function* regionFaults(
	given: (number | null)[][],
	rules: TakeRules,
	{ values }: TakenValues,
): Generator<string> {
	for (let region = 0; region < given.length; region++) {
		if (given[region].length > 1 && rules.doubled === 'refuse') {
			yield `#${region} stands in several rows and should have been refused.`;
		}
		const numbers = given[region].filter((number) => number !== null);
		const value = values[region];
		if (numbers.length === 0) {
			if (!Number.isNaN(value)) yield `#${region} has a value from nowhere.`;
		} else if (rules.doubled === 'sum') {
			const sum = numbers.reduce((a, b) => a + b, 0);
			const size = numbers.reduce((a, b) => a + Math.abs(b), 0);
			if (!(Math.abs(sum - value) <= rounding * size))
				yield `#${region} is not the sum of its rows.`;
		} else if (!Object.is(value, rules.doubled === 'last' ? numbers.at(-1) : numbers[0])) {
			yield `#${region} does not have the number of its ${rules.doubled} row.`;
		}
	}
}

function* sumFaults(
	sums: { inside: number; outside: number; sizes: number },
	rules: TakeRules,
	taken: TakenValues,
): Generator<string> {
	const near = (a: number, b: number) => Math.abs(a - b) <= rounding * sums.sizes;
	let total = 0;
	for (const value of taken.values) if (!Number.isNaN(value)) total += value;
	if (!near(total, taken.total)) yield 'The total is not the sum of the values.';
	if (rules.doubled === 'sum' && !near(sums.inside, taken.total)) {
		yield 'The sum over the rows is not the sum over the regions.';
	}
	if (!near(sums.outside, taken.outside))
		yield 'The sum outside is not that of the rows without a region.';
}
