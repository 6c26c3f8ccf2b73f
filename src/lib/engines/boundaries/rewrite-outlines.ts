import { GrowingInts } from '../geometry/growing.ts';
import type { Inserts } from './inserts.ts';
import type { Outlines } from './outlines.ts';

/** Vertices to put into segments, and vertices to take for others. */
export interface Rewrite {
	inserts: Inserts;
	/** the vertex that stands for each vertex */
	standsFor: Int32Array;
}

/** The outlines with segments split and vertices joined; rings left with one corner vanish. */
export function rewriteOutlines(outlines: Outlines, rewrite: Rewrite): Outlines {
	const { ringVertices, ringStarts, ringRegion } = outlines;
	const { inserts, standsFor } = rewrite;
	const written = new GrowingInts(ringVertices.length + 2 * inserts.count + 16);
	let start = 0;
	const push = (v: number) => {
		const w = standsFor[v];
		if (written.length === start || written.items[written.length - 1] !== w) written.push(w);
	};
	const starts: number[] = [];
	const regions: number[] = [];
	for (let ring = 0; ring < ringRegion.length; ring++) {
		start = written.length;
		const end = ringStarts[ring + 1];
		for (let i = ringStarts[ring]; i < end; i++) {
			push(ringVertices[i]);
			inserts.along(ringVertices[i], ringVertices[i + 1 === end ? ringStarts[ring] : i + 1], push);
		}
		while (written.length > start + 1 && isClosed(written, start)) written.length--;
		if (written.length - start < 2) written.length = start;
		else {
			starts.push(start);
			regions.push(ringRegion[ring]);
		}
	}
	starts.push(written.length);
	return {
		...outlines,
		ringVertices: Uint32Array.from(written.taken()),
		ringStarts: Uint32Array.from(starts),
		ringRegion: Uint32Array.from(regions),
	};
}

const isClosed = ({ items, length }: GrowingInts, start: number) =>
	items[length - 1] === items[start];
