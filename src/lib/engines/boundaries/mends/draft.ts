import { ringPoints } from '../../geometry/coverage-rings.ts';
import type { Matched } from '../match.ts';
import type { Part } from './parts.ts';

/** A matched map being mended: regions redrawn, left out or joined to others, by number. */
export class Draft {
	/** holes that were given away */
	readonly filled = new Set<number>();
	/** regions that gave up land, so that the holes beside them are no longer as they were */
	readonly shrunk = new Set<number>();
	private redrawn = new Map<number, Part[]>();
	private became = new Map<number, number>();
	private numbers: Map<string, number>;

	constructor(readonly matched: Matched) {
		this.numbers = new Map(matched.coverage.keys.map((key, r) => [key, r]));
	}

	get isChanged(): boolean {
		return this.redrawn.size + this.became.size > 0;
	}

	/** The number of a region that is still there, or null. */
	region(key: string): number | null {
		const region = this.numbers.get(key);
		return region === undefined || this.became.has(region) ? null : region;
	}

	isRedrawn(region: number): boolean {
		return this.redrawn.has(region);
	}

	/** The parts of a region as the steps so far have left them. */
	parts(region: number): Part[] {
		return this.redrawn.get(region) ?? partsOf(this.matched, region);
	}

	redraw(region: number, parts: Part[]): void {
		this.redrawn.set(region, parts);
	}

	/** Leaves a region out, or says that it is part of another, which is drawn by the caller. */
	remove(region: number, into: number | null): void {
		if (into === null) this.shrunk.add(region);
		this.redrawn.delete(region);
		this.became.set(region, into ?? -1);
	}

	/** Which region each one has become, -1 for those that are left out, following several steps. */
	outcome(): Int32Array {
		const outcome = new Int32Array(this.matched.coverage.keys.length);
		for (let region = 0; region < outcome.length; region++) {
			let end = region;
			while (end >= 0 && this.became.has(end)) end = this.became.get(end) as number;
			outcome[region] = end;
		}
		return outcome;
	}

	/** Parts of the regions that are still there and are drawn anew. */
	*drawings(): Generator<[region: number, parts: Part[]]> {
		yield* this.redrawn;
	}
}

function partsOf({ coverage }: Matched, region: number): Part[] {
	const parts: Part[] = [];
	for (let part = coverage.regionParts[region]; part < coverage.regionParts[region + 1]; part++) {
		const rings: Part = [];
		for (let ring = coverage.partRings[part]; ring < coverage.partRings[part + 1]; ring++) {
			rings.push(ringPoints(coverage, ring));
		}
		parts.push(rings);
	}
	return parts;
}
