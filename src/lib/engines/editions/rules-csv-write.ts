import { csvField } from '../measures/text/csv-field.ts';
import type { Draft } from './draft.ts';
import { ruleList, type RuleEntry } from './rule-list.ts';

/** Headings of the table of rules; the names beside the keys are for reading only. */
export const rulesColumns = [
	'rule',
	'region',
	'name',
	'other region',
	'other name',
	'ink',
	'weight',
	'group',
] as const;

/** A text that reading would take an apostrophe off gets one more. */
const takenForGuarded = /^'+[=+\-@\t\r\n\uff1d\uff0b\uff0d\uff20]/;
const guarded = (text: string) => (takenForGuarded.test(text) ? `'${text}` : text);

/** What stood in a cell before it was guarded against being run as a formula. */
export const unguarded = (cell: string): string =>
	takenForGuarded.test(cell) ? cell.slice(1) : cell;

/**
 * The rules of a draft as CSV: RFC 4180, one line a rule, of a group one line a region; inks by number
 * from 1. Texts that a spreadsheet would run as a formula are led by an apostrophe. What an adjoining
 * sheet asks for is left out: it follows from the tie, wherever that is. `names` gives names by key.
 * `rulesFromCsv` reads back the very same rules.
 */
export function rulesToCsv(draft: Draft, names: ReadonlyMap<string, string> = new Map()): string {
	const own = ruleList(draft).filter(({ tie }) => tie === null);
	const lines = [[...rulesColumns], ...own.flatMap((entry) => linesOf(entry, names))];
	return lines.map((line) => `${line.map(csvField).join(',')}\r\n`).join('');
}

type Line = (string | number | null)[];

function linesOf(
	{ kind, keys, ink, weight, group }: RuleEntry,
	names: ReadonlyMap<string, string>,
): Line[] {
	const named = (key: string | undefined) =>
		key === undefined ? [null, null] : [guarded(key), guarded(names.get(key) ?? '')];
	const line = (key?: string, other?: string): Line => [
		...[kind, ...named(key), ...named(other)],
		...[ink === null ? null : ink + 1, weight, group === null ? null : guarded(group)],
	];
	if (group !== null) return keys.map((key) => line(key));
	return [line(keys[0], keys[1])];
}
