import { mean, standardDeviation } from './moments.ts';

/**
 * Limits at multiples of the standard deviation from the mean. In: two finite values or more. Out:
 * `classes - 1` limits ascending, symmetric about the mean: of an even number of classes one is the mean,
 * of an odd number the middle class holds it (..., -2, -1, 1, 2, ...). Some may lie beyond the values.
 * The deviation is that of a sample (n - 1).
 */
export function standardDeviations(values: readonly number[], classes: number): number[] {
	const [centre, deviation] = [mean(values), standardDeviation(values)];
	return multiplesFor(classes).map((times) => centre + times * deviation);
}

function multiplesFor(classes: number): number[] {
	const side = Array.from({ length: Math.floor((classes - 1) / 2) }, (_, i) => i + 1);
	const middle = classes % 2 === 0 ? [0] : [];
	return [...side.map((times) => -times).reverse(), ...middle, ...side];
}
