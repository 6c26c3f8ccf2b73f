import type { Coverage } from '../coverage.ts';

/**
 * Pairs of an old and a new region whose outlines run through the same points, found without laying one
 * over the other: by region of `before`, the region of `after`, or -1. However outlines are cut into
 * arcs, wherever rings start, and by whatever whole turns longitudes are unwrapped, the sums of their
 * segments agree. Only pairs that are the only ones with their outline on both sides are given.
 * Two sums of 32 bits, the number of segments and the area (to a millionth) must agree.
 */
export function sameOutlines(before: Coverage, after: Coverage): Int32Array {
	const old = outlineNames(before);
	const fresh = outlineNames(after);
	const place = new Map<string, number>();
	fresh.forEach((name, region) => place.set(name, place.has(name) ? -1 : region));
	const seen = new Map<string, number>();
	old.forEach((name) => seen.set(name, (seen.get(name) ?? 0) + 1));
	return Int32Array.from(old, (name, region) => {
		const to = place.get(name) ?? -1;
		if (to < 0 || seen.get(name) !== 1) return -1;
		const [a, b] = [before.areasKm2[region], after.areasKm2[to]];
		return Math.abs(a - b) <= 1e-6 * Math.max(a, b) ? to : -1;
	});
}

function outlineNames(coverage: Coverage): string[] {
	const sums = new Int32Array(3 * coverage.keys.length);
	const { arcStarts, arcLeft, arcRight } = coverage;
	const sum = new Int32Array(2);
	for (let arc = 0; arc < arcLeft.length; arc++) {
		sumSegments(coverage.arcPoints, arcStarts[arc], arcStarts[arc + 1] - 1, sum);
		for (const region of [arcLeft[arc], arcRight[arc]]) {
			if (region < 0) continue;
			sums[3 * region] += sum[0];
			sums[3 * region + 1] += sum[1];
			sums[3 * region + 2] += arcStarts[arc + 1] - arcStarts[arc] - 1;
		}
	}
	return coverage.keys.map((_, r) => sums.subarray(3 * r, 3 * r + 3).join(' '));
}

/** Two sums over the segments of a line; both ways along a segment give the same. */
function sumSegments(points: Float64Array, first: number, last: number, sum: Int32Array): void {
	let [one, other] = [0, 0];
	let [oneBefore, otherBefore] = [0, 0];
	for (let i = first; i <= last; i++) {
		const x = Math.round(points[2 * i] * 1e8);
		const east = x - turn * Math.floor(x / turn);
		const north = Math.round(points[2 * i + 1] * 1e8) + 90e8;
		const [eastHigh, northHigh] = [Math.floor(east / low), Math.floor(north / low)];
		const lows = ((east - eastHigh * low) << 16) ^ (north - northHigh * low);
		const highs = Math.imul(eastHigh, 0x9e3779b1) + Math.imul(northHigh, 0x85ebca77);
		const oneHere = mixed(mixed(lows) + highs);
		const otherHere = mixed(mixed(lows ^ 0x5bd1e995) ^ Math.imul(highs, 0x27d4eb2f));
		if (i > first) {
			one = (one + ofSegment(oneBefore, oneHere)) | 0;
			other = (other + ofSegment(otherBefore, otherHere)) | 0;
		}
		oneBefore = oneHere;
		otherBefore = otherHere;
	}
	sum[0] = one;
	sum[1] = other;
}

/** Points are taken on a grid of a millimetre, whole turns of longitude left out, each as two codes. */
const turn = 360e8;
const low = 65536;

const ofSegment = (a: number, b: number) => mixed((a + b) ^ Math.imul(a | 1, b | 1));

/** Spreads 32 bits; the finalizer of MurmurHash3 (Appleby, public domain). */
function mixed(value: number): number {
	let v = value ^ (value >>> 16);
	v = Math.imul(v, 0x85ebca6b);
	v ^= v >>> 13;
	v = Math.imul(v, 0xc2b2ae35);
	return v ^ (v >>> 16);
}
