/**
 * Tables of figures against what is published about their formats: CSV (RFC 4180), numbers as people write
 * them (CLDR, ETSI and ISO house rules), dates of workbooks (ECMA-376 / ISO/IEC 29500-1).
 */
import { describe, expect, it } from 'vitest';
import { parseNumber } from '../../src/lib/engines/measures/numbers/parse-number.ts';
import { dateText } from '../../src/lib/engines/measures/workbook/dates.ts';
import { columnOf } from '../../src/lib/engines/measures/workbook/addresses.ts';
import { read, rowsOf } from '../support/tables.ts';

describe('CSV against RFC 4180, section 2', () => {
	const records = async (csv: string) => rowsOf((await read(csv, { headingRow: 0 })).table);
	const plain = [
		['aaa', 'bbb', 'ccc'],
		['zzz', 'yyy', 'xxx'],
	];

	it('rule 1: one record a line', async () => {
		expect(await records('aaa,bbb,ccc\r\nzzz,yyy,xxx\r\n')).toEqual(plain);
	});

	it('rule 2: the last record may lack its line break', async () => {
		expect(await records('aaa,bbb,ccc\r\nzzz,yyy,xxx')).toEqual(plain);
	});

	it('rule 3: the first line may be a header', async () => {
		const { table } = await read(
			'field_name,field_name,field_name\r\naaa,bbb,ccc\r\nzzz,yyy,xxx\r\n',
		);
		expect(rowsOf(table)).toEqual(plain);
		// the RFC's three fields share one name; a column must be found by its own
		expect(table.headings).toEqual(['field_name', 'field_name (2)', 'field_name (3)']);
	});

	it('rule 4: spaces are part of a field', async () => {
		expect(await records('aaa, bbb ,ccc\r\n')).toEqual([['aaa', ' bbb ', 'ccc']]);
	});

	it('rule 5: a field may or may not be quoted', async () => {
		expect(await records('"aaa","bbb","ccc"\r\nzzz,yyy,xxx')).toEqual(plain);
	});

	it('rule 6: line breaks, quotes and commas stand in quoted fields', async () => {
		expect(await records('"aaa","b\r\nbb","ccc"\r\nzzz,yyy,xxx')).toEqual([
			['aaa', 'b\r\nbb', 'ccc'],
			['zzz', 'yyy', 'xxx'],
		]);
	});

	it('rule 7: a quotation mark within is doubled', async () => {
		expect(await records('"aaa","b""bb","ccc"')).toEqual([['aaa', 'b"bb', 'ccc']]);
	});
});

describe('numbers as people write them', () => {
	/** CLDR, as the platform's ICU carries it; each locale with its decimal sign. */
	const locales = {
		en: '.',
		'en-IN': '.',
		hi: '.',
		de: ',',
		'de-AT': ',',
		'de-CH': '.',
		fr: ',',
		'fr-CH': ',',
		es: ',',
		pl: ',',
		sv: ',',
		nb: ',',
		fi: ',',
		it: ',',
		'pt-BR': ',',
		ru: ',',
		tr: ',',
		ja: '.',
	} as const;
	const numbers = [
		0, 7, 12.5, 1234.5, 12345, 98765.43, 1234567.891, 10_000_000, -0.25, -1234.5, -7654321,
	];

	it('CLDR: what each locale writes is read back', () => {
		for (const [locale, decimal] of Object.entries(locales)) {
			const write = new Intl.NumberFormat(locale, {
				numberingSystem: 'latn',
				maximumFractionDigits: 3,
			});
			for (const number of numbers) {
				const text = write.format(number);
				expect([locale, text, parseNumber(text, decimal)?.value]).toEqual([locale, text, number]);
			}
		}
	});

	it('CLDR: percents and amounts with their sign are read back', () => {
		for (const locale of ['en', 'de', 'fr', 'sv', 'pl', 'ja'] as const) {
			const percent = new Intl.NumberFormat(locale, { style: 'percent', maximumFractionDigits: 1 });
			const read = parseNumber(percent.format(0.125), locales[locale]);
			expect([locale, read]).toEqual([locale, { value: 0.125, percent: true }]);
			const amount = new Intl.NumberFormat(locale, {
				style: 'currency',
				currency: 'EUR',
				currencySign: 'accounting',
			});
			const text = amount.format(-1234.5);
			const value = parseNumber(text, locales[locale])?.value;
			expect([locale, text, value]).toEqual([locale, text, -1234.5]);
		}
	});

	it('ETSI drafting rules, "Representation of numbers and numerical values", example 2', () => {
		const examples = {
			'23 456': 23456,
			'2 345': 2345,
			'2,345': 2.345,
			'2,345 6': 2.3456,
			'2,345 67': 2.34567,
		};
		for (const [text, value] of Object.entries(examples)) {
			// the rules want a no-break space, and print a plain one
			for (const written of [text, text.replaceAll(' ', '\u00a0')]) {
				expect([written, parseNumber(written, ',')?.value]).toEqual([written, value]);
			}
		}
	});

	it('SI Brochure, 9th edition, 5.4.4: 43 279.168 29 (example from memory)', () => {
		expect(parseNumber('43 279.168 29', '.')?.value).toBe(43279.16829);
		expect(parseNumber('43\u2009279,168\u200929', ',')?.value).toBe(43279.16829);
	});
});

describe('dates of workbooks', () => {
	/** ISO/IEC 29500-1 (ECMA-376 part 1), 18.17.4.1 and L.2.16.9.1. */
	it('days from 1900 and from 1904', () => {
		const from1900 = {
			1: '1900-01-01',
			3687: '1910-02-03',
			38749: '2006-02-01',
			2958465: '9999-12-31',
		};
		const from1904 = {
			0: '1904-01-01',
			2225: '1910-02-03',
			37287: '2006-02-01',
			2957003: '9999-12-31',
		};
		for (const [serial, date] of Object.entries(from1900)) {
			expect(dateText(Number(serial), 'date', false)).toBe(date);
		}
		for (const [serial, date] of Object.entries(from1904)) {
			expect(dateText(Number(serial), 'date', true)).toBe(date);
		}
	});

	/** The same, 18.17.4.3 and L.2.16.9.3. */
	it('days and times of day', () => {
		const from1900: [number, string][] = [
			[3687.4207639, '1910-02-03T10:05:54'],
			[1.5, '1900-01-01T12:00:00'],
			[2958465.9999884, '9999-12-31T23:59:59'],
		];
		const from1904: [number, string][] = [
			[2225.4207639, '1910-02-03T10:05:54'],
			[0.5, '1904-01-01T12:00:00'],
			[2957003.9999884, '9999-12-31T23:59:59'],
		];
		for (const [serial, text] of from1900) expect(dateText(serial, 'date-time', false)).toBe(text);
		for (const [serial, text] of from1904) expect(dateText(serial, 'date-time', true)).toBe(text);
	});

	it('what lies outside either calendar stays a number', () => {
		expect(dateText(-1, 'date', false)).toBe(-1);
		expect(dateText(2958466, 'date', false)).toBe(2958466);
		expect(dateText(2957004, 'date', true)).toBe(2957004);
	});

	/** Common practice, no source: a sheet's last column is XFD, the 16,384th. */
	it('columns by their letters', () => {
		expect(['A1', 'Z9', 'AA10', 'XFD1048576', 'XFE1', '12'].map(columnOf)).toEqual([
			0, 25, 26, 16383, -1, -1,
		]);
	});
});
