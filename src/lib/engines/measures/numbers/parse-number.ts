/** Space, no-break space, thin space, narrow no-break space: ISO 31-0, 3.3.1, wants a small space. */
const spaces = ' \u00a0\u2009\u202f';
/** Signs between groups of digits. Source: CLDR, `<group>` of the locales fr, de-CH, pl and others. */
const groupSigns = `${spaces}'\u2019`;

/** Groups of three, or of two before the last three (CLDR pattern `#,##,##0.###`), all by one sign. */
const patterns = { '.': numberPattern('.', ','), ',': numberPattern(',', '.') };

function numberPattern(decimal: '.' | ',', other: string): RegExp {
	const sign = `[${other === '.' ? '\\.' : other}${groupSigns}]`;
	const grouped = `\\d{1,3}(?:(${sign})\\d{3}(?:\\2\\d{3})*|(${sign})\\d{2}(?:\\3\\d{2})*\\3\\d{3})`;
	const whole = `(${grouped}|\\d+)`;
	const point = `\\${decimal}`;
	// only spaces group the digits after the decimal sign
	const parts = `\\d{3}(?:[${spaces}]\\d{3})*[${spaces}]\\d{1,3}`;
	const after = `(?:${point}(${parts}|\\d*))?`;
	return new RegExp(`^(?:${whole}${after}|${point}(${parts}|\\d+))(?:[eE]([-+]?\\d+))?$`);
}

/** Nobody writes longer numbers, and patterns take long over long texts. */
const longest = 100;
/** Most cells are decided by these two, which saves the longer way: sign, digits, decimals; or no digits at all. */
const plain = { '.': /^-?\d+(?:\.\d+)?$/, ',': /^-?\d+(?:,\d+)?$/ };
const maybe = /^[^a-z]*\d[^a-z]*(?:e[-+]?\d+[^a-z]*)?$/i;

const minus = /^[-\u2212\u2013]\s*/;
const trailingMinus = /\s*[-\u2212]$/;
const currency = /^\p{Sc}\s*|\s*\p{Sc}$/gu;
const percent = /\s*%$/;

export interface ParsedNumber {
	value: number;
	/** it carried a percent sign, and `value` is the share: 12 % is 0.12 (% is 0.01: SI Brochure, 9th edition, 5.4.7) */
	percent: boolean;
}

/**
 * A number as people write it: sign before or after, amounts in parentheses as negative, grouped digits,
 * a currency sign, a percent sign, an exponent. Null for anything else; never an infinite number.
 */
export function parseNumber(text: string, decimal: '.' | ','): ParsedNumber | null {
	if (text.length > longest) return null;
	if (plain[decimal].test(text)) {
		const value = Number(decimal === ',' ? text.replace(',', '.') : text);
		return Number.isFinite(value) ? { value: value === 0 ? 0 : value, percent: false } : null;
	}
	if (!maybe.test(text)) return null;
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
	const fraction = (match[4] ?? match[5] ?? '').replace(/\D/g, '');
	const exponent = Number(match[6] ?? 0) - (isPercent ? 2 : 0);
	// by way of the exponent, so that 12.3 % is the number nearest to 0.123
	const value = Number(`${whole}.${fraction || '0'}e${exponent}`);
	if (!Number.isFinite(value)) return null;
	return { value: negative && value !== 0 ? -value : value, percent: isPercent };
}
