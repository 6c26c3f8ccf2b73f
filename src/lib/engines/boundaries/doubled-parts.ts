import type { SelfCrossing } from '../borders/suspects.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { ringsOfPart } from './coverage-parts.ts';
import { insidePlace } from '../geometry/inside-place.ts';
import { isInPart } from './mends/parts.ts';
import type { Segments } from './segments.ts';

/** More parts than this are not looked up against each other. */
const mostParts = 2000;

/**
 * Regions that cover land twice with parts of their own: two of their lines lie on each other with the
 * region on the same side, or a part of a `doubtful` region lies in another of its parts.
 */
export function doubledParts(
	coverage: Coverage,
	segments: Segments,
	doubtful: Iterable<number>,
): SelfCrossing[] {
	const found = new Map<number, [number, number]>();
	for (const region of doubledLines(segments)) {
		found.set(region, partInAnother(coverage, region) ?? firstPlace(coverage, region));
	}
	for (const region of doubtful) {
		const at = found.has(region) ? null : partInAnother(coverage, region);
		if (at) found.set(region, at);
	}
	return [...found].map(([region, at]) => ({ region, at, doubled: true }));
}

function doubledLines({ twins, low, high, left, right, count }: Segments): Set<number> {
	const doubled = new Set<number>();
	if (twins.length === 0) return doubled;
	const code = (s: number) => low[s] * 2 ** 32 + high[s];
	const sides = new Map<number, Set<number>>(twins.map((s) => [code(s), new Set()]));
	for (let s = 0; s < count; s++) {
		const seen = sides.get(code(s));
		if (!seen) continue;
		// regions on the right are noted as the numbers below -1
		for (const side of [left[s], -2 - right[s]]) {
			if (side === -1) continue;
			if (seen.has(side)) doubled.add(side >= 0 ? side : -2 - side);
			seen.add(side);
		}
	}
	return doubled;
}

function partInAnother(coverage: Coverage, region: number): [number, number] | null {
	const [from, to] = [coverage.regionParts[region], coverage.regionParts[region + 1]];
	if (to - from > mostParts) return null;
	const parts = Array.from({ length: to - from }, (_, i) => ringsOfPart(coverage, from + i));
	for (const [i, part] of parts.entries()) {
		const at = insidePlace(part);
		if (parts.some((other, j) => j !== i && isInPart(other, at))) return at;
	}
	return null;
}

const firstPlace = (coverage: Coverage, region: number) =>
	insidePlace(ringsOfPart(coverage, coverage.regionParts[region]));
