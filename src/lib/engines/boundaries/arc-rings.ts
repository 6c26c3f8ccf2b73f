import type { Arcs } from './arcs.ts';

/** Rings of one region: arcs in walking order (i forward, ~i backward), each ring simple. */
export type ArcRing = number[];

/** Arcs of each region in compressed rows: those with the region on the left forward, on the right backward. */
export function arcsByRegion(
	arcs: Arcs,
	regions: number,
): { offsets: Uint32Array; list: Int32Array } {
	const offsets = new Uint32Array(regions + 1);
	const count = arcs.left.length;
	for (let a = 0; a < count; a++) {
		if (arcs.left[a] >= 0) offsets[arcs.left[a] + 1]++;
		if (arcs.right[a] >= 0) offsets[arcs.right[a] + 1]++;
	}
	for (let r = 0; r < regions; r++) offsets[r + 1] += offsets[r];
	const list = new Int32Array(offsets[regions]);
	const fill = offsets.slice(0, regions);
	for (let a = 0; a < count; a++) {
		if (arcs.left[a] >= 0) list[fill[arcs.left[a]]++] = a;
		if (arcs.right[a] >= 0) list[fill[arcs.right[a]]++] = ~a;
	}
	return { offsets, list };
}

/**
 * Traces the rings of a region from its arcs. Where several of them leave a vertex, the walk takes the
 * first clockwise from where it came, which keeps to one face; a walk that comes back to a vertex of its
 * own is cut there, so every ring is simple and rings may touch in points only.
 */
export function traceRings(halves: Int32Array, arcs: Arcs): ArcRing[] {
	if (halves.length === 1) return closes(arcs, halves[0]) ? [[halves[0]]] : [];
	const walker = new RingWalker(halves, arcs);
	const rings: ArcRing[] = [];
	for (let i = 0; i < halves.length; i++) walker.from(i, rings);
	return rings;
}

class RingWalker {
	private leaving = new Map<number, number[]>();
	private used: Uint8Array;

	constructor(
		private halves: Int32Array,
		private arcs: Arcs,
	) {
		this.used = new Uint8Array(halves.length);
		for (let i = 0; i < halves.length; i++) {
			const v = this.startOf(halves[i]);
			const known = this.leaving.get(v);
			if (known) known.push(i);
			else this.leaving.set(v, [i]);
		}
	}

	from(first: number, rings: ArcRing[]): void {
		if (this.used[first]) return;
		const path: number[] = [];
		const placeOf = new Map<number, number>();
		let i = first;
		for (;;) {
			this.used[i] = 1;
			const half = this.halves[i];
			placeOf.set(this.startOf(half), path.length);
			path.push(half);
			const v = this.endOf(half);
			const loop = placeOf.get(v);
			if (loop !== undefined) {
				const ring = path.splice(loop);
				for (const h of ring) placeOf.delete(this.startOf(h));
				rings.push(ring);
				if (path.length === 0) return;
			}
			i = this.nextAt(v, half);
			if (i < 0) return;
		}
	}

	private nextAt(v: number, from: number): number {
		const free = (this.leaving.get(v) ?? []).filter((i) => !this.used[i]);
		if (free.length < 2) return free[0] ?? -1;
		const back = this.angleOf(~from);
		let best = -1;
		let bestTurn = Infinity;
		for (const i of free) {
			let turn = back - this.angleOf(this.halves[i]);
			if (turn <= 0) turn += 2 * Math.PI;
			if (turn < bestTurn) {
				bestTurn = turn;
				best = i;
			}
		}
		return best;
	}

	private startOf(half: number): number {
		const { ends } = this.arcs;
		return half >= 0 ? ends[2 * half] : ends[2 * ~half + 1];
	}
	private endOf(half: number): number {
		return this.startOf(~half);
	}
	/** The direction in which a half leaves its start. */
	private angleOf(half: number): number {
		const { points: p, starts } = this.arcs;
		const from = half >= 0 ? 2 * starts[half] : 2 * starts[~half + 1] - 2;
		const to = half >= 0 ? from + 2 : from - 2;
		return Math.atan2(p[to + 1] - p[from + 1], p[to] - p[from]);
	}
}

function closes({ ends }: Arcs, half: number): boolean {
	const arc = half >= 0 ? half : ~half;
	return ends[2 * arc] === ends[2 * arc + 1];
}
