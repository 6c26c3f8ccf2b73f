import { sweptKm2 } from '../geometry/areas.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { lineMetres } from '../geometry/ellipsoid.ts';
import { GrowingInts } from '../geometry/growing.ts';
import type { Room } from '../geometry/room.ts';
import { arcsByRegion, traceRings } from './arc-rings.ts';
import { chainArcs, type Arcs } from './arcs.ts';
import { enclaves } from './enclaves.ts';
import type { Outlines } from './outlines.ts';
import { groupParts } from './parts.ts';
import type { Segments } from './segments.ts';
import { TracedRing } from './traced-ring.ts';

/** Cuts noded outlines into shared arcs and puts the regions together from them again; both are answered. */
export function buildCoverage(
	{ outlines, segments, room }: { outlines: Outlines; segments: Segments; room?: Room },
	keys: string[],
	names: string[],
): { coverage: Coverage; arcs: Arcs } {
	const arcs = chainArcs(outlines, segments, room);
	const arcPoints = arcs.points;
	const arcStarts = Uint32Array.from(arcs.starts);
	const rings = assembleRings(arcs, outlines.regions);
	const cut = {
		keys,
		names,
		arcPoints,
		arcStarts,
		arcLeft: arcs.left.slice(),
		arcRight: arcs.right.slice(),
		arcMetres: metresOf(arcPoints, arcStarts),
		...rings,
	};
	return { coverage: { ...cut, areasKm2: areasOf(cut), enclaveOf: enclaves(cut) }, arcs };
}

function metresOf(points: Float64Array, starts: Uint32Array): Float64Array {
	const metres = new Float64Array(starts.length - 1);
	for (let a = 0; a < metres.length; a++) {
		metres[a] = lineMetres(points, starts[a], starts[a + 1] - 1);
	}
	return metres;
}

function assembleRings(arcs: Arcs, regions: number) {
	const byRegion = arcsByRegion(arcs, regions);
	const ringArcs = new GrowingInts();
	const ringStarts = new GrowingInts();
	const partRings = new GrowingInts();
	const regionParts = new GrowingInts();
	for (let r = 0; r < regions; r++) {
		regionParts.push(partRings.length);
		const halves = byRegion.list.subarray(byRegion.offsets[r], byRegion.offsets[r + 1]);
		const traced = traceRings(halves, arcs).map((ring) => new TracedRing(ring, arcs));
		for (const part of groupParts(traced)) {
			partRings.push(ringStarts.length);
			for (const ring of part) {
				ringStarts.push(ringArcs.length);
				for (const half of ring.arcs) ringArcs.push(half);
			}
		}
	}
	regionParts.push(partRings.length);
	partRings.push(ringStarts.length);
	ringStarts.push(ringArcs.length);
	return {
		ringArcs: ringArcs.taken().slice(),
		ringStarts: Uint32Array.from(ringStarts.taken()),
		partRings: Uint32Array.from(partRings.taken()),
		regionParts: Uint32Array.from(regionParts.taken()),
	};
}

/** One pass over the arcs: what lies between an arc and the equator is added on its left, taken on its right. */
function areasOf(cut: Omit<Coverage, 'areasKm2' | 'enclaveOf'>): Float64Array {
	const areas = new Float64Array(cut.keys.length);
	for (let a = 0; a < cut.arcLeft.length; a++) {
		const swept = sweptKm2(cut.arcPoints, cut.arcStarts[a], cut.arcStarts[a + 1] - 1);
		if (cut.arcLeft[a] >= 0) areas[cut.arcLeft[a]] += swept;
		if (cut.arcRight[a] >= 0) areas[cut.arcRight[a]] -= swept;
	}
	return areas;
}
