import type { Topology } from 'topojson-specification';
import { Refusal } from '../refusal.ts';

/** Where each arc of a topology begins and ends, in its own steps where it is quantised. */
export interface ArcEnds {
	count: number;
	/** of each arc */
	points: Uint32Array;
	/** whether the second half-arc (`~i` is arc i backwards) begins where the first ends */
	meet(arc: number, next: number): boolean;
}

/**
 * The ends of all arcs (TopoJSON specification 1.0, 2.1.4: with a transform, each position is the step
 * from the one before). Refuses arcs that are no lists of at least two positions, and steps that add up
 * to no number.
 */
export function arcEnds({ arcs, transform }: Topology): ArcEnds {
	const points = new Uint32Array(arcs.length);
	const ends = new Float64Array(4 * arcs.length);
	arcs.forEach((arc: unknown, a) => {
		if (!Array.isArray(arc) || arc.length < 2) throw badArc(a);
		points[a] = arc.length;
		let [x, y] = [0, 0];
		arc.forEach((position: unknown, i) => {
			if (!Array.isArray(position)) throw badArc(a);
			x = transform ? x + position[0] : position[0];
			y = transform ? y + position[1] : position[1];
			if (!Number.isFinite(x) || !Number.isFinite(y)) throw badArc(a);
			if (i === 0) ends.set([x, y], 4 * a);
		});
		ends.set([x, y], 4 * a + 2);
	});
	const end = (half: number, last: boolean) =>
		half < 0 ? 4 * ~half + (last ? 0 : 2) : 4 * half + (last ? 2 : 0);
	return {
		count: arcs.length,
		points,
		meet(arc, next) {
			const p = end(arc, true);
			const q = end(next, false);
			return ends[p] === ends[q] && ends[p + 1] === ends[q + 1];
		},
	};
}

function badArc(arc: number): Refusal {
	return new Refusal('bad-arc', `Arc ${arc} is not a list of at least two positions.`);
}
