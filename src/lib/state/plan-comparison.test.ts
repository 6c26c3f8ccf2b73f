import { describe, expect, it } from 'vitest';
import { noTerritories } from '$lib/engines/territories/territory-draft';
import type { DeskProposal } from '$lib/schemas/desk-territories';
import { comparePlans } from './compared-plans';
import { comparisonRows } from './plan-comparison';

/** A row of six regions, three with North and three with South; visits 10, 20, 30, 25, 10, 5. */
const visits = '00000000-0000-4000-8000-000000000001';
const keys = ['a', 'b', 'c', 'd', 'e', 'f'];
const ground = {
	keys,
	borders: {
		a: Uint32Array.of(0, 1, 2, 3, 4),
		b: Uint32Array.of(1, 2, 3, 4, 5),
		kind: new Uint8Array(5),
		metres: new Float64Array(5).fill(100),
		at: new Float64Array(10),
	},
	measures: [{ id: visits, name: 'Visits', unit: '', values: [10, 20, 30, 25, 10, 5] }],
};
const territory = (key: string, name: string) => ({
	...{ key, name, person: '', email: '', base: null, capacity: 1 },
	...{ frozen: false, vacant: false, closing: false },
});
const draft = {
	...noTerritories,
	territories: [territory('n', 'North'), territory('s', 'South')],
	assignment: { a: 'n', b: 'n', c: 'n', d: 's', e: 's', f: 's' },
	wishes: { ...noTerritories.wishes, tolerances: { [visits]: 0.1 } },
};
const proposal = (number: number, assignment: number[], tolerance: number) =>
	({
		...{ number, name: `Proposal ${number}`, territoryKeys: ['s', 'n'], assignment },
		wishes: { ...draft.wishes, tolerances: { [visits]: tolerance } },
		outcome: { cost: 1, lowerBound: 1, proved: true },
	}) as unknown as DeskProposal;

describe('plans side by side', () => {
	// by the proposal's own list South is 0 and North is 1
	const balanced = proposal(1, [1, 1, 0, 0, 0, 0], 0.4);
	const shifted = proposal(2, [1, 0, 1, 0, 0, 0], 0.1);
	const { plans, measures } = comparePlans(ground, draft, null, [balanced, shifted]);
	const row = (label: string) =>
		comparisonRows(plans, measures).find((one) => one.label === label)!;

	it('numbers each plan by today’s territories and judges it by its own tolerance', () => {
		// North 60 of 50 today; 30 of 50 and 40 of 50 proposed
		expect(row('Visits: largest deviation').cells).toEqual(['20.0 %', '40.0 %', '20.0 %']);
		expect(row('Territories outside').cells).toEqual(['2', 'none', '2']);
	});

	it('tells torn territories, moves and cut borders', () => {
		expect(row('Territories torn').cells).toEqual(['none', 'none', '2']);
		expect(row('Regions moved').cells).toEqual(['none', '1 (16.7 %)', '1 (16.7 %)']);
		expect(row('Borders between territories').cells).toEqual(['1', '1', '3 (+2)']);
	});

	it('points out the least of the proposals, never today', () => {
		expect(row('Visits: largest deviation').best).toEqual([2]);
		expect(row('Regions moved').best).toEqual([]);
		expect(row('At least needed').cells).toEqual(['', '1: proved fewest', '1: proved fewest']);
	});
});
