import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layout } from '../../../../../tests/support/sheets.ts';
import type { SheetLayout } from '../layout.ts';
import { templateDifferences, templateOf, withTemplate } from './template.ts';

const mark = { id: 't1', name: 'House' };
const block = {
	...{ text: 'Bay', xMm: 1, yMm: 2, widthMm: 30, sizePt: 9, ground: false },
	face: 'serif-italic' as const,
};
const other: SheetLayout = {
	...layout,
	title: 'Another',
	paper: 'A3',
	projection: 'albers',
	credits: 'Ours',
	frame: { ...layout.frame, ratio: 500_000, centre: [10, 50], sea: '#d0e0f0', insetChoices: {} },
	lettering: { ...layout.lettering, sizePt: 7, hidden: ['a'], abbreviations: { a: 'b' } },
	lines: { ...layout.lines, region: { widthMm: 0.2, hex: '#222222', dashMm: [1, 1] } },
	collar: { ...layout.collar, legendAt: 'right', legendTitle: 'Wards', blocks: [block] },
};

describe('a template', () => {
	it('holds nothing that belongs to one sheet', () => {
		const text = JSON.stringify(templateOf(other));
		for (const own of ['Another', 'Wards', 'Bay', '500000', 'abbreviations', 'hidden', 'centre'])
			expect(text).not.toContain(own);
		expect(Object.keys(templateOf(other))).not.toContain('groupColumn');
	});

	it('sets another sheet alike and leaves what is its own', () => {
		const set = withTemplate(layout, templateOf(other), mark);
		expect(templateDifferences(set, templateOf(other))).toEqual([]);
		expect(set).toMatchObject({
			title: layout.title,
			paper: 'A3',
			lines: other.lines,
			collar: { legendAt: 'right', legendTitle: '', blocks: [], template: mark },
			frame: { sea: '#d0e0f0', ratio: null, centre: null },
		});
	});

	it('takes back parallels of a projection that goes', () => {
		const own = { ...layout, frame: { ...layout.frame, parallels: [40, 50] as [number, number] } };
		expect(withTemplate(own, templateOf(other), mark).frame.parallels).toBeNull();
		expect(withTemplate(own, templateOf(layout), mark).frame.parallels).toEqual([40, 50]);
	});

	it('says which fields differ, and none after setting, whatever differed', () => {
		const fields = Object.keys(templateOf(other));
		fc.assert(
			fc.property(fc.subarray(fields), (some) => {
				const theirs = templateOf(other);
				const mixed = { ...templateOf(layout) };
				for (const field of some) mixed[field] = theirs[field];
				const told = templateDifferences(layout, mixed).map(({ field }) => field);
				const expected = some.filter(
					(field) => JSON.stringify(theirs[field]) !== JSON.stringify(templateOf(layout)[field]),
				);
				expect(told.sort()).toEqual(expected.sort());
				expect(templateDifferences(withTemplate(layout, mixed, mark), mixed)).toEqual([]);
			}),
		);
	});

	it('of an earlier time, or with fields of nowhere, changes only what is known', () => {
		const odd = {
			...{ paper: 'A5', 'frame.tilt': 3, 'collar.blocks': [block], nothing: 1 },
			...{ constructor: 2, toString: 'x' },
		};
		const set = withTemplate(layout, odd, null);
		expect(set).toEqual({ ...layout, paper: 'A5' });
	});
});
