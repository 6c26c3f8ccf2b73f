import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { replaceRules, rulesFromCsv, rulesToCsv, type RulesRead } from './rules-csv.ts';

const plain = {
	keys: ['01', '02', '03', '04'],
	names: ['Nord', 'Süd', 'Süd', ''],
	inks: ['Ochre', 'Blue', '3'],
};
const head = 'rule,region,other region,ink,weight,group';
const read = (text: string | Uint8Array, ground = plain) => {
	const found = rulesFromCsv(text, ground);
	if (found.status === 'refused') throw new Error(found.message);
	return found;
};
const faults = (...lines: string[]) =>
	read([head, ...lines].join('\r\n')).faults.map(({ row, words }) => `${row}: ${words}`);

/** Texts that do harm in a spreadsheet or to a parser of tables. */
const hostile = fc.oneof(
	fc.constantFrom(
		...[
			'=1+1',
			"'=1+1",
			"''=1",
			'-5',
			"'-5",
			'+44',
			'@SUM(A1)',
			'\t=1',
			'\r\n',
			'a;b',
			'a,b',
			'"',
			'""',
		],
		...[
			'a"b',
			'x\ny',
			'x\r\ny',
			' lead',
			'trail ',
			'\ufeffmark',
			'＝1',
			'__proto__',
			'constructor',
			"'",
			'0',
		],
	),
	fc.string({ unit: 'grapheme', minLength: 1, maxLength: 8 }),
);
const text = hostile.filter((word) => word.trim() !== '');

/** Regions with hostile keys, and a draft of any rules about them, none said twice. */
const ruled = fc.uniqueArray(text, { minLength: 3, maxLength: 8 }).chain((keys) => {
	const key = fc.constantFrom(...keys);
	const pairs = fc.uniqueArray(
		fc.tuple(key, key).filter(([a, b]) => a !== b),
		{ maxLength: 4, selector: (pair) => JSON.stringify([...pair].sort()) },
	);
	return fc.record({
		keys: fc.constant(keys),
		names: fc.array(fc.oneof(fc.constant(''), text), {
			minLength: keys.length,
			maxLength: keys.length,
		}),
		locks: fc.uniqueArray(
			fc.record({
				key,
				ink: fc.nat(255),
				cost: fc.double({ min: 1e-9, max: 1e9, noNaN: true }),
			}),
			{ selector: (lock) => lock.key },
		),
		forbidden: fc.uniqueArray(fc.record({ key, ink: fc.nat(255) }), {
			selector: (rule) => JSON.stringify(rule),
		}),
		...{ alike: pairs, apart: pairs },
		groups: fc.uniqueArray(
			fc.record({
				kind: fc.constantFrom('alike' as const, 'different' as const),
				name: text,
				keys: fc.uniqueArray(key, { minLength: 2 }),
			}),
			{ selector: ({ kind, name }) => JSON.stringify([kind, name]) },
		),
		reserved: fc.uniqueArray(fc.nat(255), { maxLength: 4 }),
	});
});

const semicolons = (csv: string) =>
	Papa.unparse(Papa.parse<string[]>(csv, { skipEmptyLines: true }).data, { delimiter: ';' });

describe('rules as a table', () => {
	it('come back the very same, however a spreadsheet parts the cells', () => {
		fc.assert(
			fc.property(ruled, ({ keys, names, locks, ...lists }) => {
				const draft = blankDraft({
					...lists,
					locks: Object.fromEntries(locks.map(({ key, ...lock }) => [key, lock])),
				});
				const csv = rulesToCsv(draft, new Map(keys.map((key, i) => [key, names[i]])));
				const ground = { keys, names, inks: ['One', 'Two'] };
				for (const written of [csv, `\ufeff${csv}`, semicolons(csv), `sep=,\r\n${csv}`]) {
					const found = read(written, ground);
					expect(found.faults).toEqual([]);
					expect(replaceRules(blankDraft(), found.parts)).toEqual(draft);
				}
			}),
			{ numRuns: 150 },
		);
	});

	it('never hold a cell that a spreadsheet would run', () => {
		// OWASP, CSV Injection: = + - @, tab and carriage return begin a formula
		fc.assert(
			fc.property(ruled, ({ keys, names, groups, alike }) => {
				const csv = rulesToCsv(
					blankDraft({ groups, alike }),
					new Map(keys.map((key, i) => [key, names[i]])),
				);
				for (const cell of Papa.parse<string[]>(csv).data.flat()) {
					if (!/^[-+]?\d+(\.\d+)?$/.test(cell)) expect(cell).not.toMatch(/^[=+\-@\t\r]/);
				}
			}),
		);
	});

	it('are told in plain words, inks from 1', () => {
		const draft = blankDraft({
			locks: { '01': { ink: 1, cost: 2.5, by: 'Ann' }, '02': { ink: 0, cost: 1, tie: 7 } },
			groups: [{ kind: 'different', name: 'Coast', keys: ['01', '03'] }],
			reserved: [0],
		});
		expect(rulesToCsv(draft, new Map([['01', 'Nord']])).split('\r\n')).toEqual([
			'rule,region,name,other region,other name,ink,weight,group',
			'lock,01,Nord,,,2,2.5,',
			'all different,01,Nord,,,,,Coast',
			'all different,03,,,,,,Coast',
			'reserved ink,,,,,1,,',
			'',
		]);
	});
});

describe('rules from a table', () => {
	it('take names that one region has, names of inks, decimal commas and any order of columns', () => {
		const found = read(
			'Weight;INK;Region;Rule\n2,5;blue;Nord;Lock\n;2;04;forbidden ink\n;3;01;forbidden ink\n',
		);
		expect(found.parts.locks).toEqual({ '01': { ink: 1, cost: 2.5 } });
		expect(found.parts.forbidden).toEqual([
			{ key: '04', ink: 1 },
			{ key: '01', ink: 2 },
		]);
		expect(found.counts).toMatchObject({ rows: 3, locks: 1, forbidden: 2, groups: 0 });
	});

	it('are read as UTF-16, as some spreadsheets save', () => {
		const wide = new Uint16Array(
			[...`\ufeff${head}\r\nlock,Nord,,1,,`].map((c) => c.charCodeAt(0)),
		);
		expect(read(new Uint8Array(wide.buffer)).parts.locks).toEqual({ '01': { ink: 0, cost: 1 } });
	});

	it('name what is wrong, row by row, and take the others', () => {
		expect(
			faults(
				'lock,01,,9999,,',
				'lock,Süd,,1,,',
				'lock,05,,1,,',
				'lock,01,,1,0,',
				'lock,01,,green,,',
				'lock,01,,1,,',
				'lock,01,,2,,',
				'keep alike,01,01,,,',
				'keep apart,01,,,,',
				'all alike,01,,,,',
				'all different,01,,,,Coast',
				'hatched,01,,,,',
			),
		).toEqual([
			'2: inks are numbered from 1 to 256',
			'3: several regions are called “Süd”',
			'4: there is no region “05”',
			'5: a weight is a number above 0 and up to 1,000,000,000, not “0”',
			'6: the palette has no ink “green”',
			'8: “01” has another lock already',
			'9: a region is paired with itself',
			'10: no region is named',
			'11: the group has no name',
			'12: the group “Coast” has one region only',
			'13: the rule must be one of: lock, forbidden ink, keep alike, keep apart, all alike, all different, reserved ink',
		]);
		expect(read(`${head}\nlock,x,,1,,\nlock,04,,1,,`).parts.locks).toEqual({
			'04': { ink: 0, cost: 1 },
		});
	});

	it('of a group that is too large to differ are refused from the 65th on', () => {
		const keys = Array.from({ length: 70 }, (_, i) => `k${i}`);
		const lines = keys.map((key) => `all different,${key},,,,Coast`);
		const found = read([head, ...lines].join('\n'), { ...plain, keys, names: keys });
		expect(found.parts.groups[0].keys).toHaveLength(64);
		expect(found.faults).toHaveLength(6);
	});

	it.each([
		['nothing', ''],
		['other columns', 'a,b,c\n1,2,3'],
		['a quotation mark that is never closed', `${head}\nlock,"01,,1,,\nlock,02,,1,,`],
	])('are refused where there is %s', (_case, written) => {
		expect(rulesFromCsv(written, plain)).toMatchObject({
			status: 'refused',
		} satisfies Partial<RulesRead>);
	});
});
