import { readCase, type Case } from './explain-case.ts';
import { inksThatWouldDo } from './explain-inks.ts';
import { Purse } from './explain-purse.ts';
import { blamedRules } from './explain-rules.ts';
import { barePart, shrink, type Clash } from './explain-shrink.ts';
import { Whole } from './explain-whole.ts';
import { problemFaults } from './faults.ts';
import type { ColouringProblem, Explanation, Release } from './problem.ts';
import { cheapestRelease, type ReleaseSoFar } from './release.ts';

/** Conflicts for one question and for each of the tasks in all; sets for the integer program. */
const EFFORT = {
	quick: { each: 5_000, all: 20_000, rows: 300 },
	normal: { each: 50_000, all: 200_000, rows: 1_200 },
	thorough: { each: 500_000, all: 5_000_000, rows: 100_000 },
};

/**
 * Why no colouring keeps the locks and rules of a problem, and the cheapest way out.
 *
 * Guarantees: `locks` collide with the rules, and without any single one they do not; where they are
 * empty, `rules` alone cannot be kept, and without any single one they can. Dropping the locks of
 * `release` makes the problem feasible; no release costs less than its `lowerBound`, and `proved` says
 * that it is attained. The collision needs no other regions than `regions`. `inksThatWouldDo` is the
 * smallest number of inks that the effort sufficed to tell. `locks` collide whichever of the other locks
 * stand; a region that is locked to a reserved ink may have it in all of this even where its lock is not
 * held, but after the `release` it is coloured without. Steps are solver conflicts, by `effort`.
 *
 * Null when the problem is feasible, or the effort did not suffice to tell that it is not.
 * @throws RangeError when the problem is not well formed: ask `problemFaults` first
 */
export async function explain(problem: ColouringProblem): Promise<Explanation | null> {
	const [fault] = problemFaults(problem);
	if (fault) throw new RangeError(fault);
	return new Explaining(problem).run();
}

class Explaining {
	private readonly of: Case;
	private readonly seed: number;
	private readonly whole: Whole;
	private readonly everything: Uint32Array;

	constructor(private problem: ColouringProblem) {
		this.of = readCase(problem);
		this.seed = problem.seed ?? 0;
		this.everything = Uint32Array.from({ length: this.of.graph.count }, (_, v) => v);
		this.whole = new Whole(this.of, this.seed);
	}

	async run(): Promise<Explanation | null> {
		if (this.of.torn) return this.withRules([]);
		const withoutLocks = this.ask([], this.purse());
		if (withoutLocks === 'unsat') return this.withRules(this.refutedPart());
		if (withoutLocks === 'unknown') return null;
		const unmet = [...this.of.demands.keys()].filter((d) => !this.whole.meets(d));
		const { immediate } = this.whole;
		if (immediate.length === 0 && this.ask(this.of.demands.keys(), this.purse()) !== 'unsat') {
			return null;
		}
		const { releaseFound } = this.problem;
		const { clashes, ...found } = await cheapestRelease(this.of, this.whole, this.purse(), {
			unmet,
			rows: this.effort().rows,
			seed: this.seed,
			found: releaseFound && ((soFar) => releaseFound(this.released({ ...soFar, proved: false }))),
		});
		const clash = this.irreducible(immediate.length > 0 ? immediate[0] : clashes[0].demands);
		return {
			locks: clash.demands.map((d) => this.of.demands[d].regions[0]).sort((a, b) => a - b),
			rules: [],
			regions: this.regionsOf(barePart(this.of, clash, this.purse(), this.seed)),
			release: this.released(found),
			inksThatWouldDo: inksThatWouldDo(this.of, this.purse(), this.seed),
		};
	}

	private released({ demands, ...rest }: ReleaseSoFar & { proved: boolean }): Release {
		const locks = demands.flatMap((d) => this.of.demands[d].regions).sort((a, b) => a - b);
		return { locks, ...rest };
	}

	private purse(): Purse {
		const { each, all } = this.effort();
		return new Purse(all, each, this.problem.cancelled);
	}

	private effort() {
		const { effort = 'normal', effortTimes = 1 } = this.problem;
		const { each, all, rows } = EFFORT[effort];
		return { each: each * effortTimes, all: all * effortTimes, rows: rows * effortTimes };
	}

	private ask(demands: Iterable<number>, purse: Purse) {
		return this.whole.ask(demands, purse);
	}

	/** Leaves out demands until, on the whole map, none can be spared. */
	private irreducible(start: number[]): Clash {
		const purse = this.purse();
		let demands = start;
		for (const d of start) {
			if (!demands.includes(d)) continue;
			const rest = demands.filter((other) => other !== d);
			if (this.ask(rest, purse) === 'unsat') demands = this.whole.failedDemands();
		}
		const clash = shrink(this.of, demands, purse, this.seed);
		return clash ?? { demands, vertices: Array.from(this.everything) };
	}

	/** When the rules alone fail: vertices on which they do. */
	private refutedPart(): number[] {
		const clash = { demands: [], vertices: Array.from(this.everything) };
		return barePart(this.of, clash, this.purse(), this.seed);
	}

	private withRules(vertices: number[]): Explanation {
		const among = this.regionsOf(vertices);
		const rules = blamedRules(this.problem, this.of, among, this.purse());
		const named = rules.flatMap((rule) => {
			if (rule.kind === 'inks') return [];
			return 'region' in rule ? [rule.region] : [rule.a, rule.b];
		});
		return {
			locks: [],
			rules,
			regions: [...new Set(named)].sort((a, b) => a - b),
			release: null,
			inksThatWouldDo: inksThatWouldDo(this.of, this.purse(), this.seed),
		};
	}

	private regionsOf(vertices: number[]): number[] {
		return vertices.flatMap((v) => this.of.members[v]).sort((a, b) => a - b);
	}
}
