import type { Outlines } from './outlines.ts';

/** Vertices to put into segments, and vertices to take for others. */
export interface Rewrite {
	/** for a segment low-high (by `segmentCode`), vertices along it with their share of the way */
	inserts: Map<number, { share: number; vertex: number }[]>;
	/** the vertex that stands for each vertex */
	standsFor: Int32Array;
}

export const segmentCode = (low: number, high: number) => low * 2 ** 32 + high;

/** The outlines with segments split and vertices joined; rings left with one corner vanish. */
export function rewriteOutlines(outlines: Outlines, rewrite: Rewrite): Outlines {
	const { ringVertices, ringStarts, ringRegion } = outlines;
	const { inserts, standsFor } = rewrite;
	const isLow = new Uint8Array(outlines.vertices);
	let added = 0;
	for (const [code, list] of inserts) {
		isLow[Math.floor(code / 2 ** 32)] = 1;
		list.sort((a, b) => a.share - b.share || a.vertex - b.vertex);
		added += list.length;
	}
	const vertices: number[] | Uint32Array = new Uint32Array(ringVertices.length + 4 * added + 16);
	let used = 0;
	let start = 0;
	const push = (v: number) => {
		const w = standsFor[v];
		if (used === start || vertices[used - 1] !== w) vertices[used++] = w;
	};
	const starts: number[] = [];
	const regions: number[] = [];
	for (let ring = 0; ring < ringRegion.length; ring++) {
		start = used;
		const end = ringStarts[ring + 1];
		for (let i = ringStarts[ring]; i < end; i++) {
			const from = ringVertices[i];
			const to = ringVertices[i + 1 === end ? ringStarts[ring] : i + 1];
			push(from);
			const forward = from < to;
			if (!isLow[forward ? from : to]) continue;
			const along = inserts.get(forward ? segmentCode(from, to) : segmentCode(to, from));
			if (!along) continue;
			if (forward) for (const { vertex } of along) push(vertex);
			else for (let k = along.length - 1; k >= 0; k--) push(along[k].vertex);
		}
		while (used > start + 1 && vertices[used - 1] === vertices[start]) used--;
		if (used - start < 2) used = start;
		else {
			starts.push(start);
			regions.push(ringRegion[ring]);
		}
	}
	starts.push(used);
	return {
		...outlines,
		ringVertices: vertices.subarray(0, used),
		ringStarts: Uint32Array.from(starts),
		ringRegion: Uint32Array.from(regions),
	};
}
