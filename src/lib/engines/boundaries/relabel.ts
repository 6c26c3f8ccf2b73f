import type { Noded } from './node-outlines.ts';
import type { Outlines } from './outlines.ts';

/** Features are matched before they are named; here they become regions, and those without one go. */
export function relabel(noded: Noded, regionOf: Int32Array, regions: number): Noded {
	const { outlines, segments, joined, room } = noded;
	for (const side of [segments.left, segments.right]) {
		for (let s = 0; s < segments.count; s++) if (side[s] >= 0) side[s] = regionOf[side[s]];
	}
	const named = new Set([...joined.regions].map((f) => regionOf[f]).filter((r) => r >= 0));
	return {
		outlines: ringsOfRegions(outlines, regionOf, regions),
		segments,
		joined: { ...joined, regions: named },
		room,
	};
}

function ringsOfRegions(outlines: Outlines, regionOf: Int32Array, regions: number): Outlines {
	const { ringRegion, ...rest } = ringsOf(
		outlines,
		Array.from(regionOf, (region) => region >= 0),
	);
	return { ...rest, regions, ringRegion: ringRegion.map((feature) => regionOf[feature]) };
}

/** The outlines of the features that are kept; the same arrays when all are. */
export function ringsOf(outlines: Outlines, kept: boolean[]): Outlines {
	const { ringVertices, ringStarts, ringRegion } = outlines;
	if (ringRegion.every((feature) => kept[feature])) return outlines;
	const vertices = new Uint32Array(ringVertices.length);
	const starts = new Uint32Array(ringStarts.length);
	const owners = new Uint32Array(ringRegion.length);
	let used = 0;
	let rings = 0;
	for (let ring = 0; ring < ringRegion.length; ring++) {
		if (!kept[ringRegion[ring]]) continue;
		const run = ringVertices.subarray(ringStarts[ring], ringStarts[ring + 1]);
		vertices.set(run, used);
		starts[rings] = used;
		owners[rings++] = ringRegion[ring];
		used += run.length;
	}
	starts[rings] = used;
	return {
		...outlines,
		ringVertices: vertices.subarray(0, used),
		ringStarts: starts.subarray(0, rings + 1),
		ringRegion: owners.subarray(0, rings),
	};
}
