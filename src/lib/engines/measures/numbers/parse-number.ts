/**
 * Signs between groups of digits: space, no-break space, thin space, narrow no-break space, apostrophes.
 * Source: CLDR, `<group>` of the locales fr, de-CH, pl and others; ISO 31-0, 3.3.1 (a small space).
 */
const groupSigns = " \u00a0\u2009\u202f'\u2019";

/** Groups of three, or of two before the last three (CLDR pattern `#,##,##0.###`), all by one sign. */
const patterns = { '.': numberPattern('.', ','), ',': numberPattern(',', '.') };

function numberPattern(decimal: '.' | ',', other: string): RegExp {
	const sign = `[${other === '.' ? '\\.' : other}${groupSigns}]`;
	const grouped = `\\d{1,3}(?:(${sign})\\d{3}(?:\\2\\d{3})*|(${sign})\\d{2}(?:\\3\\d{2})*\\3\\d{3})`;
	const whole = `(${grouped}|\\d+)`;
	const point = `\\${decimal}`;
	return new RegExp(`^(?:${whole}(?:${point}(\\d*))?|${point}(\\d+))(?:[eE]([-+]?\\d+))?$`);
}

const minus = /^[-\u2212\u2013]\s*/;
const trailingMinus = /\s*[-\u2212]$/;
const currency = /^\p{Sc}\s*|\s*\p{Sc}$/gu;
const percent = /\s*%$/;

export interface ParsedNumber {
	value: number;
	/** it carried a percent sign, and `value` is the share: 12 % is 0.12 (ISO 80000-1, 6.5.5: % is 0.01) */
	percent: boolean;
}

/**
 * A number as people write it: sign before or after, amounts in parentheses as negative, grouped digits,
 * a currency sign, a percent sign, an exponent. Null for anything else; never an infinite number.
 */
export function parseNumber(text: string, decimal: '.' | ','): ParsedNumber | null {
	let rest = text.trim();
	let negative = false;
	const bracketed = /^\((.*)\)$/.exec(rest);
	if (bracketed) [negative, rest] = [true, bracketed[1].trim()];
	else if (minus.test(rest)) [negative, rest] = [true, rest.replace(minus, '')];
	else if (rest.startsWith('+')) rest = rest.slice(1).trimStart();
	const isPercent = percent.test(rest);
	if (isPercent) rest = rest.replace(percent, '');
	rest = rest.replace(currency, '');
	if (!negative && minus.test(rest)) [negative, rest] = [true, rest.replace(minus, '')];
	else if (!negative && trailingMinus.test(rest)) {
		[negative, rest] = [true, rest.replace(trailingMinus, '')];
	}
	const match = patterns[decimal].exec(rest);
	if (!match) return null;
	const whole = (match[1] ?? '').replace(/\D/g, '') || '0';
	const exponent = Number(match[6] ?? 0) - (isPercent ? 2 : 0);
	// by way of the exponent, so that 12.3 % is the number nearest to 0.123
	const value = Number(`${whole}.${match[4] ?? match[5] ?? ''}e${exponent}`.replace('.e', 'e'));
	if (!Number.isFinite(value)) return null;
	return { value: negative && value !== 0 ? -value : value, percent: isPercent };
}
