import { ckmeans } from 'simple-statistics';

/**
 * Upper values of the classes whose sum of squared deviations from the class means is least of all.
 *
 * In: one finite value or more, any order; classes 1 or more. Out: ascending, the last the greatest value;
 * fewer than asked where there are fewer distinct values. Exact but for rounding, and equal values
 * are never parted.
 * Source: Fisher 1958, JASA 53(284) 789-798; computed by `ckmeans` (Wang and Song 2011, R Journal 3(2)
 * 29-33), which is exact for one dimension, where searches from a random start are not.
 */
export function naturalBreaks(values: readonly number[], classes: number): number[] {
	const distinct = new Set(values).size;
	const groups = ckmeans([...values], Math.min(classes, distinct));
	// where rounding hides how values differ, it may part equal ones: then their class ends with them
	return [...new Set(groups.map((group) => group[group.length - 1]))];
}
