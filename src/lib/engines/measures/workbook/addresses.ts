import type { Merge } from '../grid.ts';

/** The last column of a sheet is XFD. */
export const mostColumns = 16_384;

/** The column of an address such as "AB12" (A1 notation), from 0; -1 where it is none. */
export function columnOf(address: string): number {
	let column = 0;
	for (let i = 0; i < address.length; i++) {
		const code = address.charCodeAt(i) & ~32;
		if (code < 65 || code > 90) break;
		column = column * 26 + code - 64;
		if (column > mostColumns) return -1;
	}
	return column - 1;
}

/** A range such as "A1:C1"; null where it is none. */
export function mergeOf(range: string): Merge | null {
	const match = /^\$?([A-Z]{1,3})\$?(\d{1,7}):\$?([A-Z]{1,3})\$?(\d{1,7})$/i.exec(range);
	if (!match) return null;
	const [, left, top, right, bottom] = match;
	return {
		top: Number(top) - 1,
		left: columnOf(left),
		bottom: Number(bottom) - 1,
		right: columnOf(right),
	};
}
