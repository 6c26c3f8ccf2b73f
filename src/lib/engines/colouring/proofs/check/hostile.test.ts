import { describe, expect, it } from 'vitest';
import { checkProofFile, checkProofText } from './index.ts';

/** A ring of three with a true claim of each kind that needs few words. */
const good = () => ({
	form: 'merestone proof 1',
	regions: [{ key: 'a', name: 'A' }, { key: 'b' }, { key: 'c' }],
	borders: [
		[0, 1],
		[1, 2],
		[0, 2],
	],
	rules: { locks: [], forbidden: [], alike: [], apart: [], reserved: [] },
	claims: [
		{ claim: 'inks do', inks: 3, colouring: [0, 1, 2] },
		{ claim: 'inks do not', inks: 2, evidence: { kind: 'clique', regions: [0, 1, 2] } },
	] as Record<string, unknown>[],
});

const clauses = (change: object) => ({
	claim: 'inks do not',
	inks: 2,
	evidence: {
		kind: 'clauses',
		regions: [0, 1, 2],
		inks: [0, 1],
		format: 'drup',
		clauses: '1 0\n0\n',
		...change,
	},
});

const withClaim = (claim: object) => ({ ...good(), claims: [claim] });

describe('files that are not what they say', () => {
	it('accepts the good one', () => {
		expect(checkProofFile(good())).toMatchObject({ valid: true, faults: [], gaveUp: false });
		expect(checkProofFile(withClaim(clauses({}))).valid).toBe(true);
	});

	it.each<[string, unknown]>([
		['nothing', undefined],
		['null', null],
		['a number', 7],
		['a list', []],
		['another form', { ...good(), form: 'merestone proof 2' }],
		['no claims', { ...good(), claims: [] }],
		['too many claims', { ...good(), claims: Array(9).fill(good().claims[0]) }],
		['an unknown field', { ...good(), note: 'trust me' }],
		['an unknown claim', withClaim({ claim: 'all is well' })],
		['a claim that is a list', withClaim([])],
		['a key twice', { ...good(), regions: [{ key: 'a' }, { key: 'a' }, { key: 'b' }] }],
		['a key that is a number', { ...good(), regions: [{ key: 1 }, { key: 'a' }, { key: 'b' }] }],
		['a border to nowhere', { ...good(), borders: [[0, 3]] }],
		['a border below zero', { ...good(), borders: [[-1, 0]] }],
		['a border of half numbers', { ...good(), borders: [[0.5, 1]] }],
		['a border of words', { ...good(), borders: [['0', '1']] }],
		['a border of three', { ...good(), borders: [[0, 1, 2]] }],
		['a border with itself', { ...good(), borders: [[1, 1]] }],
		['a border that is no number', { ...good(), borders: [[NaN, 1]] }],
		['endless inks', withClaim({ claim: 'inks do', inks: 1e308, colouring: [0, 1, 2] })],
		['too short a colouring', withClaim({ claim: 'inks do', inks: 3, colouring: [0, 1] })],
		['an ink out of range', withClaim({ claim: 'inks do', inks: 3, colouring: [0, 1, 3] })],
		['the same ink twice', withClaim({ claim: 'inks do', inks: 3, colouring: [0, 1, 1] })],
		['fewer inks than shown', withClaim({ ...good().claims[1], inks: 3 })],
		['a region named twice', withClaim(clauses({ regions: [0, 1, 1] }))],
		['inks left out', withClaim(clauses({ inks: [0] }))],
		['inks that are none', withClaim(clauses({ inks: [0, 5] }))],
		['an ink named twice', withClaim(clauses({ inks: [0, 0] }))],
		['clauses that do not follow', withClaim(clauses({ clauses: '0\n', regions: [0, 1] }))],
		['clauses of another kind', withClaim(clauses({ format: 'lrat' }))],
		['clauses that are a list', withClaim(clauses({ clauses: ['1 0'] }))],
		['a variable that is not there', withClaim(clauses({ clauses: '99999999 0\n0\n' }))],
		['a border that is not there', withClaim(clauses({ borders: [[0, 4]] }))],
		['borders left out that are needed', withClaim(clauses({ borders: [[0, 1]] }))],
		['a lock that is none', withClaim({ ...clauses({}), claim: 'cannot be kept', locks: [0] })],
	])('refuses %s, with a reason', (_, input) => {
		const { valid, faults } = checkProofFile(input);
		expect(valid).toBe(false);
		expect(faults.length).toBeGreaterThan(0);
		for (const fault of faults) expect(fault).toMatch(/\S.*\.$/);
	});

	it('does not look at what an object inherits', () => {
		const text = JSON.stringify({ ...good(), rules: undefined });
		const sly = text.replace('{', '{"__proto__":{"rules":{}},');
		expect(checkProofText(sly).faults[0]).toContain('__proto__');
		expect(checkProofFile(Object.create(good())).valid).toBe(false);
		expect(({} as Record<string, unknown>).rules).toBeUndefined();
	});

	it('tells a text that is not JSON, and one that is too long', () => {
		expect(checkProofText('{').faults).toEqual(['The file is not JSON.']);
		expect(checkProofText('['.repeat(1_000_000)).faults[0]).toContain('nests deeper');
		const sly = JSON.stringify(good()).replace('"A"', '"[[[[[[[[[[[[[[[[[[[[[[[[[[\\\\\\"["');
		expect(checkProofText(sly).valid).toBe(true);
		const long = checkProofText(' '.repeat(70 * 2 ** 20));
		expect(long).toMatchObject({ valid: false, gaveUp: true });
	});

	it('says that it gave up, not that it holds, when the steps run out', () => {
		const { valid, gaveUp, faults } = checkProofFile(withClaim(clauses({})), 3);
		expect([valid, gaveUp]).toEqual([false, true]);
		expect(faults[0]).toContain('gave up');
	});

	it('keeps names short and straight in its sentences', () => {
		const file = good();
		file.regions[0].name = `\u202egnp.exe\n${'x'.repeat(1000)}`;
		const [, shown] = checkProofFile(file).claims;
		expect(shown).not.toMatch(/[\u202e\n]/);
		expect(shown.length).toBeLessThan(300);
	});
});

describe('files made to take long', () => {
	const within = (milliseconds: number, input: unknown) => {
		const started = performance.now();
		const { valid } = checkProofFile(input);
		expect(performance.now() - started).toBeLessThan(milliseconds);
		return valid;
	};

	it('two million lines that say nothing new', () => {
		expect(within(60_000, withClaim(clauses({ clauses: '1 2 0\n'.repeat(2_000_000) })))).toBe(
			false,
		);
	});

	it('one line of millions of literals', () => {
		const line = `${Array.from({ length: 3_000_000 }, (_, i) => (i % 6) + 1).join(' ')} 0\n`;
		expect(within(60_000, withClaim(clauses({ clauses: line })))).toBe(false);
	});

	it('a part of more regions and inks than can be written down', () => {
		const many = 200_000;
		const file = {
			...good(),
			regions: Array.from({ length: many }, (_, i) => ({ key: String(i) })),
			borders: [],
			claims: [
				{
					...clauses({
						regions: Array.from({ length: many }, (_, i) => i),
						inks: Array.from({ length: 60_000 }, (_, i) => i),
					}),
					inks: 60_000,
				},
			],
		};
		expect(within(60_000, file)).toBe(false);
		const { gaveUp } = checkProofFile(file);
		expect(gaveUp).toBe(true);
	});

	it('a clique of all regions of a large map', () => {
		const many = 100_000;
		const regions = Array.from({ length: many }, (_, i) => i);
		const file = {
			...good(),
			regions: regions.map((i) => ({ key: String(i) })),
			claims: [{ claim: 'inks do not', inks: 3, evidence: { kind: 'clique', regions } }],
		};
		expect(within(30_000, file)).toBe(false);
	});
});
