import type { Crossed } from './crossings.ts';
import { InsideCount } from './inside-count.ts';
import { sweptUnits, type PlaneArcs } from './plane-arcs.ts';

/** Told of a piece of an arc: the swept area of the piece and the regions of the other drawing around it. */
export type OnPiece = (arc: number, swept: number, inside: InsideCount) => void;

/**
 * Walks every arc of a drawing over another and tells, piece by piece, within which regions of the other
 * it runs. Where arcs meet, what is known at the end of one holds at the start of the next, so that a
 * place has to be looked up once for each connected drawing only.
 */
export function walkDrawing(own: PlaneArcs, other: Crossed, onPiece: OnPiece): void {
	const ends = endsOf(own);
	const known = new Map<number, InsideCount>();
	const done = new Uint8Array(own.left.length);
	for (let first = 0; first < own.left.length; first++) {
		if (done[first]) continue;
		const point = 2 * own.starts[first];
		const start = ends.first[first];
		if (!known.has(start)) known.set(start, other.around(own.points[point], own.points[point + 1]));
		const open = [start];
		for (let vertex = open.pop(); vertex !== undefined; vertex = open.pop()) {
			for (const arc of ends.at[vertex]) {
				if (done[arc]) continue;
				done[arc] = 1;
				const isForward = ends.first[arc] === vertex;
				const far = isForward ? ends.last[arc] : ends.first[arc];
				const inside = walkArc(own, arc, other, known.get(vertex)!, isForward, onPiece);
				if (!known.has(far)) known.set(far, inside);
				open.push(far);
			}
		}
	}
}

/** What lies around the far end of an arc, from what lies around the near one. */
function walkArc(
	own: PlaneArcs,
	arc: number,
	other: Crossed,
	near: InsideCount,
	isForward: boolean,
	onPiece: OnPiece,
): InsideCount {
	const crossings = other.along(own, arc);
	const change = new InsideCount();
	for (const { out, into } of crossings) {
		change.add(out, -1);
		change.add(into, 1);
	}
	const far = near.with(change, isForward ? 1 : -1);
	const inside = (isForward ? near : far).with(new InsideCount(), 1);
	const line = new LineWalk(own.points, own.starts[arc]);
	for (const { point, share, out, into } of crossings) {
		const swept = line.to(point, share);
		if (inside.regions.length > 0) onPiece(arc, swept, inside);
		inside.add(out, -1);
		inside.add(into, 1);
	}
	const swept = line.to(own.starts[arc + 1] - 1, 0);
	if (inside.regions.length > 0) onPiece(arc, swept, inside);
	return far;
}

/** Goes along a line of points and tells what was swept since the last stop. */
class LineWalk {
	private x: number;
	private y: number;

	constructor(
		private points: Float64Array,
		private point: number,
	) {
		this.x = points[2 * point];
		this.y = points[2 * point + 1];
	}

	to(point: number, share: number): number {
		const p = this.points;
		let swept = 0;
		while (this.point < point) {
			this.point++;
			swept += this.step(p[2 * this.point], p[2 * this.point + 1]);
		}
		if (share === 0) return swept;
		const [x, y] = [p[2 * point], p[2 * point + 1]];
		return (
			swept + this.step(x + share * (p[2 * point + 2] - x), y + share * (p[2 * point + 3] - y))
		);
	}

	private step(x: number, y: number): number {
		const swept = sweptUnits(this.x, this.y, x, y);
		this.x = x;
		this.y = y;
		return swept;
	}
}

/** Arc ends as numbered vertices, and the arcs that end at each (a closed arc twice). */
function endsOf({ points, starts, left }: PlaneArcs) {
	const numbers = new Map<string, number>();
	const at: number[][] = [];
	const vertex = (point: number, arc: number) => {
		const place = `${points[2 * point]} ${points[2 * point + 1]}`;
		let number = numbers.get(place);
		if (number === undefined) {
			numbers.set(place, (number = at.length));
			at.push([]);
		}
		at[number].push(arc);
		return number;
	};
	const first = new Int32Array(left.length);
	const last = new Int32Array(left.length);
	for (let arc = 0; arc < left.length; arc++) {
		first[arc] = vertex(starts[arc], arc);
		last[arc] = vertex(starts[arc + 1] - 1, arc);
	}
	return { first, last, at };
}
