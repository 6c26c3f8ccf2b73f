import { ringPoints } from '../geometry/coverage-rings.ts';
import { doubleArea } from '../geometry/rings.ts';
import { thinLine } from '../geometry/thin-line.ts';
import type { Coverage } from './coverage.ts';

/**
 * A coverage with fewer points for display: each arc thinned once, so borders stay shared and regions
 * keep their neighbours. `metres`: detail smaller than a triangle of this many metres squared goes.
 * Guarantees: the invariants of a coverage hold; a ring that would turn over or close up keeps its full
 * arcs; closed arcs keep two inner points. Areas, lengths and enclaves stay those of the full geometry.
 * Not guaranteed: that thinned arcs never cross.
 */
export function simplifyCoverage(coverage: Coverage, metres: number): Coverage {
	if (!(metres > 0)) return coverage;
	const full = new Uint8Array(coverage.arcLeft.length);
	const least = leastInner(coverage);
	for (;;) {
		const thinned = withArcs(coverage, (arc, from, to) =>
			full[arc] ? null : thinLine(coverage.arcPoints, from, to, metres, least[arc]),
		);
		if (restoreTurned(thinned, full) === 0) return thinned;
	}
}

/** Inner points each arc must keep: two when it closes by itself, one when two arcs make a ring. */
function leastInner(coverage: Coverage): Uint8Array {
	const { ringArcs, ringStarts } = coverage;
	const least = new Uint8Array(coverage.arcLeft.length);
	for (let ring = 0; ring + 1 < ringStarts.length; ring++) {
		const arcs = ringStarts[ring + 1] - ringStarts[ring];
		if (arcs > 2) continue;
		for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
			const arc = ringArcs[i] >= 0 ? ringArcs[i] : ~ringArcs[i];
			least[arc] = Math.max(least[arc], arcs === 1 ? 2 : 1);
		}
	}
	return least;
}

function withArcs(
	coverage: Coverage,
	keep: (arc: number, from: number, to: number) => number[] | null,
): Coverage {
	const { arcPoints, arcStarts } = coverage;
	const points = new Float64Array(arcPoints.length);
	const starts = new Uint32Array(arcStarts.length);
	let used = 0;
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		starts[arc] = used / 2;
		const [from, to] = [arcStarts[arc], arcStarts[arc + 1] - 1];
		const kept = keep(arc, from, to);
		if (kept) {
			for (const i of kept) {
				points[used++] = arcPoints[2 * i];
				points[used++] = arcPoints[2 * i + 1];
			}
		} else {
			points.set(arcPoints.subarray(2 * from, 2 * to + 2), used);
			used += 2 * (to - from + 1);
		}
	}
	starts[starts.length - 1] = used / 2;
	return { ...coverage, arcPoints: points.slice(0, used), arcStarts: starts };
}

/** Marks the arcs of rings that no longer turn the right way; answers how many were not marked before. */
function restoreTurned(thinned: Coverage, full: Uint8Array): number {
	let restored = 0;
	for (let part = 0; part + 1 < thinned.partRings.length; part++) {
		for (let ring = thinned.partRings[part]; ring < thinned.partRings[part + 1]; ring++) {
			const points = ringPoints(thinned, ring);
			const area = doubleArea(points, 0, points.length / 2);
			if (ring === thinned.partRings[part] ? area > 0 : area < 0) continue;
			for (let i = thinned.ringStarts[ring]; i < thinned.ringStarts[ring + 1]; i++) {
				const arc = thinned.ringArcs[i] >= 0 ? thinned.ringArcs[i] : ~thinned.ringArcs[i];
				restored += 1 - full[arc];
				full[arc] = 1;
			}
		}
	}
	return restored;
}
