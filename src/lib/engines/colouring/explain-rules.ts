import { Sat } from '../solver/sat.ts';
import type { Case } from './explain-case.ts';
import type { Purse } from './explain-purse.ts';
import type { ColouringProblem, Rule } from './problem.ts';
import { reservedByRegion } from './reserved.ts';

/**
 * An irreducible set of rules that no colouring can keep, locks aside, among those of the regions
 * given, which are known not to be kept together; irreducible as far as the purse allows.
 */
export function blamedRules(
	problem: ColouringProblem,
	of: Case,
	regions: number[],
	purse: Purse,
): Rule[] {
	if (of.torn) return tornRules(problem, of.torn);
	const rules = rulesAmong(problem, of.inks, new Set(regions));
	const clauses = new RuleClauses(regions, of.inks, rules);
	let kept = rules.map((_, i) => i);
	if (purse.pay(clauses.sat, (budget) => clauses.solve(kept, budget)) === 'unsat') {
		kept = clauses.failed();
	}
	for (const i of [...kept]) {
		if (!kept.includes(i)) continue;
		const rest = kept.filter((other) => other !== i);
		const answer = purse.pay(clauses.sat, (budget) => clauses.solve(rest, budget));
		if (answer === 'unsat') kept = clauses.failed();
	}
	return [...kept.map((i) => rules[i]), { kind: 'inks', inks: of.inks }];
}

/** A pair that must differ and a shortest chain of pairs kept alike from one to the other. */
function tornRules(problem: ColouringProblem, [a, b]: readonly [number, number]): Rule[] {
	const before = new Map([[a, a]]);
	const queue = [a];
	for (const region of queue) {
		for (const [p, q] of problem.alike ?? []) {
			const next = p === region ? q : q === region ? p : -1;
			if (next < 0 || before.has(next)) continue;
			before.set(next, region);
			queue.push(next);
		}
	}
	const rules: Rule[] = [{ kind: mustDifferKind(problem, a, b), a, b }];
	for (let region = b; region !== a; region = before.get(region) as number) {
		rules.push({ kind: 'alike', a: before.get(region) as number, b: region });
	}
	return rules;
}

function mustDifferKind({ apart }: ColouringProblem, a: number, b: number): 'border' | 'apart' {
	const joins = ([p, q]: readonly [number, number]) => (p === a && q === b) || (p === b && q === a);
	return apart?.some(joins) ? 'apart' : 'border';
}

function rulesAmong(problem: ColouringProblem, inks: number, regions: Set<number>): Rule[] {
	const rules = new Map<string, Rule>();
	const enter = (kind: 'border' | 'alike' | 'apart', a: number, b: number) => {
		if (a === b || !regions.has(a) || !regions.has(b)) return;
		const rule = { kind, a: Math.min(a, b), b: Math.max(a, b) };
		rules.set(`${kind} ${rule.a} ${rule.b}`, rule);
	};
	const { borders, alike, apart, forbidden } = problem;
	for (let i = 0; i < borders.a.length; i++) enter('border', borders.a[i], borders.b[i]);
	for (const [a, b] of alike ?? []) enter('alike', a, b);
	for (const [a, b] of apart ?? []) enter('apart', a, b);
	for (const [region, ink] of forbidden ?? []) {
		if (!regions.has(region) || ink >= inks) continue;
		rules.set(`forbidden ${region} ${ink}`, { kind: 'forbidden', region, ink });
	}
	return [...rules.values(), ...reservedAmong(problem, inks, regions)];
}

function reservedAmong(problem: ColouringProblem, inks: number, regions: Set<number>): Rule[] {
	const reserved = reservedByRegion(problem);
	if (!reserved) return [];
	const inUse = reserved.inks.filter((ink) => ink < inks);
	return [...regions].flatMap((region) =>
		inUse
			.filter((ink) => reserved.keptFrom(region, ink))
			.map((ink): Rule => ({ kind: 'reserved', region, ink })),
	);
}

/** Regions that each need an ink, and rules that hold when their switch is assumed. */
class RuleClauses {
	readonly sat = new Sat();
	private readonly first = new Map<number, number>();
	private readonly switches: number[] = [];

	constructor(
		regions: number[],
		private readonly inks: number,
		rules: Rule[],
	) {
		for (const region of regions) {
			const some = Array.from({ length: inks }, () => this.sat.newVariable());
			this.first.set(region, some[0]);
			this.sat.addClause(some);
		}
		for (const rule of rules) this.enter(rule);
	}

	solve(rules: number[], budget: object) {
		return this.sat.solve(
			rules.map((i) => this.switches[i]),
			budget,
		);
	}

	failed(): number[] {
		const core = new Set(this.sat.core());
		return [...this.switches.keys()].filter((i) => core.has(this.switches[i]));
	}

	private has(region: number, ink: number): number {
		return (this.first.get(region) as number) + ink;
	}

	private enter(rule: Rule): void {
		if (rule.kind === 'inks') return;
		const off = -this.sat.newVariable();
		this.switches.push(-off);
		if ('region' in rule) {
			this.sat.addClause([off, -this.has(rule.region, rule.ink)]);
			return;
		}
		for (let ink = 0; ink < this.inks; ink++) {
			const a = this.has(rule.a, ink);
			const b = this.has(rule.b, ink);
			if (rule.kind !== 'alike') this.sat.addClause([off, -a, -b]);
			else {
				this.sat.addClause([off, -a, b]);
				this.sat.addClause([off, a, -b]);
			}
		}
	}
}
