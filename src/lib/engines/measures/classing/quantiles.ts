/**
 * Upper values of classes of as equal numbers of values as there can be: quantiles by linear
 * interpolation between the values beside them.
 *
 * In: one finite value or more, any order. Out: `classes` values ascending, the last the greatest;
 * equal ones among them where a value is frequent.
 * Source: Hyndman and Fan 1996, The American Statistician 50(4) 361-365, definition 7.
 */
export function quantiles(values: readonly number[], classes: number): number[] {
	const sorted = Float64Array.from(values).sort();
	return Array.from({ length: classes }, (_, i) => quantile(sorted, (i + 1) / classes));
}

/** One quantile of sorted values, by the same definition; share 0 to 1. */
export function quantile(sorted: ArrayLike<number>, share: number): number {
	const place = (sorted.length - 1) * share;
	const below = Math.min(Math.floor(place), sorted.length - 1);
	const above = Math.min(below + 1, sorted.length - 1);
	return sorted[below] + (place - below) * (sorted[above] - sorted[below]);
}
