import { metresPerDegree } from './ellipsoid.ts';

/**
 * How much every point of a line matters: the side, in metres, of a square as large as the smallest
 * triangle it spanned when it was next to go (Visvalingam and Whyatt, "Line generalisation by repeated
 * elimination of points", Cartographic Journal 30, 1993). A point never weighs less than one that went
 * before it, so the points above a weight are those that eliminating up to it would leave.
 *
 * One instance serves many lines and keeps its working space. Metres are those at the line's middle
 * latitude, which is exact enough for lines that span a few degrees.
 */
export class LineWeights {
	private size = new Float64Array(0);
	private previous = new Int32Array(0);
	private next = new Int32Array(0);
	/** inner points in heap order, least first, and where each stands */
	private heap = new Int32Array(0);
	private slot = new Int32Array(0);
	private waiting = 0;

	constructor(private points: Float64Array) {}

	/**
	 * Writes the weights of points `from` to `to` into `weights`; ends, and the last `least` inner points,
	 * weigh Infinity.
	 */
	weigh(from: number, to: number, least: number, weights: Float32Array): void {
		const last = to - from;
		weights.fill(Infinity, from, to + 1);
		if (last - 1 <= least) return;
		this.prepare(from, last);
		let heaviest = 0;
		while (this.waiting > least) {
			const item = this.take();
			heaviest = Math.max(heaviest, this.size[item]);
			weights[from + item] = Math.sqrt(heaviest);
			const [p, n] = [this.previous[item], this.next[item]];
			this.next[p] = n;
			this.previous[n] = p;
			if (p > 0) this.renew(p, from);
			if (n < last) this.renew(n, from);
		}
	}

	private prepare(from: number, last: number): void {
		if (this.size.length <= last) this.grow(2 * (last + 1));
		const middle = this.points[2 * (from + (last >> 1)) + 1];
		const { east, north } = metresPerDegree(middle);
		this.perSquare = Math.abs(east * north) / 2;
		for (let i = 0; i <= last; i++) {
			this.previous[i] = i - 1;
			this.next[i] = i + 1;
		}
		this.waiting = last - 1;
		for (let i = 1; i < last; i++) {
			this.size[i] = this.triangle(i, from);
			this.heap[i - 1] = i;
			this.slot[i] = i - 1;
		}
		for (let at = (this.waiting >> 1) - 1; at >= 0; at--) this.sink(at);
	}

	/** square metres in half a square degree here */
	private perSquare = 0;

	private triangle(i: number, from: number): number {
		const { points, previous, next } = this;
		const [a, b, c] = [2 * (from + previous[i]), 2 * (from + i), 2 * (from + next[i])];
		const cross =
			(points[a] - points[b]) * (points[c + 1] - points[b + 1]) -
			(points[c] - points[b]) * (points[a + 1] - points[b + 1]);
		return Math.abs(cross) * this.perSquare;
	}

	private renew(i: number, from: number): void {
		const before = this.size[i];
		this.size[i] = this.triangle(i, from);
		if (this.size[i] < before) this.rise(this.slot[i]);
		else this.sink(this.slot[i]);
	}

	private take(): number {
		const top = this.heap[0];
		this.waiting--;
		if (this.waiting > 0) {
			this.put(this.heap[this.waiting], 0);
			this.sink(0);
		}
		return top;
	}

	private put(item: number, at: number): void {
		this.heap[at] = item;
		this.slot[item] = at;
	}

	private rise(at: number): void {
		const item = this.heap[at];
		while (at > 0) {
			const up = (at - 1) >> 1;
			if (this.size[this.heap[up]] <= this.size[item]) break;
			this.put(this.heap[up], at);
			at = up;
		}
		this.put(item, at);
	}

	private sink(at: number): void {
		const item = this.heap[at];
		for (;;) {
			let down = 2 * at + 1;
			if (down >= this.waiting) break;
			const other = down + 1;
			if (other < this.waiting && this.size[this.heap[other]] < this.size[this.heap[down]])
				down = other;
			if (this.size[this.heap[down]] >= this.size[item]) break;
			this.put(this.heap[down], at);
			at = down;
		}
		this.put(item, at);
	}

	private grow(room: number): void {
		this.size = new Float64Array(room);
		this.previous = new Int32Array(room);
		this.next = new Int32Array(room);
		this.heap = new Int32Array(room);
		this.slot = new Int32Array(room);
	}
}
