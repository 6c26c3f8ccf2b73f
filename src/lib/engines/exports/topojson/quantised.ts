import type { LonLat } from '../../sheet/index.ts';
import type { TopoGeometry } from './topojson.ts';

export interface Quantised {
	bbox: [number, number, number, number];
	transform: { scale: [number, number]; translate: [number, number] };
	/** the first place of an arc in steps, every other as the step from the one before */
	arcs: [number, number][][];
	/** number in the file of each arc that is used, -1 for the others */
	numbers: Int32Array;
}

/** The arcs that geometries use, in whole steps from the corner of the extent. */
export function quantised(
	arcs: readonly LonLat[][],
	geometries: readonly TopoGeometry[],
	steps: number,
): Quantised {
	const numbers = new Int32Array(arcs.length).fill(-1);
	for (const signed of geometries.flatMap(({ arcs: rings }) => rings.flat(2))) {
		numbers[signed < 0 ? ~signed : signed] = 0;
	}
	const used = arcs.filter((_, arc) => numbers[arc] === 0);
	let next = 0;
	numbers.forEach((state, arc) => state === 0 && (numbers[arc] = next++));
	const bbox = boxOf(used);
	const longer = Math.max(bbox[2] - bbox[0], bbox[3] - bbox[1]);
	const step = longer > 0 ? longer / (steps - 1) : 1;
	const [west, south] = bbox;
	return {
		...{ bbox, numbers, transform: { scale: [step, step], translate: [west, south] } },
		arcs: used.map((arc) => steppedArc(arc, west, south, step)),
	};
}

function boxOf(arcs: readonly LonLat[][]): Quantised['bbox'] {
	const box: Quantised['bbox'] = [Infinity, Infinity, -Infinity, -Infinity];
	for (const arc of arcs) {
		for (const [lon, lat] of arc) {
			box[0] = Math.min(box[0], lon);
			box[1] = Math.min(box[1], lat);
			box[2] = Math.max(box[2], lon);
			box[3] = Math.max(box[3], lat);
		}
	}
	return box[0] <= box[2] ? box : [0, 0, 0, 0];
}

/** Places that fall into one step are one; an arc keeps at least two. */
function steppedArc(arc: LonLat[], west: number, south: number, step: number): [number, number][] {
	const stepped: [number, number][] = [];
	let [x, y] = [0, 0];
	arc.forEach(([lon, lat], i) => {
		const [nextX, nextY] = [Math.round((lon - west) / step), Math.round((lat - south) / step)];
		const last = i === arc.length - 1 && stepped.length < 2;
		if (i === 0 || nextX !== x || nextY !== y || last) stepped.push([nextX - x, nextY - y]);
		[x, y] = [nextX, nextY];
	});
	return stepped;
}
