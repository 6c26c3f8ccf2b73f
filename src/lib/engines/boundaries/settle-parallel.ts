import type { Segments } from './segments.ts';

/**
 * Settles segments that lie on each other. A region on both sides of one line has nothing there (a
 * spike, or a corridor of no width), however its edges were paired with those of others: it is taken
 * off both sides, and the sides that remain are paired again in order of region.
 */
export function settleParallel(segments: Segments): void {
	if (segments.parallel === 0) return;
	for (const group of equalSegments(segments)) {
		const left = sidesOf(segments.left, group);
		const right = sidesOf(segments.right, group);
		for (const region of [...left]) {
			const other = right.indexOf(region);
			if (other < 0) continue;
			right.splice(other, 1);
			left.splice(left.indexOf(region), 1);
		}
		group.forEach((segment, i) => {
			segments.left[segment] = left[i] ?? -1;
			segments.right[segment] = right[i] ?? -1;
		});
	}
}

function sidesOf(side: Int32Array, group: number[]): number[] {
	return group
		.map((segment) => side[segment])
		.filter((region) => region >= 0)
		.sort((a, b) => a - b);
}

/** Groups of two and more segments between the same vertices. */
export function* equalSegments(segments: Segments): Generator<number[]> {
	const { low, high, count } = segments;
	const doubled = new Map<number, number[]>();
	for (const s of segments.twins) doubled.set(low[s] * 2 ** 32 + high[s], []);
	for (let s = 0; s < count; s++) doubled.get(low[s] * 2 ** 32 + high[s])?.push(s);
	yield* doubled.values();
}
