import type { NumberStyle } from './styles.ts';

const secondsADay = 86_400;
/** 31 December 9999, the last day of either calendar */
const lastDay = { from1900: 2_958_465, from1904: 2_957_003 };

const two = (n: number): string => String(n).padStart(2, '0');
const clock = (seconds: number): string =>
	`${two(Math.floor(seconds / 3600))}:${two(Math.floor(seconds / 60) % 60)}:${two(seconds % 60)}`;

/**
 * A serial date of a workbook as ISO 8601 text, to the second (ECMA-376 part 1, 18.17.4): days from the end
 * of 1899, or from 1904. Days before March 1900 are one off, because that calendar has a 29 February 1900,
 * which comes out as the 28th. Durations and times of day come out as "26:30:00". A serial that no date
 * belongs to stays a number.
 */
export function dateText(serial: number, style: NumberStyle, from1904: boolean): string | number {
	const last = from1904 ? lastDay.from1904 : lastDay.from1900;
	if (!(serial >= 0 && serial < last + 1)) return serial;
	const seconds = Math.min(Math.round(serial * secondsADay), (last + 1) * secondsADay - 1);
	if (style === 'duration' || (style === 'time' && serial < 1)) return clock(seconds);
	const day = Math.floor(seconds / secondsADay);
	const within = seconds % secondsADay;
	const start = from1904 ? Date.UTC(1904, 0, 1) : Date.UTC(1899, 11, day < 60 ? 31 : 30);
	const date = new Date(start + day * secondsADay * 1000).toISOString().slice(0, 10);
	return style === 'date' && within === 0 ? date : `${date}T${clock(within)}`;
}
