import { describe, expect, it } from 'vitest';
import { askExportForm, exportsAsked } from './export';

const form = { kind: 'zip', edition: '', reader: 'typical' };

describe('a file asked for by a form', () => {
	it('is as usual where nothing is said of what a package holds', () => {
		expect(askExportForm.parse(form).asked.options).toEqual({});
	});

	it('tells which draft was looked at, where it is of one', () => {
		expect(askExportForm.parse({ ...form, revision: '7' }).revision).toBe(7);
		expect(askExportForm.parse({ ...form, revision: '' }).revision).toBeUndefined();
		expect(askExportForm.safeParse({ ...form, revision: '-1' }).success).toBe(false);
	});

	it('is a package of what is ticked, and none where nothing is', () => {
		const kinds = (value: unknown) => askExportForm.safeParse({ ...form, kinds: value });
		expect(kinds(['', 'css', 'csv']).data?.asked.options.kinds).toEqual(['css', 'csv']);
		expect(kinds(['', 'css']).data?.asked.options.kinds).toEqual(['css']);
		const none = kinds('');
		expect(none.success).toBe(false);
		expect(none.error?.issues[0]).toMatchObject({
			path: ['kinds'],
			message: 'Tick at least one kind of file for the package.',
		});
	});
});

describe('files asked after by their numbers', () => {
	it('are whole numbers and not too many', () => {
		expect(exportsAsked.parse({})).toEqual({});
		expect(exportsAsked.parse({ of: '3,15' })).toEqual({ of: [3, 15] });
		for (const of of ['', '0', '3,', 'a', '1.5', '-1', '99999999999', '1,'.repeat(200) + '1'])
			expect(exportsAsked.safeParse({ of }).success, of).toBe(false);
	});
});
