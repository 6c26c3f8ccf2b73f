/** Typed arrays that grow by doubling; `items` may be longer than `length`. */
export class GrowingFloats {
	items: Float64Array;
	length = 0;
	constructor(capacity = 1024) {
		this.items = new Float64Array(Math.max(capacity, 16));
	}
	push(value: number): void {
		if (this.length === this.items.length) this.items = doubled(this.items, Float64Array);
		this.items[this.length++] = value;
	}
	push2(x: number, y: number): void {
		if (this.length + 2 > this.items.length) this.items = doubled(this.items, Float64Array);
		this.items[this.length++] = x;
		this.items[this.length++] = y;
	}
	/** As taken, copied when much memory would be left over behind it. */
	trimmed(): Float64Array {
		return this.length < 0.95 * this.items.length ? this.taken().slice() : this.taken();
	}
	taken(): Float64Array {
		return this.items.subarray(0, this.length);
	}
}

export class GrowingInts {
	items: Int32Array;
	length = 0;
	constructor(capacity = 1024) {
		this.items = new Int32Array(Math.max(capacity, 16));
	}
	push(value: number): void {
		if (this.length === this.items.length) this.items = doubled(this.items, Int32Array);
		this.items[this.length++] = value;
	}
	taken(): Int32Array {
		return this.items.subarray(0, this.length);
	}
}

function doubled<T extends Float64Array | Int32Array>(old: T, Kind: new (length: number) => T): T {
	const next = new Kind(old.length * 2);
	next.set(old as never);
	return next;
}
