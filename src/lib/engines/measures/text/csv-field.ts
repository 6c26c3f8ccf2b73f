/** A plain number may begin with a sign; nothing else may begin like a formula. */
const plainNumber = /^[-+]?\d+(\.\d+)?$/;
const formulaStart = /^[=+\-@\t\r\n\uff1d\uff0b\uff0d\uff20]/;

/**
 * One field. Quoted where it must be (RFC 4180, section 2); a text that a spreadsheet would run as a
 * formula is led by an apostrophe (OWASP, CSV Injection).
 */
export function csvField(value: string | number | null): string {
	if (value === null) return '';
	if (typeof value === 'number') return Number.isFinite(value) ? String(value) : '';
	const safe = formulaStart.test(value) && !plainNumber.test(value) ? `'${value}` : value;
	return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe;
}
