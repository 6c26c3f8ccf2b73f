import { TableRefusal } from '../refusal.ts';

/** No cell is padded by so many blanks, and no row of at most 500 columns has so many tabs. */
const mostBlanks = 2000;

/**
 * Refuses runs of blanks within a row. The parser looks through what follows each quotation mark up to the
 * end of the row, so that many marks before many blanks would keep it busy for hours.
 */
export function refuseLongBlanks(text: string, newline: string): void {
	let run = 0;
	for (let i = 0; i < text.length; i++) {
		const code = text.charCodeAt(i);
		if (code > 32 && code !== 0xa0 && code !== 0x3000 && code !== 0xfeff) run = 0;
		else if (text.startsWith(newline, i)) {
			run = 0;
			i += newline.length - 1;
		} else if (++run > mostBlanks) {
			const message = `A row holds more than ${mostBlanks} blanks one after the other, so this is no table.`;
			throw new TableRefusal('blanks-too-many', message);
		}
	}
}
