import { describe, expect, it } from 'vitest';
import { inkRows, keptPalette, rowsOf, typedPalette } from './palette-form';

const formOf = (rows: Record<string, string>[]) => {
	const form = new FormData();
	for (const row of rows) {
		const whole = { ...rowsOf([{ name: '', hex: '' }])[0], ...row };
		for (const [name, value] of Object.entries(whole)) form.append(`ink-${name}`, value);
	}
	return form;
};
const read = (rows: Record<string, string>[]) =>
	typedPalette.safeParse({ name: 'Typed', rows: inkRows(formOf(rows)) });

describe('a palette that is typed', () => {
	it('keeps names, values, what is fixed, and hatches', () => {
		const inks = [
			{ name: 'Poppy', hex: '#e41a1c', fixed: true as const },
			{
				...{ name: 'Leather', hex: '#a65628' },
				hatch: {
					kind: 'crossed' as const,
					angle: 30,
					spacingMm: 2.5,
					widthMm: 0.3,
					hex: '#ffffff',
				},
			},
		];
		expect(read(rowsOf(inks).map((row) => ({ ...row }))).data?.rows).toEqual(inks);
	});

	it('leaves out empty rows and names what has no name', () => {
		expect(read([{}, { hex: 'E41A1C' }, {}]).data?.rows).toEqual([
			{ name: 'Ink 1', hex: '#e41a1c' },
		]);
	});

	it.each([
		[[{}], 'one ink at least'],
		[[{ hex: 'red' }], 'Ink 1: “red” is not a colour'],
		[[{ hex: '#fff', hatch: 'lines', spacing: 'x' }], 'in numbers'],
		[[{ hex: '#fff', hatch: 'lines', spacing: '0.1' }], '0.4 to 50 mm apart'],
		[[{ hex: '#fff', hatch: 'lines', line: 'ink' }], 'the colour of its hatch'],
		[Array.from({ length: 65 }, () => ({ hex: '#fff' })), 'at most 64 inks'],
	])('is refused in words: %j', (rows, words) => {
		expect(read(rows).error?.issues[0].message).toContain(words);
	});
});

describe('a sheet’s inks sent to be kept', () => {
	it.each(['', '{', '[]', '[{"hex":"red","name":""}]', '[{"hex":"#ffffff","name":"a","more":1}]'])(
		'are refused where they are not inks: %s',
		(inks) => expect(keptPalette.safeParse({ name: 'A', inks }).success).toBe(false),
	);
	it('name the revision of the palette that they are kept over', () => {
		const inks = JSON.stringify([{ name: 'a', hex: '#ffffff' }]);
		const over = '7b2a1c1e-4c7e-4a7c-9a53-0c1d2e3f4a5b';
		expect(keptPalette.safeParse({ over, inks, revision: '4' }).data?.revision).toBe(4);
		expect(keptPalette.safeParse({ over, inks, revision: 'x' }).success).toBe(false);
	});
	it('are read', () => {
		const inks = [{ name: 'a', hex: '#ffffff', fixed: true }];
		expect(keptPalette.safeParse({ over: '', name: 'A', inks: JSON.stringify(inks) }).data).toEqual(
			{
				...{ over: '', name: 'A' },
				inks,
			},
		);
	});
});
