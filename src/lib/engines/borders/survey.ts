import type { Coverage } from '../geometry/coverage.ts';
import { ringPoints } from '../geometry/coverage-rings.ts';
import { insidePlace } from '../geometry/inside-place.ts';
import { SegmentBlocks } from '../geometry/segment-blocks.ts';
import type { BorderList } from './border-list.ts';
import { addLines } from './lines.ts';
import { isSameOutline, outlineMetres } from './same-outline.ts';
import { overlapOf, type Overlap } from './overlap.ts';
import { PairTally } from './pair-tally.ts';
import { addSeamLines } from './seam.ts';
import { suspects, type Suspects } from './suspects.ts';
import { addTouches, crowdedPlace, meetings } from './touches.ts';
import { addAcrossWater } from './across-water.ts';

export interface BordersOptions {
	/** pairs up to this far apart with nothing between are borders across water; none unless given */
	acrossWaterKm?: number;
	/** overlaps narrower than this on average are not counted; 0.02 m unless given */
	toleranceMetres?: number;
}

export interface Survey {
	borders: BorderList;
	overlaps: Overlap[];
	/** one place for each region whose own outline crosses itself */
	crossings: Suspects['crossings'];
	/** regions whose own parts may lie on each other */
	doubtful: Suspects['doubtful'];
	/** a place where so many regions meet that their point touches are left out, or null */
	crowded: [number, number] | null;
	/** all pairs across water up to this width are there; null when none were asked for */
	waterKm: number | null;
}

/** The borders of a coverage with the overlaps and crossings that were found on the way. */
export function surveyOf(coverage: Coverage, options: BordersOptions = {}): Survey {
	const tally = new PairTally(coverage.keys.length);
	addLines(coverage, tally);
	const blocks = new SegmentBlocks(coverage);
	const places = meetings(coverage);
	const crowded = crowdedPlace(places);
	if (crowded) {
		const nothing = { overlaps: [], crossings: [], doubtful: new Set<number>(), waterKm: null };
		return { borders: tally.list(), crowded, ...nothing };
	}
	const found = suspects(coverage, blocks, places);
	const overlaps = overlapsAmong(coverage, found, options.toleranceMetres ?? 0.02);
	for (const { a, b, metres, at } of overlaps) tally.add(a, b, 0, metres, at[0], at[1]);
	const atSeam = addSeamLines(coverage, tally);
	addTouches(coverage, places, tally);
	for (const [a, b, at] of atSeam) if (!tally.has(a, b)) tally.add(a, b, 1, 0, ...at);
	const waterKm = options.acrossWaterKm
		? addAcrossWater(coverage, blocks, options.acrossWaterKm, tally)
		: null;
	const { crossings, doubtful } = found;
	return { borders: tally.list(), overlaps, crossings, doubtful, crowded, waterKm };
}

function overlapsAmong(coverage: Coverage, found: Suspects, tolerance: number): Overlap[] {
	const overlaps: Overlap[] = [];
	for (const [a, b] of found.pairs.values()) {
		const overlap = isSameOutline(coverage, a, b)
			? wholeOf(coverage, a, b)
			: overlapOf(coverage, a, b);
		const meanWidth = (overlap.km2 * 1e6) / Math.max(overlap.metres, 1e-9);
		if (meanWidth > tolerance) overlaps.push(overlap);
	}
	return overlaps.sort((p, q) => p.a - q.a || p.b - q.b);
}

/** What two regions with the same outline have in common: everything. */
function wholeOf(coverage: Coverage, a: number, b: number): Overlap {
	const first = coverage.regionParts[a];
	const rings: Float64Array[] = [];
	for (let ring = coverage.partRings[first]; ring < coverage.partRings[first + 1]; ring++) {
		rings.push(ringPoints(coverage, ring));
	}
	return {
		...{ a, b, same: true },
		km2: coverage.areasKm2[a],
		metres: outlineMetres(coverage, a) / 2,
		at: insidePlace(rings),
	};
}
