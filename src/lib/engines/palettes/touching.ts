import type { Touching } from './palette.ts';

/**
 * The pairs that touch, each once with a < b, sorted by a then b.
 * Throws a RangeError when a pair names an ink that is not there or an ink twice.
 */
export function touchingPairs(count: number, touching: Touching): [number, number][] {
	const seen = new Set<number>();
	const listed = touching === 'all' ? allPairs(count) : touching;
	for (const [i, j] of listed) {
		const [a, b] = i < j ? [i, j] : [j, i];
		if (!Number.isInteger(a) || !Number.isInteger(b) || a < 0 || b >= count || a === b) {
			throw new RangeError(`No pair of ${count} inks: ${i}, ${j}`);
		}
		seen.add(a * count + b);
	}
	return [...seen]
		.sort((one, two) => one - two)
		.map((code) => [Math.floor(code / count), code % count]);
}

function allPairs(count: number): [number, number][] {
	return Array.from({ length: count }, (_, a) => a).flatMap((a) =>
		Array.from({ length: count - a - 1 }, (_, k): [number, number] => [a, a + 1 + k]),
	);
}
