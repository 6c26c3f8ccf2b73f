/** Numbers, shares, dates and counts as the interface says them. Times are shown in UTC on the server and in the reader's zone after. */
const whole = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 0 });
const tenth = new Intl.NumberFormat('en-GB', {
	minimumFractionDigits: 1,
	maximumFractionDigits: 1,
});
const digits = new Intl.NumberFormat('en-GB', { maximumSignificantDigits: 2 });
const day = new Intl.DateTimeFormat('en-GB', {
	day: 'numeric',
	month: 'long',
	year: 'numeric',
	timeZone: 'UTC',
});

/** 12,345 */
export const count = (value: number): string => whole.format(value);

/** "1 region", "12 regions"; the plural is given where it is not the word with an s */
export const counted = (value: number, one: string, many = `${one}s`): string =>
	`${count(value)} ${value === 1 ? one : many}`;

/** 0.234 -> "23 %"; what is above nothing but rounds to it is "under 1 %" */
export const share = (value: number): string =>
	value > 0 && value < 0.01 ? 'under 1 %' : `${Math.round(value * 100)} %`;

/** metres, in the unit a reader would choose */
export const length = (metres: number): string =>
	metres < 1000 ? `${(metres < 10 ? digits : whole).format(metres)} m` : `${kilometres(metres)} km`;

/** metres as a bare figure in kilometres: one decimal below 1,000 km */
export const kilometres = (metres: number): string =>
	metres < 999_950 ? tenth.format(metres / 1000) : whole.format(metres / 1000);

export const area = (km2: number): string =>
	km2 < 10 ? `${km2.toPrecision(2)} km²` : `${whole.format(km2)} km²`;

/** bytes in decimal units */
export const bytes = (value: number): string => {
	if (value < 1000) return `${value} bytes`;
	if (value < 1e6) return `${whole.format(value / 1e3)} kB`;
	return value < 1e9 ? `${tenth.format(value / 1e6)} MB` : `${tenth.format(value / 1e9)} GB`;
};

/** "4 September 2026" */
export const date = (value: Date | string): string => day.format(new Date(value));

/** "14:06" in the reader's own zone; call it in the browser only */
export const clock = (value: Date | string): string =>
	new Date(value).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });

const threeDigits = new Intl.NumberFormat('en-GB', { maximumSignificantDigits: 3 });
const hundredth = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });

/** A figure as it was measured, its unit behind it: "12,480", "3.75 h", "0.0125 FTE". */
export const figure = (value: number, unit = ''): string =>
	`${(Math.abs(value) < 1 ? threeDigits : hundredth).format(value)}${unit && ` ${unit}`}`;

/** 11.96 -> "11.9": rounded down, so that what misses a demand is never shown as reaching it. */
export const roundedDown = (value: number): string => (Math.floor(value * 10) / 10).toFixed(1);
