import type { Coverage } from '../geometry/coverage.ts';
import { karneyMetres, metresPerDegree } from '../geometry/ellipsoid.ts';
import { nearestOnSegment } from '../geometry/near.ts';
import { crossing } from '../geometry/crossing.ts';
import type { SegmentBlocks } from '../geometry/segment-blocks.ts';
import type { PairTally } from './pair-tally.ts';

/** Nearer than this to a corner is touching it, in metres. */
const touching = 0.02;

interface Gap {
	a: number;
	b: number;
	metres: number;
	from: [number, number];
	to: [number, number];
}

/**
 * Pairs without a line or a point whose nearest places lie within `km` and whose shortest connection
 * crosses no third region. The nearest places of two outlines always include a corner of one of them, so
 * every corner of an unmatched line is measured against the unmatched segments around it.
 */
export function addAcrossWater(
	coverage: Coverage,
	blocks: SegmentBlocks,
	km: number,
	tally: PairTally,
): void {
	const gaps = nearestGaps(coverage, blocks, km * 1000, tally);
	for (const gap of gaps.values()) {
		if (isCrossed(gap, coverage, blocks)) continue;
		const metres = karneyMetres(...gap.from, ...gap.to);
		if (metres > km * 1000) continue;
		const x = (gap.from[0] + gap.to[0]) / 2;
		const y = (gap.from[1] + gap.to[1]) / 2;
		tally.add(gap.a, gap.b, 2, metres, x, y);
	}
}

function nearestGaps(
	coverage: Coverage,
	blocks: SegmentBlocks,
	most: number,
	tally: PairTally,
): Map<number, Gap> {
	const { arcLeft, arcRight, arcStarts, arcPoints: p } = coverage;
	const gaps = new Map<number, Gap>();
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (arcLeft[arc] >= 0 && arcRight[arc] >= 0) continue;
		const mine = Math.max(arcLeft[arc], arcRight[arc]);
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++) {
			const x = p[2 * i];
			const y = p[2 * i + 1];
			const { east, north } = metresPerDegree(y);
			const [dx, dy] = [most / east, most / north];
			blocks.search(x - dx, y - dy, x + dx, y + dy, (other, j) => {
				if (arcLeft[other] >= 0 && arcRight[other] >= 0) return;
				const theirs = Math.max(arcLeft[other], arcRight[other]);
				if (theirs === mine || tally.has(mine, theirs)) return;
				measure(gaps, coverage, mine, theirs, i, j, most);
			});
		}
	}
	return gaps;
}

function measure(
	gaps: Map<number, Gap>,
	coverage: Coverage,
	mine: number,
	theirs: number,
	i: number,
	j: number,
	most: number,
): void {
	const p = coverage.arcPoints;
	const [ux, uy, vx, vy] = [p[2 * j], p[2 * j + 1], p[2 * j + 2], p[2 * j + 3]];
	const { share, metres } = nearestOnSegment(p[2 * i], p[2 * i + 1], ux, uy, vx, vy);
	if (metres > most * 1.01) return;
	const [a, b] = mine < theirs ? [mine, theirs] : [theirs, mine];
	const code = a * coverage.keys.length + b;
	const best = gaps.get(code);
	if (best && best.metres <= metres) return;
	const from: [number, number] = [p[2 * i], p[2 * i + 1]];
	gaps.set(code, { a, b, metres, from, to: [ux + share * (vx - ux), uy + share * (vy - uy)] });
}

/** The straight connection must not pass through another region, nor along its outline. */
function isCrossed(gap: Gap, coverage: Coverage, blocks: SegmentBlocks): boolean {
	const { arcLeft, arcRight, arcPoints } = coverage;
	const line = Float64Array.of(...gap.from, ...gap.to);
	const [x1, y1, x2, y2] = line;
	const isThird = (region: number) => region >= 0 && region !== gap.a && region !== gap.b;
	let crossed = blocks.regionsAt((x1 + x2) / 2, (y1 + y2) / 2).some(isThird);
	const box = [Math.min(x1, x2), Math.min(y1, y2), Math.max(x1, x2), Math.max(y1, y2)] as const;
	blocks.search(...box, (arc, j) => {
		if (crossed || !(isThird(arcLeft[arc]) || isThird(arcRight[arc]))) return;
		const corner = nearestOnSegment(arcPoints[2 * j], arcPoints[2 * j + 1], x1, y1, x2, y2);
		if (corner.metres < touching || crossing(line, 0, arcPoints, j)) crossed = true;
	});
	return crossed;
}
