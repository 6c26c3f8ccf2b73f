import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../tests/support/blank-draft';
import { addInk, removeInk, setInk, swapInks, whyKept } from './ink-edits';

const inks = ['#111111', '#222222', '#333333'].map((hex, i) => ({ name: `Ink ${i + 1}`, hex }));
const draft = (parts: object = {}) =>
	blankDraft({ palette: { id: 'brand', name: 'Brand', inks }, ...parts });

describe('inks of a sheet', () => {
	it('are the sheet’s own once changed, and remember what they were made from', () => {
		const changed = setInk(1, { fixed: true })(draft());
		expect(changed.palette).toMatchObject({ id: 'own', name: 'Brand, changed', from: 'brand' });
		expect(changed.palette.inks[1]).toEqual({ ...inks[1], fixed: true });
		const again = setInk(1, { fixed: undefined })(changed);
		expect(again.palette).toMatchObject({ id: 'own', name: 'Brand, changed', from: 'brand' });
		expect(again.palette.inks).toEqual(inks);
	});

	it('grow by an ink that stands apart', () => {
		const { palette } = addInk(draft());
		expect(palette.inks.slice(0, 3)).toEqual(inks);
		expect(inks.map(({ hex }) => hex)).not.toContain(palette.inks[3].hex);
	});

	it('are not removed while something uses them, and why is said', () => {
		const locks = { a: { ink: 1, cost: 1 } };
		expect(whyKept(draft({ locks }), 1, [0, 1, 1])).toBe(
			'Ink 2 is in use by 2 regions of the sheet and 1 lock.',
		);
		expect(whyKept(draft({ reserved: [2] }), 2, [0])).toBe('Ink 3 is in use by the reserved inks.');
		expect(whyKept(draft({ inks: 3 }), 2, [0])).toMatch(/^The sheet is to use 3 inks/);
		expect(whyKept(draft(), 2, [0, 1])).toBe('');
		const single = blankDraft({ palette: { id: 'one', name: 'One', inks: [inks[0]] } });
		expect(whyKept(single, 0, [])).toMatch(/one ink at least/);
	});

	it('that are removed or moved take locks and rules of higher numbers with them', () => {
		const rules = {
			locks: { a: { ink: 2, cost: 1 }, b: { ink: 0, cost: 1 } },
			forbidden: [{ key: 'c', ink: 2 }],
			reserved: [2],
		};
		const removed = removeInk(1)(draft(rules));
		expect(removed.palette.inks).toEqual([inks[0], inks[2]]);
		expect([removed.locks.a.ink, removed.locks.b.ink]).toEqual([1, 0]);
		expect([removed.forbidden[0].ink, removed.reserved]).toEqual([1, [1]]);
		const swapped = swapInks(0, 2)(draft(rules));
		expect(swapped.palette.inks).toEqual([inks[2], inks[1], inks[0]]);
		expect([swapped.locks.a.ink, swapped.locks.b.ink, swapped.reserved]).toEqual([0, 2, [0]]);
	});
});
