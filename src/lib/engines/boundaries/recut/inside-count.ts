/** Regions that a place lies in, each with how often; most places lie in one. */
export class InsideCount {
	regions: number[] = [];
	counts: number[] = [];

	/** Adds `by` (which may be negative) to a region; -1 stands for no region. */
	add(region: number, by: number): void {
		if (region < 0) return;
		const at = this.regions.indexOf(region);
		if (at < 0) {
			this.regions.push(region);
			this.counts.push(by);
		} else if ((this.counts[at] += by) === 0) {
			this.regions.splice(at, 1);
			this.counts.splice(at, 1);
		}
	}

	/** Another of the same, plus `times` what `change` holds. */
	with(change: InsideCount, times: 1 | -1): InsideCount {
		const sum = new InsideCount();
		sum.regions = [...this.regions];
		sum.counts = [...this.counts];
		change.regions.forEach((region, i) => sum.add(region, times * change.counts[i]));
		return sum;
	}
}
