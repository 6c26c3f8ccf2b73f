import { describe, expect, it } from 'vitest';
import { smallInstance, tryAll } from '../../../../tests/support/territory-instances.ts';
import { ruleFaults } from './check-rules.ts';
import { solveExact } from './exact.ts';
import { lowerBound } from './lower-bound.ts';
import { noPlan } from './no-plan.ts';
import { preCheck } from './pre-check.ts';
import type { Prepared } from './prepare.ts';
import { prepare } from './prepared.ts';
import { proveOrImprove } from './prove.ts';
import { reassign } from './reassign.ts';
import { relieve } from './relieve.ts';

const limits = { rounds: 100, nodes: 100_000, iterations: 1_000_000 };

/** Seeded instances that the rules do not contradict, each with what trying every plan tells. */
function* instances(from: number, to: number) {
	for (let seed = from; seed < to; seed++) {
		const instance = smallInstance(seed);
		const prepared = prepare(instance.problem);
		if ('status' in prepared || preCheck(prepared)) continue;
		yield { seed, instance, prepared, tried: tryAll(instance, prepared.steps) };
	}
}

const costOf = ({ problem, cost }: Prepared, assignment: Int32Array) =>
	assignment.reduce((sum, to, unit) => sum + (problem.today[unit] === to ? 0 : cost[unit]), 0);

describe('solveExact', () => {
	it('finds the cheapest plan or that there is none, as trying every plan does', async () => {
		const seen = { optimal: 0, infeasible: 0, limit: 0 };
		for (const { seed, instance, prepared, tried } of instances(0, 70)) {
			const outcome = await solveExact(prepared, { least: 'moves' }, limits);
			seen[outcome.status]++;
			const value = outcome.status === 'optimal' ? outcome.value : Infinity;
			expect(value, `seed ${seed}`).toBeCloseTo(tried.cost, 6);
			if (outcome.status !== 'optimal') continue;
			expect(ruleFaults(instance.problem, outcome.assignment), `seed ${seed}`).toEqual([]);
			expect(costOf(prepared, outcome.assignment)).toBeCloseTo(tried.cost, 6);
		}
		expect(seen.limit).toBe(0);
		expect(seen.optimal).toBeGreaterThan(30);
		expect(seen.infeasible).toBeGreaterThan(1);
	});
});

describe('proveOrImprove', () => {
	it('proves the cheapest and betters any other', async () => {
		for (const { seed, prepared, tried } of instances(200, 235)) {
			if (!tried.best || !tried.worst) continue;
			const best = { assignment: tried.best, cost: tried.cost };
			const proof = await proveOrImprove(prepared, best);
			expect(proof, `seed ${seed}`).toMatchObject({ proved: true, cost: tried.cost });
			const worst = { assignment: tried.worst, cost: costOf(prepared, tried.worst) };
			const better = await proveOrImprove(prepared, worst);
			expect(better, `seed ${seed}`).toMatchObject({ proved: true, cost: tried.cost });
		}
	});

	it('never says more than it knows when the budget is short', async () => {
		for (const { seed, prepared, tried } of instances(240, 260)) {
			if (!tried.worst) continue;
			const worst = { assignment: tried.worst, cost: costOf(prepared, tried.worst) };
			const cancelled = () => true;
			const answer = await proveOrImprove(prepared, worst, { cancelled });
			if (!answer || 'impossible' in answer) throw new Error(`seed ${seed}: a plan was known`);
			expect(answer.lowerBound, `seed ${seed}`).toBeLessThanOrEqual(tried.cost + 1e-9);
			if (answer.proved) expect(answer.cost).toBeCloseTo(tried.cost, 6);
		}
	});
});

describe('reassign', () => {
	it('deals two territories out anew, the others left alone, never dearer', async () => {
		let bettered = 0;
		for (const { seed, instance, prepared, tried } of instances(600, 630)) {
			const { worst } = tried;
			if (!worst) continue;
			const chosen = [worst[0], worst.find((t) => t !== worst[0]) ?? worst[0]];
			const dealt = await reassign(prepared, worst, chosen, { sound: true });
			if (!dealt) continue;
			bettered++;
			expect(ruleFaults(instance.problem, dealt), `seed ${seed}`).toEqual([]);
			expect(costOf(prepared, dealt)).toBeLessThan(costOf(prepared, worst));
			const others = dealt.every((t, unit) => chosen.includes(worst[unit]) || t === worst[unit]);
			expect(others, `seed ${seed}`).toBe(true);
		}
		expect(bettered).toBeGreaterThan(3);
	});
});

describe('lowerBound', () => {
	it('is never above the cheapest plan', async () => {
		let met = 0;
		let all = 0;
		for (const { seed, prepared, tried } of instances(300, 420)) {
			if (!tried.best) continue;
			for (const rings of [1, 2, 3] as const) {
				const { value } = await lowerBound(prepared, { rings });
				expect(value, `seed ${seed}, ${rings} rings`).toBeLessThanOrEqual(tried.cost + 1e-9);
			}
			const { value } = await lowerBound(prepared);
			all++;
			if (value > tried.cost - 1e-9) met++;
		}
		expect(all).toBeGreaterThan(50);
		expect(met / all).toBeGreaterThan(0.4);
	});
});

describe('noPlan', () => {
	it('claims nothing where there is a plan, and what it says would help does', async () => {
		let claims = 0;
		for (const { seed, instance, prepared, tried } of instances(500, 535)) {
			const claim = await noPlan(prepared, null);
			expect(claim !== null, `seed ${seed}`).toBe(tried.plans === 0);
			if (!claim) continue;
			claims++;
			for (const relief of claim.relief) {
				const problem = relieve(instance.problem, relief);
				const eased = problem && prepare(problem);
				if (!eased || 'status' in eased) throw new Error(`seed ${seed}: no such relief`);
				const again = tryAll({ ...instance, problem: eased.problem }, eased.steps);
				expect(again.plans, `seed ${seed} ${JSON.stringify(relief)}`).toBeGreaterThan(0);
				if (relief.kind !== 'tolerance') continue;
				const less = relieve(instance.problem, { ...relief, value: relief.value - 0.001 });
				const short = tryAll({ ...instance, problem: less! }, prepared.steps);
				expect(short.plans, `seed ${seed} ${JSON.stringify(relief)}`).toBe(0);
			}
		}
		expect(claims).toBeGreaterThan(1);
	});
});
