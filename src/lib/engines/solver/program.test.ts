import { describe, expect, it } from 'vitest';
import { ProgramBuilder } from './program-builder.ts';
import { boundFromPrices, provesInfeasible } from './program-certificates.ts';
import { solveProgram } from './program.ts';
import { randomFrom } from './random.ts';

/** Items of a knapsack, weights and worths 1 to 20, half of all may be packed. */
function knapsack(items: number, seed: number) {
	const random = randomFrom(seed);
	const draw = () => 1 + Math.floor(20 * random());
	const weights = Array.from({ length: items }, draw);
	const worths = Array.from({ length: items }, draw);
	const room = Math.floor(weights.reduce((a, b) => a + b) / 2);
	const builder = new ProgramBuilder();
	const columns = worths.map((worth) => builder.whole(-worth));
	builder.row(-Infinity, room, columns, weights);
	return { program: builder.build(), weights, worths, room };
}

function bestByTrying(weights: number[], worths: number[], room: number): number {
	let best = 0;
	for (let bits = 0; bits < 1 << weights.length; bits++) {
		let weight = 0;
		let worth = 0;
		for (let i = 0; i < weights.length; i++) {
			if (!((bits >> i) & 1)) continue;
			weight += weights[i];
			worth += worths[i];
		}
		if (weight <= room) best = Math.max(best, worth);
	}
	return best;
}

/** A made-up transport task: supplies left, demands right, cost |i - j| + 1. */
function transport(size: number, spare: number) {
	const builder = new ProgramBuilder();
	const at = (i: number, j: number) => i * size + j;
	for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) builder.real(Math.abs(i - j) + 1);
	const places = Array.from({ length: size }, (_, i) => i);
	for (const i of places) {
		builder.row(
			-Infinity,
			10 + spare,
			places.map((j) => at(i, j)),
		);
	}
	for (const j of places) {
		builder.row(
			10,
			Infinity,
			places.map((i) => at(i, j)),
		);
	}
	return builder.build();
}

describe('solveProgram', () => {
	it('packs as well as trying everything', async () => {
		for (let seed = 0; seed < 12; seed++) {
			const { program, weights, worths, room } = knapsack(11, seed);
			const outcome = await solveProgram(program);
			expect(outcome.status).toBe('optimal');
			if (outcome.status !== 'optimal') return;
			expect(-outcome.objective).toBe(bestByTrying(weights, worths, room));
			expect(outcome.bound).toBeLessThanOrEqual(outcome.objective);
			expect(outcome.values.every((value) => value === 0 || value === 1)).toBe(true);
		}
	});

	it('prices a linear program so that the bound meets the cost', async () => {
		for (const interior of [false, true]) {
			const outcome = await solveProgram(transport(8, 0), { interior });
			expect(outcome.status).toBe('optimal');
			if (outcome.status !== 'optimal' || !outcome.prices) throw new Error('no prices');
			expect(outcome.objective).toBeCloseTo(80, 6);
			expect(outcome.bound).toBeCloseTo(80, 6);
			expect(outcome.bound).toBeLessThanOrEqual(outcome.objective + 1e-9);
		}
	});

	it('tells infeasible from unbounded and proves the former', async () => {
		const short = transport(5, -1);
		const outcome = await solveProgram(short);
		expect(outcome.status).toBe('infeasible');
		if (outcome.status !== 'infeasible' || !outcome.ray) throw new Error('no ray');
		expect(provesInfeasible(short, outcome.ray)).toBe(true);
		expect(provesInfeasible(transport(5, 0), outcome.ray)).toBe(false);
		const builder = new ProgramBuilder();
		builder.row(0, Infinity, [builder.real(-1)]);
		expect((await solveProgram(builder.build())).status).toBe('unbounded');
	});

	it('says when a budget or a cancel ended it, with a bound that still holds', async () => {
		const stopped = await solveProgram(transport(30, 3), { iterations: 3 });
		expect(stopped.status).toBe('limit');
		const { program } = knapsack(11, 3);
		const best = await solveProgram(program);
		const early = await solveProgram(program, { nodes: 0 });
		if (best.status !== 'optimal') throw new Error('unsolved');
		if (early.status === 'limit') expect(early.bound).toBeLessThanOrEqual(best.objective);
	});

	it('answers twice alike', async () => {
		const { program } = knapsack(30, 9);
		const first = await solveProgram(program, { nodes: 50 });
		expect(await solveProgram(program, { nodes: 50 })).toEqual(first);
	});

	it('refuses what is no program', async () => {
		const builder = new ProgramBuilder();
		builder.row(0, 1, [builder.real(1) + 5]);
		await expect(solveProgram(builder.build())).rejects.toThrow(RangeError);
	});
});

describe('boundFromPrices', () => {
	it('never exceeds the least cost, whatever the prices', async () => {
		const program = transport(6, 1);
		const random = randomFrom(4);
		for (let round = 0; round < 200; round++) {
			const prices = Array.from({ length: program.rows }, () => 4 * random() - 2);
			expect(boundFromPrices(program, prices)).toBeLessThanOrEqual(60 + 1e-9);
		}
	});
});
