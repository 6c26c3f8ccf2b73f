import { metresPerDegree } from './ellipsoid.ts';

/**
 * Which inner points of a line to keep so that no point left spans a triangle smaller than `metres`
 * squared with its neighbours (Visvalingam and Whyatt, "Line generalisation by repeated elimination of
 * points", Cartographic Journal 30, 1993). Ends stay, and at least `least` inner points.
 * Answers the points kept, as numbers from `from` to `to`, in order.
 */
export function thinLine(
	points: Float64Array,
	from: number,
	to: number,
	metres: number,
	least: number,
): number[] {
	const count = to - from + 1;
	const previous = Int32Array.from({ length: count }, (_, i) => i - 1);
	const next = Int32Array.from({ length: count }, (_, i) => i + 1);
	const size = new Float64Array(count).fill(Infinity);
	const heap = new Heap();
	const weigh = (i: number) => {
		size[i] = triangle(points, from + previous[i], from + i, from + next[i]);
		heap.push(size[i], i);
	};
	for (let i = 1; i < count - 1; i++) weigh(i);
	let inner = count - 2;
	const smallest = metres * metres;
	while (inner > least) {
		const top = heap.pop();
		if (!top || top.size >= smallest) break;
		if (top.size !== size[top.item]) continue;
		const { item } = top;
		size[item] = -1;
		inner--;
		const [p, n] = [previous[item], next[item]];
		next[p] = n;
		previous[n] = p;
		if (p > 0) weigh(p);
		if (n < count - 1) weigh(n);
	}
	const kept: number[] = [];
	for (let i = 0; i < count; i = next[i]) kept.push(from + i);
	return kept;
}

function triangle(p: Float64Array, a: number, b: number, c: number): number {
	const { east, north } = metresPerDegree(p[2 * b + 1]);
	const x1 = (p[2 * a] - p[2 * b]) * east;
	const y1 = (p[2 * a + 1] - p[2 * b + 1]) * north;
	const x2 = (p[2 * c] - p[2 * b]) * east;
	const y2 = (p[2 * c + 1] - p[2 * b + 1]) * north;
	return Math.abs(x1 * y2 - x2 * y1) / 2;
}

/** Least first; entries whose size is out of date are passed over by the reader. */
class Heap {
	private sizes: number[] = [];
	private items: number[] = [];

	push(size: number, item: number): void {
		let i = this.sizes.length;
		while (i > 0) {
			const up = (i - 1) >> 1;
			if (this.sizes[up] <= size) break;
			this.sizes[i] = this.sizes[up];
			this.items[i] = this.items[up];
			i = up;
		}
		this.sizes[i] = size;
		this.items[i] = item;
	}

	pop(): { size: number; item: number } | null {
		const { sizes, items } = this;
		if (sizes.length === 0) return null;
		const top = { size: sizes[0], item: items[0] };
		const size = sizes.pop() as number;
		const item = items.pop() as number;
		const count = sizes.length;
		if (count === 0) return top;
		let i = 0;
		for (;;) {
			let down = 2 * i + 1;
			if (down >= count) break;
			if (down + 1 < count && sizes[down + 1] < sizes[down]) down++;
			if (sizes[down] >= size) break;
			sizes[i] = sizes[down];
			items[i] = items[down];
			i = down;
		}
		sizes[i] = size;
		items[i] = item;
		return top;
	}
}
