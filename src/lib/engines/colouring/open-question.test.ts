import { describe, expect, it } from 'vitest';
import { gainOf, openQuestion, type Standing } from './open-question.ts';
import { checkBound, proveBound } from './prove-bound.ts';
import type { Release } from './problem.ts';

const coloured = (inksUsed: number, lowerBound: number, proved = false): Standing => ({
	...{ status: 'coloured', inksUsed, lowerBound },
	proof: { kind: proved ? 'clique' : 'not-proved', regions: [] },
});
const impossible = (release: Partial<Release> | null): Standing => ({
	status: 'impossible',
	explanation: {
		...{ locks: [1], rules: [], regions: [1], inksThatWouldDo: null },
		release: release && { locks: [1], cost: 3, proved: false, lowerBound: 1, ...release },
	},
});
const undecided = (lowerBound: number): Standing => ({ status: 'undecided', lowerBound });

describe('what an answer leaves open', () => {
	it.each([
		[coloured(8, 7), 'fewest', 'inks'],
		[coloured(7, 7), 'fewest', 'inks'],
		[coloured(7, 7, true), 'fewest', null],
		[coloured(8, 7), 8, null],
		[undecided(5), 6, 'answer'],
		[impossible({}), 4, 'release'],
		[impossible({ proved: true }), 4, null],
		[impossible(null), 4, null],
	] as const)('%#', (standing, inks, open) => expect(openQuestion(standing, inks)).toBe(open));
});

describe('how a later answer is better', () => {
	it.each([
		[coloured(8, 6), coloured(7, 6), 'fewer-inks'],
		[coloured(7, 6), coloured(8, 8, true), null],
		[coloured(7, 6), coloured(7, 7, true), 'proof'],
		[coloured(7, 7, true), coloured(7, 6), null],
		[coloured(8, 6), coloured(8, 7), 'higher-bound'],
		[coloured(8, 7), coloured(8, 7), null],
		[undecided(5), coloured(6, 5), 'answer'],
		[undecided(5), impossible({}), 'answer'],
		[undecided(5), undecided(6), 'higher-bound'],
		[undecided(5), undecided(5), null],
		[impossible({}), impossible({ cost: 2 }), 'cheaper-release'],
		[impossible({}), impossible({ proved: true, lowerBound: 3 }), 'release-proved'],
		[impossible({}), impossible({ lowerBound: 2 }), 'release-bound'],
		[impossible({}), impossible({ cost: 4, proved: true }), null],
		[impossible({ proved: true }), impossible({ proved: true }), null],
	] as const)('%#', (before, after, gain) => expect(gainOf(before, after)).toBe(gain));
});

describe('the proof of a bound below the number of inks used', () => {
	// a wheel with a rim of five needs four inks
	const rim = [1, 2, 3, 4, 5];
	const borders = { a: [0, 0, 0, 0, 0, ...rim], b: [...rim, 2, 3, 4, 5, 1] };
	const problem = { regions: 6, borders, inks: 'fewest' } as const;

	it('is found and holds, and one for too many inks is not', () => {
		expect(checkBound(problem, 4, proveBound(problem, 4))).toEqual([]);
		expect(proveBound(problem, 5)).toMatchObject({ kind: 'not-proved' });
		expect(checkBound(problem, 5, proveBound(problem, 5))).not.toEqual([]);
		expect(checkBound(problem, 5, proveBound(problem, 4))).not.toEqual([]);
	});
});
