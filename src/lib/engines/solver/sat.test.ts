import { createRequire } from 'node:module';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkDrup } from './drup.ts';
import { randomFrom } from './random.ts';
import { luby } from './restarts.ts';
import { Sat } from './sat.ts';

/** logic-solver 2.0.1 (npm), MiniSat compiled to JavaScript: the outside reference. */
interface Reference {
	require(formula: unknown): void;
	solve(): object | null;
}
const Logic = createRequire(import.meta.url)('logic-solver') as {
	Solver: new () => Reference;
	or(...terms: string[]): unknown;
	FALSE: unknown;
};

function reference(clauses: number[][]): boolean {
	const solver = new Logic.Solver();
	for (const clause of clauses) {
		const terms = clause.map((literal) => (literal > 0 ? `v${literal}` : `-v${-literal}`));
		solver.require(terms.length === 0 ? Logic.FALSE : Logic.or(...terms));
	}
	return solver.solve() !== null;
}

function bruteForce(variables: number, clauses: number[][]): boolean {
	for (let bits = 0; bits < 1 << variables; bits++) {
		const holds = (literal: number) =>
			((bits >> (Math.abs(literal) - 1)) & 1) === Number(literal > 0);
		if (clauses.every((clause) => clause.some(holds))) return true;
	}
	return false;
}

function load(variables: number, clauses: number[][], options = {}): Sat {
	const sat = new Sat({ proof: true, ...options });
	for (let v = 0; v < variables; v++) sat.newVariable();
	for (const clause of clauses) sat.addClause(clause);
	return sat;
}

function expectModel(sat: Sat, clauses: number[][]): void {
	const holds = (literal: number) => sat.value(Math.abs(literal)) === literal > 0;
	expect(clauses.filter((clause) => !clause.some(holds))).toEqual([]);
}

function randomClauses(variables: number, count: number, seed: number): number[][] {
	const random = randomFrom(seed);
	const literal = () => (1 + Math.floor(random() * variables)) * (random() < 0.5 ? 1 : -1);
	return Array.from({ length: count }, () => [literal(), literal(), literal()]);
}

const instance = fc.integer({ min: 1, max: 9 }).chain((variables) =>
	fc.record({
		variables: fc.constant(variables),
		clauses: fc.array(
			fc.array(
				fc
					.tuple(fc.integer({ min: 1, max: variables }), fc.boolean())
					.map(([v, yes]) => (yes ? v : -v)),
				{ maxLength: 4 },
			),
			{ maxLength: 45 },
		),
	}),
);

describe('small formulas against brute force', () => {
	it('agrees on random clauses of mixed length and proves every refusal', () => {
		fc.assert(
			fc.property(instance, ({ variables, clauses }) => {
				const sat = load(variables, clauses);
				const answer = sat.solve();
				expect(answer).toBe(bruteForce(variables, clauses) ? 'sat' : 'unsat');
				if (answer === 'sat') expectModel(sat, clauses);
				else expect(checkDrup(clauses, sat.proofText())).toEqual({ valid: true });
			}),
			{ numRuns: 400 },
		);
	});

	it('answers under assumptions, again and again, with cores that clash by themselves', () => {
		const asked = fc.array(fc.array(fc.integer({ min: -9, max: 9 }), { maxLength: 6 }), {
			maxLength: 6,
		});
		fc.assert(
			fc.property(instance, asked, ({ variables, clauses }, questions) => {
				const sat = load(variables, clauses);
				for (const question of questions) {
					const assumptions = question.filter((l) => l !== 0 && Math.abs(l) <= variables);
					const units = assumptions.map((literal) => [literal]);
					const answer = sat.solve(assumptions);
					expect(answer).toBe(bruteForce(variables, [...clauses, ...units]) ? 'sat' : 'unsat');
					if (answer === 'sat') {
						expectModel(sat, [...clauses, ...units]);
						continue;
					}
					const core = sat.core();
					expect(assumptions).toEqual(expect.arrayContaining(core));
					const blamed = [...clauses, ...core.map((literal) => [literal])];
					expect(bruteForce(variables, blamed)).toBe(false);
					expect(checkDrup(blamed, sat.proofText())).toEqual({ valid: true });
				}
			}),
			{ numRuns: 300 },
		);
	});
});

describe('larger random formulas against logic-solver', () => {
	it.each([3.8, 4.2, 4.6])('three-literal clauses at %d clauses a variable', (ratio) => {
		for (let seed = 1; seed <= 12; seed++) {
			const clauses = randomClauses(120, Math.round(120 * ratio), seed);
			const sat = load(120, clauses, { seed });
			const answer = sat.solve();
			expect(answer).toBe(reference(clauses) ? 'sat' : 'unsat');
			if (answer === 'sat') expectModel(sat, clauses);
			else expect(checkDrup(clauses, sat.proofText())).toEqual({ valid: true });
		}
	});

	it('forgets clauses on the way and stays right', () => {
		const clauses = randomClauses(200, 860, 7);
		const sat = load(200, clauses);
		expect(sat.solve()).toBe(reference(clauses) ? 'sat' : 'unsat');
		expect(sat.conflicts).toBeGreaterThan(2000);
	});
});

/** Pigeons into one hole fewer: Haken 1985. */
function pigeons(holes: number): { variables: number; clauses: number[][] } {
	const at = (pigeon: number, hole: number) => pigeon * holes + hole + 1;
	const clauses: number[][] = [];
	const all = Array.from({ length: holes }, (_, hole) => hole);
	for (let p = 0; p <= holes; p++) clauses.push(all.map((hole) => at(p, hole)));
	for (const hole of all) {
		for (let p = 0; p <= holes; p++) {
			for (let q = 0; q < p; q++) clauses.push([-at(p, hole), -at(q, hole)]);
		}
	}
	return { variables: holes * (holes + 1), clauses };
}

/** x1 + x2 = 1, x2 + x3 = 1, ... around a ring: possible only when the ring is even. */
function parityRing(length: number): number[][] {
	return Array.from({ length }, (_, i) => i).flatMap((i) => {
		const [a, b] = [i + 1, ((i + 1) % length) + 1];
		return [
			[a, b],
			[-a, -b],
		];
	});
}

/** Sums of three neighbours in a ring are odd; n odd sums of 3 x each variable. */
function parityTriples(length: number, last: number): number[][] {
	return Array.from({ length }, (_, i) => i).flatMap((i) => {
		const [a, b, c] = [i + 1, ((i + 1) % length) + 1, ((i + 2) % length) + 1];
		const wanted = i === length - 1 ? last : 1;
		const clauses: number[][] = [];
		for (let bits = 0; bits < 8; bits++) {
			const sum = (bits & 1) + ((bits >> 1) & 1) + (bits >> 2);
			if (sum % 2 === wanted) continue;
			clauses.push([bits & 1 ? -a : a, bits & 2 ? -b : b, bits & 4 ? -c : c]);
		}
		return clauses;
	});
}

describe('families with known answers', () => {
	it.each([3, 4, 5, 6, 7])('refutes %d holes for one pigeon more', (holes) => {
		const { variables, clauses } = pigeons(holes);
		const sat = load(variables, clauses);
		expect(sat.solve()).toBe('unsat');
		expect(checkDrup(clauses, sat.proofText())).toEqual({ valid: true });
	});

	it('tells even rings from odd ones', () => {
		expect(load(1000, parityRing(1000)).solve()).toBe('sat');
		const odd = parityRing(1001);
		const sat = load(1001, odd);
		expect(sat.solve()).toBe('unsat');
		expect(checkDrup(odd, sat.proofText())).toEqual({ valid: true });
	});

	it('solves sums modulo two (a ring whose length is a multiple of 3 fixes two sums)', () => {
		const fine = parityTriples(30, 1);
		const sat = load(30, fine);
		expect(sat.solve()).toBe('sat');
		expectModel(sat, fine);
		const broken = parityTriples(30, 0);
		const refuted = load(30, broken);
		expect(refuted.solve()).toBe('unsat');
		expect(checkDrup(broken, refuted.proofText())).toEqual({ valid: true });
	});
});

describe('budget, cancelling, seeds', () => {
	const hard = pigeons(11);

	it('stops at the budget of conflicts and goes on where it was', () => {
		const sat = load(hard.variables, hard.clauses);
		expect(sat.solve([], { conflicts: 100 })).toBe('unknown');
		expect(sat.conflicts).toBeLessThanOrEqual(101);
		expect(sat.solve([], { conflicts: 100 })).toBe('unknown');
	});

	it('stops when cancelled', () => {
		let asked = 0;
		const sat = load(hard.variables, hard.clauses);
		expect(sat.solve([], { cancelled: () => ++asked === 3 })).toBe('unknown');
		expect(asked).toBe(3);
	});

	it('gives the same proof for the same seed', () => {
		const clauses = randomClauses(100, 460, 5);
		const texts = [3, 3, 4].map((seed) => {
			const sat = load(100, clauses, { seed });
			sat.solve();
			return sat.proofText();
		});
		expect(texts[1]).toBe(texts[0]);
		expect(texts[2]).not.toBe(texts[0]);
	});

	it('tries wished values first', () => {
		const sat = load(3, [[1, 2, 3]]);
		for (const wish of [true, false, true]) {
			sat.setPhase(2, wish);
			sat.setPhase(1, true);
			expect(sat.solve()).toBe('sat');
			expect(sat.value(2)).toBe(wish);
		}
	});

	it('refuses literals it does not know', () => {
		const sat = load(2, []);
		expect(() => sat.addClause([3])).toThrow(RangeError);
		expect(() => sat.solve([0])).toThrow(RangeError);
		expect(() => sat.value(1)).toThrow('no assignment');
	});
});

it("follows Luby's sequence (Luby, Sinclair and Zuckerman 1993)", () => {
	const start = Array.from({ length: 15 }, (_, turn) => luby(turn));
	expect(start).toEqual([1, 1, 2, 1, 1, 2, 4, 1, 1, 2, 1, 1, 2, 4, 8]);
});
