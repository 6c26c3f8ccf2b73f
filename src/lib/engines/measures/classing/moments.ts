/** Arithmetic mean; of no values, NaN. */
export const mean = (values: readonly number[]): number =>
	values.reduce((sum, value) => sum + value, 0) / values.length;

/** Standard deviation of a sample, by n - 1; 0 for a single value. */
export function standardDeviation(values: readonly number[]): number {
	if (values.length < 2) return 0;
	const centre = mean(values);
	const squares = values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
	return Math.sqrt(squares / (values.length - 1));
}

export function extremes(values: readonly number[]): { least: number; most: number } {
	let [least, most] = [Infinity, -Infinity];
	for (const value of values) {
		if (value < least) least = value;
		if (value > most) most = value;
	}
	return { least, most };
}
