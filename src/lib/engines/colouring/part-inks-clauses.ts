import { Sat, type Answer, type Budget } from '../solver/sat.ts';
import type { PartingQuestion } from './part-inks.ts';
import type { Rule } from './problem.ts';
import { reservedByRegion } from './reserved.ts';

type Source = { lock: number } | { rule: Rule };

/**
 * The clauses of a parting for some number of inks. Borders and unsafe pairs always hold; every lock and
 * rule hangs on a variable of its own, so that what forces a refusal can be named.
 */
export class PartingClauses {
	readonly sat: Sat;
	private readonly sources: Source[] = [];
	private readonly switches: number[] = [];
	private contradiction = false;

	constructor(
		private readonly question: PartingQuestion,
		readonly inks: number,
	) {
		this.sat = new Sat({ seed: question.problem.seed });
		this.regions();
		this.borders();
		this.rules();
	}

	/** Every lock and rule, by number. */
	all(): number[] {
		return [...this.switches.keys()];
	}

	solve(held: readonly number[], budget: Budget): Answer {
		if (this.contradiction) return 'unsat';
		return this.sat.solve(
			held.map((one) => this.switches[one]),
			budget,
		);
	}

	/** The locks and rules that the last refusal rests on; none when borders alone force it. */
	failed(): number[] {
		if (this.contradiction) return [];
		const core = new Set(this.sat.core().map(Math.abs));
		return this.all().filter((one) => core.has(this.switches[one]));
	}

	named(core: readonly number[]): { locks: number[]; rules: Rule[] } {
		const sources = core.map((one) => this.sources[one]);
		return {
			locks: sources.flatMap((one) => ('lock' in one ? [one.lock] : [])),
			rules: sources.flatMap((one) => ('rule' in one ? [one.rule] : [])),
		};
	}

	/** The ink of each region: that of `from` where the answer allows it, else the lowest. */
	colouring(): Int32Array {
		const { problem, from } = this.question;
		return Int32Array.from({ length: problem.regions }, (_, region) => {
			const before = from[region];
			if (before >= 0 && before < this.inks && this.sat.value(this.variable(region, before))) {
				return before;
			}
			for (let ink = 0; ink < this.inks; ink++) {
				if (this.sat.value(this.variable(region, ink))) return ink;
			}
			return -1;
		});
	}

	private variable(region: number, ink: number): number {
		return region * this.inks + ink + 1;
	}

	private add(literals: readonly number[]): void {
		if (!this.contradiction && !this.sat.addClause(literals)) this.contradiction = true;
	}

	/** One ink each and no two, so that what is said of one ink holds of the region. */
	private regions(): void {
		const { problem, from } = this.question;
		const count = problem.regions * this.inks;
		for (let i = 0; i < count; i++) this.sat.newVariable();
		for (let region = 0; region < problem.regions; region++) {
			const all = Array.from({ length: this.inks }, (_, ink) => this.variable(region, ink));
			this.add(all);
			all.forEach((one, i) => all.slice(0, i).forEach((other) => this.add([-one, -other])));
			const before = from[region];
			if (before >= 0 && before < this.inks) this.sat.setPhase(this.variable(region, before), true);
		}
	}

	private borders(): void {
		const { problem, unsafe } = this.question;
		const { a, b } = problem.borders;
		const fitting = unsafe.filter(([one, two]) => Math.max(one, two) < this.inks);
		for (let i = 0; i < a.length; i++) {
			for (let ink = 0; ink < this.inks; ink++) this.differ(a[i], ink, b[i], ink);
			for (const [one, two] of fitting) {
				this.differ(a[i], one, b[i], two);
				this.differ(a[i], two, b[i], one);
			}
		}
	}

	private differ(p: number, inkP: number, q: number, inkQ: number, on?: number): void {
		const both = [-this.variable(p, inkP), -this.variable(q, inkQ)];
		this.add(on === undefined ? both : [-on, ...both]);
	}

	private rules(): void {
		const { problem } = this.question;
		problem.locks?.forEach((ink, region) => {
			if (ink >= 0) this.unit(this.source({ lock: region }), region, ink, true);
		});
		for (const [region, ink] of problem.forbidden ?? []) {
			if (ink < this.inks)
				this.unit(this.source({ rule: { kind: 'forbidden', region, ink } }), region, ink, false);
		}
		for (const [a, b] of problem.apart ?? []) {
			const on = this.source({ rule: { kind: 'apart', a, b } });
			for (let ink = 0; ink < this.inks; ink++) this.differ(a, ink, b, ink, on);
		}
		for (const [a, b] of problem.alike ?? []) this.alike(a, b);
		this.reserved();
	}

	private alike(a: number, b: number): void {
		const on = this.source({ rule: { kind: 'alike', a, b } });
		for (let ink = 0; ink < this.inks; ink++) {
			const [p, q] = [this.variable(a, ink), this.variable(b, ink)];
			this.add([-on, -p, q]);
			this.add([-on, p, -q]);
		}
	}

	/** One rule for each reserved ink, named by the first region that it keeps from having it. */
	private reserved(): void {
		const { problem } = this.question;
		const kept = reservedByRegion(problem);
		for (const ink of kept?.inks ?? []) {
			if (ink >= this.inks) continue;
			let on = 0;
			for (let region = 0; region < problem.regions; region++) {
				if (!kept?.keptFrom(region, ink)) continue;
				on ||= this.source({ rule: { kind: 'reserved', region, ink } });
				this.unit(on, region, ink, false);
			}
		}
	}

	private source(source: Source): number {
		const on = this.sat.newVariable();
		this.sat.setPhase(on, true);
		this.sources.push(source);
		this.switches.push(on);
		return on;
	}

	/** A lock to an ink that there is not can never be kept. */
	private unit(on: number, region: number, ink: number, holds: boolean): void {
		if (ink >= this.inks) return this.add([-on]);
		const variable = this.variable(region, ink);
		this.add([-on, holds ? variable : -variable]);
	}
}
