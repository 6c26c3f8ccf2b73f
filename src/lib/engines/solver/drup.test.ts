import { describe, expect, it } from 'vitest';
import { checkDrup } from './drup.ts';

/** All eight sign patterns over three variables but for two: a refutation needs real lines. */
const clauses = [
	[1, 2, -3],
	[-1, -2, 3],
	[2, 3, -4],
	[-2, -3, 4],
	[-1, -3, -4],
	[1, 3, 4],
	[-1, 2, 4],
	[1, -2, -4],
];

describe('checkDrup', () => {
	it('accepts the worked example of the DRUP format (Heule, Hunt and Wetzler 2013)', () => {
		expect(checkDrup(clauses, '1 2 0\n1 0\n2 0\n0\n')).toEqual({ valid: true });
		expect(checkDrup(clauses, '1 2 0\nd 1 2 -3 0\n1 0\nd 1 2 0\n2 0\n0')).toEqual({ valid: true });
	});

	it('names the first line that does not follow', () => {
		expect(checkDrup(clauses, '0\n')).toEqual({ valid: false, reason: 'line 1 does not follow' });
		expect(checkDrup(clauses, '1 2 0\n-1 0\n0\n').reason).toBe('line 2 does not follow');
		expect(checkDrup(clauses, '1 2 0\nd 1 -2 -4 0\n1 0\n').reason).toBe('line 3 does not follow');
	});

	it('refuses a proof that stops short, and one that is no proof', () => {
		expect(checkDrup(clauses, '1 2 0\n').valid).toBe(false);
		expect(checkDrup(clauses, '').valid).toBe(false);
		expect(checkDrup(clauses, '1 2\n').reason).toBe('line 1 is not a clause');
		expect(checkDrup(clauses, '1 x 0\n').reason).toBe('line 1 is not a clause');
		expect(checkDrup([[0]], '0').reason).toBe('a clause holds no literal');
		expect(checkDrup([[1, 2]], '0').valid).toBe(false);
	});

	it('sees contradictions that need no line', () => {
		expect(checkDrup([[1], [-1]], '')).toEqual({ valid: true });
		expect(checkDrup([[1], [-1, 2], [-2]], '')).toEqual({ valid: true });
		expect(checkDrup([[]], '')).toEqual({ valid: true });
	});

	it('is not fooled by repeated literals and clauses that are always true', () => {
		expect(
			checkDrup(
				[
					[1, 1],
					[2, -2],
					[-1, 3, 3],
				],
				'3 0\n',
			).valid,
		).toBe(false);
		expect(
			checkDrup(
				[
					[1, 1],
					[-1, -1],
				],
				'',
			).valid,
		).toBe(true);
	});
});

describe('checkDrup within limits', () => {
	const proof = '1 2 0\n1 0\n2 0\n0\n';

	it('gives up rather than telling, when steps or room run out', () => {
		for (const limits of [{ steps: 3 }, { steps: 30 }, { literals: 2 }]) {
			const { valid, gaveUp } = checkDrup(clauses, proof, limits);
			expect(valid).toBe(false);
			expect(gaveUp).toBe(true);
		}
		expect(checkDrup(clauses, proof, { steps: 1000, literals: 100, variables: 4 })).toEqual({
			valid: true,
		});
	});

	it('makes no tables for variables that the clauses do not have', () => {
		expect(checkDrup(clauses, '268435456 0\n', { variables: 4 }).reason).toBe(
			'line 1 is not a clause',
		);
	});

	it('takes whole numbers in plain form only, as other tools do', () => {
		for (const line of ['1e0 0', '0x1 0', '+1 0', '1.0 0', '- 1 0', '1 -0']) {
			expect(checkDrup(clauses, line).reason).toBe('line 1 is not a clause');
		}
	});

	it('is done in time with a clause of 200,000 literals', () => {
		const long = Array.from({ length: 200_000 }, (_, i) => i + 1).join(' ');
		expect(checkDrup([[1]], `${long} 0\n`, { variables: 200_000 }).valid).toBe(false);
	});
});
