/** A running sum that loses nothing to rounding on the way (Neumaier 1974). */
export class Sum {
	private sum = 0;
	private lost = 0;

	add(value: number): void {
		const next = this.sum + value;
		const larger = Math.abs(this.sum) >= Math.abs(value);
		this.lost += larger ? this.sum - next + value : value - next + this.sum;
		this.sum = next;
	}

	/** The sum; infinite where it is beyond the numbers of this machine. */
	get value(): number {
		return Number.isFinite(this.sum) ? this.sum + this.lost : this.sum;
	}
}

export function sumOf(values: Iterable<number>): number {
	const sum = new Sum();
	for (const value of values) if (!Number.isNaN(value)) sum.add(value);
	return sum.value;
}
