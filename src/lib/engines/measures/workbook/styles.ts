import type { WorkbookPackage } from './package.ts';
import { parsePart } from './xml.ts';

/** How a number is shown, as far as it changes what it means. */
export type NumberStyle = 'plain' | 'percent' | 'date' | 'date-time' | 'time' | 'duration';

/** Number formats that need not be written out (ECMA-376 part 1, 18.8.30). */
const builtIn: Record<number, NumberStyle> = {
	9: 'percent',
	10: 'percent',
	14: 'date',
	15: 'date',
	16: 'date',
	17: 'date',
	18: 'time',
	19: 'time',
	20: 'time',
	21: 'time',
	22: 'date-time',
	45: 'time',
	46: 'duration',
	47: 'time',
};
for (const id of [27, 28, 29, 30, 31, 36, 50, 51, 52, 53, 54, 57, 58]) builtIn[id] = 'date';
for (const id of [32, 33, 34, 35, 55, 56]) builtIn[id] = 'time';

/** What a written-out number format shows (ECMA-376 part 1, 18.8.31). */
export function styleOfFormat(code: string): NumberStyle {
	// the section for positive numbers, without literal texts, padding and colours
	const bare = code
		.split(';')[0]
		.replace(/"[^"]*"|\\.|[_*]./g, '')
		.toLowerCase();
	if (/\[(h+|m+|s+)\]/.test(bare)) return 'duration';
	const signs = bare.replace(/\[[^\]]*\]/g, '');
	if (/general/.test(signs)) return 'plain';
	// m is a month unless hours or seconds stand beside it
	const time = /[hs]/.test(signs);
	const date = /[yd]/.test(signs) || (!time && /m/.test(signs));
	if (date) return time ? 'date-time' : 'date';
	if (time) return 'time';
	return signs.includes('%') ? 'percent' : 'plain';
}

/** The style of each cell format, by the number cells name it with (`cellXfs`, 18.8.10). */
export function readStyles(pack: WorkbookPackage, part: string | null): NumberStyle[] {
	if (part === null) return [];
	const written = new Map<number, NumberStyle>();
	const formats: number[] = [];
	let inCellFormats = false;
	parsePart(pack, part, {
		open(name, { numFmtId, formatCode }) {
			if (name === 'numFmt') written.set(Number(numFmtId), styleOfFormat(formatCode ?? ''));
			else if (name === 'cellXfs') inCellFormats = true;
			else if (name === 'xf' && inCellFormats) formats.push(Number(numFmtId ?? 0));
		},
		close(name) {
			if (name === 'cellXfs') inCellFormats = false;
		},
	});
	return formats.map((id) => written.get(id) ?? builtIn[id] ?? 'plain');
}
