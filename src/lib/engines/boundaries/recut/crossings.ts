import { SegmentBlocks } from '../../geometry/segment-blocks.ts';
import { sideBy, turnOf } from './exact-side.ts';
import { InsideCount } from './inside-count.ts';
import type { PlaneArcs } from './plane-arcs.ts';

/** Where a line goes over a line of the other drawing. */
export interface Crossing {
	/** first point of the segment of the own line, and share of the way along it */
	point: number;
	share: number;
	/** region of the other drawing that is left, and the one that is entered; -1 for none */
	out: number;
	into: number;
}

const runSegments = 12;

/** A drawing that is asked where lines of another cross it. It stands `step` times (e, e * e) beside that. */
export class Crossed {
	private blocks: SegmentBlocks;

	constructor(
		private arcs: PlaneArcs,
		private step: 1 | -1,
	) {
		const { points, starts, left, right } = arcs;
		this.blocks = new SegmentBlocks({
			arcPoints: points,
			arcStarts: starts,
			arcLeft: left,
			arcRight: right,
		});
	}

	/** All crossings of one arc of the other drawing, in the order of the walk. */
	along(own: PlaneArcs, arc: number): Crossing[] {
		const found: Crossing[] = [];
		const last = own.starts[arc + 1] - 1;
		for (let first = own.starts[arc]; first < last; first += runSegments) {
			this.alongRun(own.points, first, Math.min(first + runSegments, last), found);
		}
		return found.sort((a, b) => a.point - b.point || a.share - b.share);
	}

	/** The regions around a point of the other drawing, by the lines between it and the far east. */
	around(x: number, y: number): InsideCount {
		const inside = new InsideCount();
		const { points: q, left, right } = this.arcs;
		const isAbove = (at: number) => at > y || (at === y && this.step > 0);
		this.blocks.search(x, y, Infinity, y, (arc, j) => {
			const [rx, ry, sx, sy] = [q[2 * j], q[2 * j + 1], q[2 * j + 2], q[2 * j + 3]];
			const rises = isAbove(sy);
			if (isAbove(ry) === rises) return;
			const side = sideBy(turnOf(rx, ry, sx, sy, x, y), sx - rx, sy - ry, -this.step);
			if (side > 0 !== rises) return;
			inside.add(left[arc], rises ? 1 : -1);
			inside.add(right[arc], rises ? -1 : 1);
		});
		return inside;
	}

	private alongRun(p: Float64Array, first: number, end: number, found: Crossing[]): void {
		let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
		for (let i = 2 * first; i <= 2 * end; i += 2) {
			west = Math.min(west, p[i]);
			east = Math.max(east, p[i]);
			south = Math.min(south, p[i + 1]);
			north = Math.max(north, p[i + 1]);
		}
		const q = this.arcs.points;
		this.blocks.search(west, south, east, north, (arc, j) => {
			if (isApart(q, j, west, south, east, north)) return;
			const [w, e] = q[2 * j] < q[2 * j + 2] ? [q[2 * j], q[2 * j + 2]] : [q[2 * j + 2], q[2 * j]];
			const [s, n] =
				q[2 * j + 1] < q[2 * j + 3] ? [q[2 * j + 1], q[2 * j + 3]] : [q[2 * j + 3], q[2 * j + 1]];
			for (let i = first; i < end; i++) {
				if (!isApart(p, i, w, s, e, n)) this.cross(p, i, arc, j, found);
			}
		});
	}

	private cross(p: Float64Array, i: number, arc: number, j: number, found: Crossing[]): void {
		const q = this.arcs.points;
		const [px, py, qx, qy] = [p[2 * i], p[2 * i + 1], p[2 * i + 2], p[2 * i + 3]];
		const [rx, ry, sx, sy] = [q[2 * j], q[2 * j + 1], q[2 * j + 2], q[2 * j + 3]];
		const [dx, dy] = [qx - px, qy - py];
		const [ex, ey] = [sx - rx, sy - ry];
		if ((dx === 0 && dy === 0) || (ex === 0 && ey === 0)) return;
		const rSide = sideBy(turnOf(px, py, qx, qy, rx, ry), dx, dy, this.step);
		if (rSide === sideBy(turnOf(px, py, qx, qy, sx, sy), dx, dy, this.step)) return;
		const before = turnOf(rx, ry, sx, sy, px, py);
		const after = turnOf(rx, ry, sx, sy, qx, qy);
		const side = sideBy(after, ex, ey, -this.step);
		if (side === sideBy(before, ex, ey, -this.step)) return;
		const { left, right } = this.arcs;
		found.push({
			point: i,
			share: before === after ? 0 : before / (before - after),
			out: side > 0 ? right[arc] : left[arc],
			into: side > 0 ? left[arc] : right[arc],
		});
	}
}

/** Whether a segment lies wholly to one side of a box. */
function isApart(
	p: Float64Array,
	i: number,
	west: number,
	south: number,
	east: number,
	north: number,
): boolean {
	const k = 2 * i;
	return (
		(p[k] < west && p[k + 2] < west) ||
		(p[k] > east && p[k + 2] > east) ||
		(p[k + 1] < south && p[k + 3] < south) ||
		(p[k + 1] > north && p[k + 3] > north)
	);
}
