import { Sat } from '../solver/sat.ts';
import { holdersOfReserved } from './check-reserved.ts';
import type { ColouringProblem } from './problem.ts';

const CONFLICTS = 200_000;

/**
 * A problem as plain clauses, one variable for each region and ink, locks as assumptions. Inks that no
 * lock or rule names are alike: of these no more are written down than suffice to colour every region
 * of whatever degree, so that 'fewest' (any number of inks) and large numbers stay small. Who is locked
 * to a reserved ink may have it whether or not that lock is assumed. `heeds` leaves regions out of what
 * reserved inks ask.
 */
export class PlainQuestion {
	private readonly sat = new Sat();
	private readonly place = new Map<number, number>();
	private readonly inks: number;

	constructor(
		private problem: ColouringProblem,
		private readonly heeds: (region: number) => boolean = () => true,
	) {
		const limit = problem.inks === 'fewest' ? Infinity : problem.inks;
		const named = new Set<number>();
		for (const ink of problem.locks ?? []) if (ink >= 0 && ink < limit) named.add(ink);
		for (const [, ink] of problem.forbidden ?? []) if (ink < limit) named.add(ink);
		for (const ink of problem.reserved ?? []) if (ink < limit) named.add(ink);
		for (const ink of named) this.place.set(ink, this.place.size);
		this.inks = named.size + Math.min(limit - named.size, unnamedInksEnough(problem));
		for (let i = 0; i < problem.regions * this.inks; i++) this.sat.newVariable();
		this.writeRules();
	}

	/** Whether all rules and the locks of these regions can be kept; null when that stays open. */
	feasible(locked: number[]): boolean | null {
		const assumptions: number[] = [];
		for (const region of locked) {
			const place = this.place.get(this.problem.locks?.[region] ?? -1);
			if (place === undefined) return false;
			assumptions.push(this.has(region, place));
		}
		const answer = this.sat.solve(assumptions, { conflicts: CONFLICTS });
		return answer === 'unknown' ? null : answer === 'sat';
	}

	private has(region: number, place: number): number {
		return region * this.inks + place + 1;
	}

	private writeRules(): void {
		const { regions, borders, alike, apart, forbidden } = this.problem;
		for (let r = 0; r < regions; r++) {
			const some = Array.from({ length: this.inks }, (_, place) => this.has(r, place));
			this.sat.addClause(some);
			// Exactly one: two regions kept alike must not take different ones of several inks.
			for (let i = 0; i < some.length; i++) {
				for (let j = 0; j < i; j++) this.sat.addClause([-some[i], -some[j]]);
			}
		}
		for (let i = 0; i < borders.a.length; i++) this.differ(borders.a[i], borders.b[i]);
		for (const [a, b] of apart ?? []) this.differ(a, b);
		for (const [a, b] of alike ?? []) {
			for (let place = 0; place < this.inks; place++) {
				this.sat.addClause([-this.has(a, place), this.has(b, place)]);
			}
		}
		for (const [region, ink] of forbidden ?? []) {
			const place = this.place.get(ink);
			if (place !== undefined) this.sat.addClause([-this.has(region, place)]);
		}
		this.writeReserved();
	}

	private writeReserved(): void {
		for (const [ink, holders] of holdersOfReserved(this.problem)) {
			const place = this.place.get(ink);
			if (place === undefined) continue;
			for (let r = 0; r < this.problem.regions; r++) {
				if (!holders.has(r) && this.heeds(r)) this.sat.addClause([-this.has(r, place)]);
			}
		}
	}

	private differ(a: number, b: number): void {
		for (let place = 0; place < this.inks; place++) {
			this.sat.addClause([-this.has(a, place), -this.has(b, place)]);
		}
	}
}

/** The most neighbours that any region, or any regions kept alike together, can have, and one. */
function unnamedInksEnough({ regions, borders, alike, apart }: ColouringProblem): number {
	const neighbours = new Float64Array(regions);
	const count = (r: number) => neighbours[r]++;
	for (let i = 0; i < borders.a.length; i++) {
		count(borders.a[i]);
		count(borders.b[i]);
	}
	apart?.forEach((pair) => pair.forEach(count));
	if (!alike || alike.length === 0) return Math.max(0, ...neighbours) + 1;
	const tied = [...new Set(alike.flat())].map((r) => neighbours[r]);
	const together = tied.reduce((sum, each) => sum + each, 0);
	return Math.min(regions, Math.max(together, ...neighbours) + 1);
}
