/**
 * Limits moved to the roundest figures that leave every value in its class: multiples of 10, 5, 2 or 1
 * in the highest decimal place that has one between the values on both sides, and of these the nearest.
 *
 * In: limits strictly ascending; finite values. Out: as many limits, strictly ascending. Where no shorter
 * figure lies between two values a limit stays as it is.
 */
export function roundedLimits(limits: readonly number[], values: readonly number[]): number[] {
	const sorted = Float64Array.from(values).sort();
	let before = -Infinity;
	return limits.map((limit, i) => {
		const place = firstAbove(sorted, limit);
		before = roundest(limit, {
			after: before,
			// on the value below is allowed, on the value above is not; nor may limits meet
			from: place > 0 ? sorted[place - 1] : -Infinity,
			to: Math.min(sorted[place] ?? Infinity, limits[i + 1] ?? Infinity),
		});
		return before;
	});
}

interface Bounds {
	after: number;
	from: number;
	to: number;
}

/** Number of sorted values that are not above a limit. */
function firstAbove(sorted: Float64Array, limit: number): number {
	let [low, high] = [0, sorted.length];
	while (low < high) {
		const middle = (low + high) >> 1;
		if (sorted[middle] <= limit) low = middle + 1;
		else high = middle;
	}
	return low;
}

/** The roundest figure above `after`, from `from` up to but without `to`; a limit lies there. */
function roundest(limit: number, bounds: Bounds): number {
	if (limit === 0) return 0;
	const highest = Math.floor(Math.log10(Math.abs(limit)));
	for (let place = highest; place > highest - 16; place--) {
		for (const step of [10, 5, 2, 1]) {
			const near = nearest(limit, step, place, bounds);
			if (near !== null) return near;
		}
	}
	return limit;
}

/** The multiple of step * 10^place that is nearest to a limit within the bounds. */
function nearest(limit: number, step: number, place: number, { after, from, to }: Bounds) {
	const times = limit / Number(`${step}e${place}`);
	const fits = [Math.floor(times), Math.ceil(times)]
		.map((whole) => Number(`${whole * step}e${place}`) + 0)
		.filter((value) => value > after && value >= from && value < to);
	if (fits.length === 0) return null;
	return fits.reduce((best, value) =>
		Math.abs(value - limit) < Math.abs(best - limit) ? value : best,
	);
}
