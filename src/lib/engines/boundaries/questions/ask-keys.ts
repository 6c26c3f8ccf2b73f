import type { BoundaryOptions } from '../options.ts';
import type { Choice, Found, Question } from '../question.ts';

/** a column of keys, as it was asked for or found, and how many different keys it has */
interface Doubled {
	keyField: string | null;
	distinct: number;
}

const mostColumns = 6;

/** What becomes of keys that stand for several features, or which column holds the keys. */
export function askKeys(
	found: Found,
	ids: (string | number | null)[],
	options: BoundaryOptions,
): Question {
	const unique = found.columns.filter(
		({ distinct, empty }) => empty === 0 && distinct === found.features,
	);
	const doubled = doubledKeys(found, ids, options);
	const columns = unique.slice(0, mostColumns).map(({ name, examples }): Choice => ({
		value: name,
		words: `Take the keys from "${name}": all ${number(found.features)} values differ, such as ${examples.join(', ')}.`,
		options: { keyField: name, duplicateKeys: 'refuse' },
		sketch: null,
	}));
	return {
		about: 'keys',
		message: doubled
			? 'Some keys stand for more than one feature. What should become of them?'
			: 'Which column holds the keys of the regions?',
		choices: [...(doubled ? waysToKeep(doubled, found) : []), ...columns],
		free: true,
		likeness: found.likeness,
		found,
	};
}

function waysToKeep({ keyField, distinct }: Doubled, { features }: Found): Choice[] {
	const kept = keyField === null ? {} : { keyField };
	return [
		{
			value: 'merge',
			words: `Join features with the same key into one region: at most ${number(distinct)} regions from ${number(features)} features.`,
			options: { ...kept, duplicateKeys: 'merge' },
			sketch: null,
		},
		{
			value: 'rename',
			words: `Keep every feature as a region of its own, and tell the same keys apart by a number in brackets.`,
			options: { ...kept, duplicateKeys: 'rename' },
			sketch: null,
		},
	];
}

/** Null when the keys are not doubled but missing: the column is not there, or has gaps. */
function doubledKeys(
	{ columns }: Found,
	ids: (string | number | null)[],
	{ keyField }: BoundaryOptions,
): Doubled | null {
	const column = columns.find(({ name }) => name === keyField);
	if (column) return column.empty ? null : { keyField: column.name, distinct: column.distinct };
	if (keyField !== undefined && keyField !== 'id') return null;
	const given = ids.filter((id) => id !== null && id !== '');
	if (given.length < ids.length) return null;
	return { keyField: keyField ?? null, distinct: new Set(given.map(String)).size };
}

const number = (n: number | null): string => (n ?? 0).toLocaleString('en');
