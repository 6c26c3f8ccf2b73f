import type { Topology } from 'topojson-specification';
import { Refusal } from '../refusal.ts';

/**
 * How many points each arc has (TopoJSON specification 1.0, 2.1.4: with a transform, each position is the
 * step from the one before). Refuses arcs that are no lists of at least two positions, and steps that add
 * up to no number.
 */
export function arcLengths({ arcs, transform }: Topology): Uint32Array {
	return Uint32Array.from(arcs, (arc: unknown, a) => {
		if (!Array.isArray(arc) || arc.length < 2) throw badArc(a);
		let [x, y] = [0, 0];
		for (const position of arc as unknown[]) {
			if (!Array.isArray(position)) throw badArc(a);
			x = transform ? x + position[0] : position[0];
			y = transform ? y + position[1] : position[1];
			if (!Number.isFinite(x) || !Number.isFinite(y)) throw badArc(a);
		}
		return arc.length;
	});
}

function badArc(arc: number): Refusal {
	return new Refusal('bad-arc', `Arc ${arc} is not a list of at least two positions.`);
}
