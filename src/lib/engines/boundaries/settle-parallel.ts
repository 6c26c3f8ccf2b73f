import type { Segments } from './segments.ts';

/** A segment that a region has on both its sides, and another region that runs along it. */
export interface Squeezed {
	region: number;
	other: number;
	segment: number;
}

/**
 * Settles segments that lie on each other. A region on both sides of one line has nothing there (a
 * spike, or a corridor of no width), however its edges were paired with those of others: it is taken
 * off both sides, and the sides that remain are paired again in order of region. Answers who was taken
 * off and who ran along.
 */
export function settleParallel(segments: Segments): Squeezed[] {
	const squeezed: Squeezed[] = [];
	if (segments.parallel === 0) return squeezed;
	for (const group of equalSegments(segments)) {
		const left = sidesOf(segments.left, group);
		const right = sidesOf(segments.right, group);
		const off = takeOff(left, right);
		for (const region of off) {
			for (const other of new Set([...left, ...right, ...off])) {
				if (other !== region) squeezed.push({ region, other, segment: group[0] });
			}
		}
		group.forEach((segment, i) => {
			segments.left[segment] = left[i] ?? -1;
			segments.right[segment] = right[i] ?? -1;
		});
	}
	return squeezed;
}

/** Takes regions off that are in both lists, and answers which. */
function takeOff(left: number[], right: number[]): number[] {
	const off: number[] = [];
	for (const region of [...left]) {
		const other = right.indexOf(region);
		if (other < 0) continue;
		right.splice(other, 1);
		left.splice(left.indexOf(region), 1);
		off.push(region);
	}
	return off;
}

function sidesOf(side: Int32Array, group: number[]): number[] {
	return group
		.map((segment) => side[segment])
		.filter((region) => region >= 0)
		.sort((a, b) => a - b);
}

/** Groups of two and more segments between the same vertices. */
function* equalSegments(segments: Segments): Generator<number[]> {
	const { low, high, count } = segments;
	const doubled = new Map<number, number[]>();
	for (const s of segments.twins) doubled.set(low[s] * 2 ** 32 + high[s], []);
	for (let s = 0; s < count; s++) doubled.get(low[s] * 2 ** 32 + high[s])?.push(s);
	yield* doubled.values();
}
