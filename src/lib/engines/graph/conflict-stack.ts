/**
 * The stack of conflict pairs of the left-right planarity test. A pair holds two intervals of return
 * edges, left and right, each from `low` to `high`; -1 stands for no edge. `ref[e]` is the return edge
 * below e in its interval.
 */
export class ConflictStack {
	size = 0;
	private readonly leftLow: Int32Array;
	private readonly leftHigh: Int32Array;
	private readonly rightLow: Int32Array;
	private readonly rightHigh: Int32Array;
	private readonly ref: Int32Array;

	constructor(
		edges: number,
		private readonly lowpoint: Int32Array,
		private readonly targets: Uint32Array,
	) {
		this.leftLow = new Int32Array(edges);
		this.leftHigh = new Int32Array(edges);
		this.rightLow = new Int32Array(edges);
		this.rightHigh = new Int32Array(edges);
		this.ref = new Int32Array(edges).fill(-1);
	}

	push(leftLow: number, leftHigh: number, rightLow: number, rightHigh: number): void {
		this.leftLow[this.size] = leftLow;
		this.leftHigh[this.size] = leftHigh;
		this.rightLow[this.size] = rightLow;
		this.rightHigh[this.size] = rightHigh;
		this.size++;
	}

	/**
	 * Makes the return edges of edge e agree with those of the edges before it at the same vertex, whose
	 * tree edge is `into`; `bottom` is the size of the stack before e. False when they cannot.
	 */
	constrain(e: number, into: number, bottom: number, intoLow: number): boolean {
		const { lowpoint, ref } = this;
		let low = -1;
		let high = -1;
		do {
			const top = --this.size;
			if (this.leftLow[top] >= 0) this.swap(top);
			if (this.leftLow[top] >= 0) return false;
			if (lowpoint[this.rightLow[top]] > lowpoint[into]) {
				if (low < 0) high = this.rightHigh[top];
				else ref[low] = this.rightHigh[top];
				low = this.rightLow[top];
			} else ref[this.rightLow[top]] = intoLow;
		} while (this.size !== bottom);
		return this.mergeEarlier(e, low, high);
	}

	private mergeEarlier(e: number, low: number, high: number): boolean {
		const { ref } = this;
		let left = -1;
		let leftTop = -1;
		while (this.size > 0) {
			const top = this.size - 1;
			const clashes = (edge: number) => edge >= 0 && this.lowpoint[edge] > this.lowpoint[e];
			if (!clashes(this.leftHigh[top]) && !clashes(this.rightHigh[top])) break;
			this.size--;
			if (clashes(this.rightHigh[top])) this.swap(top);
			if (clashes(this.rightHigh[top])) return false;
			if (low >= 0) ref[low] = this.rightHigh[top];
			else high = this.rightHigh[top];
			if (this.rightLow[top] >= 0) low = this.rightLow[top];
			if (left < 0) leftTop = this.leftHigh[top];
			else ref[left] = this.leftHigh[top];
			left = this.leftLow[top];
		}
		if (low >= 0 || left >= 0) this.push(left, leftTop, low, high);
		return true;
	}

	/** Takes out the return edges that end at vertex u of the given height. */
	trim(u: number, height: number): void {
		while (this.size > 0 && this.lowest(this.size - 1) === height) this.size--;
		if (this.size === 0) return;
		const top = this.size - 1;
		this.trimSide(this.leftLow, this.leftHigh, this.rightLow, top, u);
		this.trimSide(this.rightLow, this.rightHigh, this.leftLow, top, u);
	}

	private trimSide(
		lows: Int32Array,
		highs: Int32Array,
		others: Int32Array,
		top: number,
		u: number,
	): void {
		while (highs[top] >= 0 && this.targets[highs[top]] === u) highs[top] = this.ref[highs[top]];
		if (highs[top] >= 0 || lows[top] < 0) return;
		this.ref[lows[top]] = others[top];
		lows[top] = -1;
	}

	private lowest(top: number): number {
		const { lowpoint, leftLow, rightLow } = this;
		if (leftLow[top] < 0) return lowpoint[rightLow[top]];
		if (rightLow[top] < 0) return lowpoint[leftLow[top]];
		return Math.min(lowpoint[leftLow[top]], lowpoint[rightLow[top]]);
	}

	private swap(top: number): void {
		const { leftLow, leftHigh, rightLow, rightHigh } = this;
		[leftLow[top], rightLow[top]] = [rightLow[top], leftLow[top]];
		[leftHigh[top], rightHigh[top]] = [rightHigh[top], leftHigh[top]];
	}
}
