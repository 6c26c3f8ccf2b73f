const TOO_LARGE = 1e100;

/**
 * Variables by how lately they took part in conflicts, in a binary heap.
 * Method: VSIDS (Moskewicz et al. 2001) with exponential weights as in MiniSat.
 */
export class Activity {
	private score = new Float64Array(16);
	private heap = new Int32Array(16);
	/** place of each variable in the heap, -1 when taken out */
	private place = new Int32Array(16).fill(-1);
	private size = 0;
	private step = 1;

	/** Enters a new variable with a small first score. */
	enter(variable: number, score: number): void {
		if (variable >= this.score.length) this.widen(variable * 2);
		this.score[variable] = score;
		this.place[variable] = -1;
		this.insert(variable);
	}

	insert(variable: number): void {
		if (this.place[variable] >= 0) return;
		this.place[variable] = this.size;
		this.heap[this.size++] = variable;
		this.rise(this.place[variable]);
	}

	bump(variable: number): void {
		this.score[variable] += this.step;
		if (this.score[variable] > TOO_LARGE) this.rescale();
		if (this.place[variable] >= 0) this.rise(this.place[variable]);
	}

	decay(factor: number): void {
		this.step /= factor;
	}

	/** Takes out the variable of highest score; 0 when none is left. */
	take(): number {
		if (this.size === 0) return 0;
		const top = this.heap[0];
		const last = this.heap[--this.size];
		this.place[top] = -1;
		if (this.size > 0) {
			this.heap[0] = last;
			this.place[last] = 0;
			this.sink(0);
		}
		return top;
	}

	private rescale(): void {
		for (let i = 0; i < this.score.length; i++) this.score[i] /= TOO_LARGE;
		this.step /= TOO_LARGE;
	}

	private rise(at: number): void {
		const { heap, place, score } = this;
		const variable = heap[at];
		while (at > 0) {
			const parent = (at - 1) >> 1;
			if (score[heap[parent]] >= score[variable]) break;
			heap[at] = heap[parent];
			place[heap[at]] = at;
			at = parent;
		}
		heap[at] = variable;
		place[variable] = at;
	}

	private sink(at: number): void {
		const { heap, place, score, size } = this;
		const variable = heap[at];
		for (;;) {
			let child = 2 * at + 1;
			if (child >= size) break;
			if (child + 1 < size && score[heap[child + 1]] > score[heap[child]]) child++;
			if (score[heap[child]] <= score[variable]) break;
			heap[at] = heap[child];
			place[heap[at]] = at;
			at = child;
		}
		heap[at] = variable;
		place[variable] = at;
	}

	private widen(capacity: number): void {
		const score = new Float64Array(capacity);
		score.set(this.score);
		this.score = score;
		const heap = new Int32Array(capacity);
		heap.set(this.heap);
		this.heap = heap;
		const place = new Int32Array(capacity).fill(-1);
		place.set(this.place);
		this.place = place;
	}
}
