/**
 * The class of a value: how many limits lie below it, so that a value on a limit is in the lower class.
 * In: limits ascending. Out: 0 to limits.length. Equal values are in one class, whatever the limits.
 */
export function classOf(value: number, limits: readonly number[]): number {
	let [low, high] = [0, limits.length];
	while (low < high) {
		const middle = (low + high) >> 1;
		if (limits[middle] < value) low = middle + 1;
		else high = middle;
	}
	return low;
}

/** How many of the values are in each class; limits.length + 1 numbers. */
export function classCounts(values: readonly number[], limits: readonly number[]): number[] {
	const counts = new Array<number>(limits.length + 1).fill(0);
	for (const value of values) counts[classOf(value, limits)]++;
	return counts;
}
