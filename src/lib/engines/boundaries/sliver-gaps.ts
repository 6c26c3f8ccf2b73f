import { nearestOnSegment } from '../geometry/near.ts';
import type { Hole } from './holes.ts';
import type { ParallelGap } from './parallel-gaps.ts';

/** A hole with more corners than this is not measured corner by corner. */
const mostCorners = 2000;

/** The slivers up to `most` metres wide, each as a gap between the two regions with most of its outline. */
export function sliverGaps(holes: Hole[], most: number): ParallelGap[] {
	const gaps: ParallelGap[] = [];
	for (const hole of holes) {
		if (hole.meanMetres >= most) continue;
		const width = widthOf(hole);
		if (width > most) continue;
		const order = hole.regions.map((_, i) => i).sort((p, q) => hole.shares[q] - hole.shares[p]);
		const [a, b] = [hole.regions[order[0]], hole.regions[order[1]]].sort((p, q) => p - q);
		gaps.push({ a, b, width, at: hole.at });
	}
	return gaps;
}

/** The farthest that a corner of the outline lies from another region's line, in metres. */
function widthOf({ rings: [ring], owners, meanMetres }: Hole): number {
	const count = owners.length;
	if (count > mostCorners) return 2 * meanMetres;
	let widest = 0;
	for (let i = 0; i < count; i++) {
		const mine = [owners[i], owners[(i + count - 1) % count]];
		let nearest = Infinity;
		for (let j = 0; j < count; j++) {
			if (mine.includes(owners[j])) continue;
			const k = (j + 1) % count;
			const place = nearestOnSegment(
				...([ring[2 * i], ring[2 * i + 1]] as const),
				...([ring[2 * j], ring[2 * j + 1]] as const),
				...([ring[2 * k], ring[2 * k + 1]] as const),
			);
			nearest = Math.min(nearest, place.metres);
		}
		if (Number.isFinite(nearest)) widest = Math.max(widest, nearest);
	}
	return widest;
}
