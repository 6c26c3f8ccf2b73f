import type { PlaneArcs } from './project-arcs.ts';
import type { Fit } from './fit.ts';

export interface SheetArcs {
	arcPoints: Int32Array;
	arcStarts: Uint32Array;
}

/** Points nearer than this to the one kept before are dropped: below the dot of a 600 dpi press. */
const closest = 3;

/**
 * Arcs in whole hundredths of a millimetre, once for all painters, so that both sides of a border use
 * the very same points. Ends always stay; an arc that shrinks to nothing keeps one point and is
 * skipped by fills and lines alike. A closed arc keeps at least two inner points or is dropped.
 */
export function quantise({ points, starts }: PlaneArcs, { scale, dx, dy }: Fit): SheetArcs {
	const arcPoints = new Int32Array(points.length);
	const arcStarts = new Uint32Array(starts.length);
	let end = 0;
	for (let arc = 0; arc + 1 < starts.length; arc++) {
		arcStarts[arc] = end;
		for (let point = starts[arc]; point < starts[arc + 1]; point++) {
			const x = Math.round(points[2 * point] * scale + dx);
			const y = Math.round(points[2 * point + 1] * scale + dy);
			if (end > arcStarts[arc]) {
				const apart = Math.hypot(x - arcPoints[2 * end - 2], y - arcPoints[2 * end - 1]);
				const last = point === starts[arc + 1] - 1;
				if (apart === 0 || (apart < closest && !last)) continue;
			}
			arcPoints[2 * end] = x;
			arcPoints[2 * end + 1] = y;
			end++;
		}
		end = withoutSpike(arcPoints, arcStarts[arc], end);
	}
	arcStarts[starts.length - 1] = end;
	return { arcPoints: arcPoints.slice(0, 2 * end), arcStarts };
}

/** An arc that returns to its start after a single point encloses nothing: only its start stays. */
function withoutSpike(arcPoints: Int32Array, start: number, end: number): number {
	const closed =
		arcPoints[2 * start] === arcPoints[2 * end - 2] &&
		arcPoints[2 * start + 1] === arcPoints[2 * end - 1];
	return closed && end - start <= 3 ? start + 1 : end;
}
