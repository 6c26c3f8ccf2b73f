import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { feasible } from '../../../../../tests/support/brute-force.ts';
import { colour, type ColouringProblem } from '../index.ts';
import { checkProofFile } from './check/index.ts';
import { proofFile } from './proof-file.ts';
import type { Claim, ProofFile } from './proof-form.ts';

const map = fc.integer({ min: 3, max: 7 }).chain((regions) => {
	const region = fc.nat(regions - 1);
	const pairs = (maxLength: number) =>
		fc
			.array(fc.tuple(region, region), { maxLength })
			.map((list) => list.filter(([a, b]) => a !== b));
	return fc.record({
		regions: fc.constant(regions),
		borders: pairs(16),
		apart: pairs(2),
		alike: pairs(2),
		forbidden: fc.array(fc.tuple(region, fc.nat(3)), { maxLength: 4 }),
		reserved: fc.array(fc.nat(4), { maxLength: 2 }),
		locks: fc.array(fc.integer({ min: -6, max: 3 }), { minLength: regions, maxLength: regions }),
		inks: fc.oneof(fc.constant('fewest' as const), fc.integer({ min: 1, max: 4 })),
	});
});

const problemOf = (
	given: typeof map extends fc.Arbitrary<infer T> ? T : never,
): ColouringProblem => ({
	...given,
	borders: { a: given.borders.map((p) => p[0]), b: given.borders.map((p) => p[1]) },
	locks: Int32Array.from(given.locks, (ink) => Math.max(ink, -1)),
});

const names = (regions: number) => Array.from({ length: regions }, (_, i) => ({ key: `k${i}` }));

async function fileOf(problem: ColouringProblem) {
	return proofFile(problem, await colour(problem), names(problem.regions));
}

describe('proof files of random maps', () => {
	it('are accepted, whatever the answer', async () => {
		const seen = new Set<string>();
		await fc.assert(
			fc.asyncProperty(map, async (given) => {
				const file = await fileOf(problemOf(given));
				expect(file).not.toBeNull();
				const { faults, valid } = checkProofFile(JSON.parse(JSON.stringify(file)));
				expect(faults).toEqual([]);
				expect(valid).toBe(true);
				for (const claim of (file as ProofFile).claims) {
					seen.add('evidence' in claim ? `${claim.claim}, ${claim.evidence.kind}` : claim.claim);
				}
			}),
			{ numRuns: 300 },
		);
		for (const kind of ['works without', 'cannot be kept, clauses', 'inks do not, clauses']) {
			expect(seen).toContain(kind);
		}
	});

	/** Trying everything is the judge of what a spoilt file still claims. */
	it('are accepted after they were spoilt only if what they claim is true', async () => {
		let accepted = 0;
		let refused = 0;
		await fc.assert(
			fc.asyncProperty(map, fc.array(fc.nat(10_000), { minLength: 3 }), async (given, dice) => {
				const file = await fileOf(problemOf(given));
				const spoilt = spoil(JSON.parse(JSON.stringify(file)) as Spoilable, dice);
				const { valid } = checkProofFile(spoilt);
				if (valid) {
					accepted++;
					for (const claim of spoilt.claims) expect(isTrue(spoilt as ProofFile, claim)).toBe(true);
				} else refused++;
			}),
			{ numRuns: 600 },
		);
		expect(accepted).toBeGreaterThan(20);
		expect(refused).toBeGreaterThan(100);
	});
});

interface Spoilable extends Omit<ProofFile, 'borders' | 'rules'> {
	borders: [number, number][];
	rules: Record<'locks' | 'forbidden' | 'alike' | 'apart', [number, number][]> & {
		reserved: number[];
	};
}

/** Takes rules away, adds some, and turns the numbers of the claims. */
function spoil(file: Spoilable, dice: number[]): Spoilable {
	const { rules, claims, borders } = file;
	const many = file.regions.length;
	for (const [i, throwOf] of dice.entries()) {
		const [what, where, ink] = [throwOf % 9, Math.floor(throwOf / 9), (throwOf + i) % 4];
		const list = [borders, rules.locks, rules.forbidden, rules.alike, rules.apart][what];
		if (list) list.splice(where % (list.length + 1), 1);
		const claim = claims[where % claims.length];
		if (what === 5) rules.reserved.push(ink);
		if (what === 6 && claim.inks !== 'any') claim.inks = Math.max(0, claim.inks - 1 + (ink % 3));
		if (what === 7 && 'colouring' in claim) claim.colouring[where % many] = ink;
		if (what === 8 && 'evidence' in claim) {
			const { evidence } = claim;
			evidence.regions[where % (evidence.regions.length + 1)] = ink % many;
			if (evidence.kind === 'clauses' && ink === 0) evidence.inks.pop();
			if (evidence.kind === 'clauses' && ink === 1) {
				evidence.clauses = evidence.clauses.split('\n').slice(1).join('\n');
			}
		}
	}
	return file;
}

function isTrue(file: ProofFile, claim: Claim): boolean {
	const { regions, borders, rules } = file;
	const dropped = new Set(claim.claim === 'works without' ? claim.locks : []);
	const standing = rules.locks.filter(([region]) => !dropped.has(region));
	const held = claim.claim === 'cannot be kept' ? new Set(claim.locks) : null;
	const locks = new Int32Array(regions.length).fill(-1);
	for (const [region, ink] of standing) if (!held || held.has(region)) locks[region] = ink;
	const problem: ColouringProblem = {
		regions: regions.length,
		borders: { a: borders.map((p) => p[0]), b: borders.map((p) => p[1]) },
		inks: 'fewest',
		locks,
		alike: rules.alike,
		apart: rules.apart,
		forbidden: [...rules.forbidden, ...reservedBans(file, standing)],
	};
	if (claim.claim === 'cannot be kept')
		return !feasible(problem, claim.inks === 'any' ? 9 : claim.inks);
	return feasible(problem, claim.inks) === (claim.claim !== 'inks do not');
}

function reservedBans(
	{ regions, rules }: ProofFile,
	standing: readonly (readonly [number, number])[],
) {
	const group = regions.map((_, i) => i);
	for (let round = 0; round < regions.length; round++) {
		for (const [a, b] of rules.alike) group[a] = group[b] = Math.min(group[a], group[b]);
	}
	return rules.reserved.flatMap((ink) => {
		const holds = (r: number) =>
			standing.some(([l, other]) => other === ink && group[l] === group[r]);
		return group.flatMap((_, r): [number, number][] => (holds(r) ? [] : [[r, ink]]));
	});
}
