import { crossing } from '../../geometry/crossing.ts';
import { SegmentBlocks } from '../../geometry/segment-blocks.ts';
import type { Part } from './parts.ts';

/** Whether the outlines of parts cross each other and themselves in more places than given. */
export function crossesTooOften(parts: Part[], most: number): boolean {
	const rings = parts.flat();
	const arcStarts = new Uint32Array(rings.length + 1);
	rings.forEach((ring, i) => (arcStarts[i + 1] = arcStarts[i] + ring.length / 2 + 1));
	const arcPoints = new Float64Array(2 * arcStarts[rings.length]);
	rings.forEach((ring, i) => {
		arcPoints.set(ring, 2 * arcStarts[i]);
		arcPoints.set(ring.subarray(0, 2), 2 * arcStarts[i + 1] - 2);
	});
	const arcLeft = new Int32Array(rings.length);
	const arcRight = new Int32Array(rings.length).fill(-1);
	const blocks = new SegmentBlocks({ arcPoints, arcStarts, arcLeft, arcRight });
	let places = 0;
	let pairs = 0;
	blocks.eachPair(
		() => places <= most && pairs <= mostPairs,
		(_, i, __, j) => {
			if (places > most || ++pairs > mostPairs) return;
			if (crossing(arcPoints, i, arcPoints, j)) places++;
		},
	);
	return places > most || pairs > mostPairs;
}

/** Pairs of edges with boxes that meet; more than this and the outlines are a knot. */
const mostPairs = 20_000_000;
