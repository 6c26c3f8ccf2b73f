import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { read } from '../../../../../tests/support/tables.ts';
import { parseNumber } from './parse-number.ts';

const value = (text: string, decimal: '.' | ',' = '.') => parseNumber(text, decimal)?.value ?? null;

describe('a number as people write it', () => {
	it('has its sign before, after, or is in parentheses', () => {
		for (const text of ['-12.5', '\u221212.5', '- 12.5', '12.5-', '(12.5)', '-€ 12.5', '€ -12.5']) {
			expect([text, value(text)]).toEqual([text, -12.5]);
		}
		expect(value('+3')).toBe(3);
		expect(Object.is(value('-0'), 0)).toBe(true);
	});

	it('has groups all of one sign and of the right length', () => {
		expect(value("1'234'567.5")).toBe(1234567.5);
		for (const text of [
			'1,23',
			'12,34,5',
			'1,234 567',
			'1,2345',
			',123',
			'1,',
			'1 2',
			'0x10',
			'1.2.3',
		]) {
			expect([text, value(text)]).toEqual([text, null]);
		}
	});

	it('with a percent sign is a share, rounded once', () => {
		expect(parseNumber('12.3 %', '.')).toEqual({ value: 0.123, percent: true });
		expect(parseNumber('7%', ',')).toEqual({ value: 0.07, percent: true });
	});

	it('is never infinite, and never made of nothing', () => {
		for (const text of [
			'1e999',
			'inf',
			'NaN',
			'',
			' ',
			'-',
			'.',
			'()',
			'%',
			'€',
			'e5',
			'#DIV/0!',
		]) {
			expect([text, value(text)]).toEqual([text, null]);
		}
	});

	it('is no text of any length', () => {
		expect(value(`${'1'.repeat(1_000_000)}x`)).toBeNull();
		expect(value(`${' '.repeat(1_000_000)}1`)).toBeNull();
	});

	it('is what the platform reads in what the platform writes', () => {
		const finite = fc.double({ noNaN: true, noDefaultInfinity: true });
		fc.assert(
			fc.property(finite, (number) => {
				expect(value(String(number))).toBe(number === 0 ? 0 : number);
				const comma = String(number).replace('.', ',');
				expect(value(comma, ',')).toBe(number === 0 ? 0 : number);
			}),
		);
	});
});

describe('the decimal sign of a file', () => {
	const decimal = async (...cells: string[]) => {
		const rows = cells.map((cell, i) => `k${i}\t${cell}`).join('\n');
		const { source } = await read(`Key\tVisits\n${rows}\n`);
		return [source.decimal, ...source.notes.map(({ code }) => code)];
	};

	it('is told by numbers that can be read in one way only', async () => {
		expect(await decimal('1.234,5', '7')).toEqual([',']);
		expect(await decimal('1,234.5', '7')).toEqual(['.']);
		expect(await decimal('1.234', '0,5')).toEqual([',']);
		expect(await decimal('1.234.567', '1.234')).toEqual([',']);
		expect(await decimal('1 234,5')).toEqual([',']);
		expect(await decimal('1 234', '5')).toEqual(['.']);
	});

	it('is said to be unclear where it is, and mixed where it is', async () => {
		expect(await decimal('1.234', '2.500')).toEqual(['.', 'decimal-unclear']);
		expect(await decimal('1,234', '2,500')).toEqual(['.', 'decimal-unclear']);
		expect(await decimal('1,5', '2,5', '2.75')).toEqual([',', 'decimal-mixed']);
	});

	it('is not asked of dates, versions and names', async () => {
		expect(await decimal('31.12.2026', '1.2.3', 'a,b', '2,5')).toEqual(['.']);
	});
});
