import { changesBetween } from '../../engines/measures/index.ts';
import type { ColumnChoice, MeasureChange, TableOptions } from '../../schemas/measure-review.ts';
import { figure, regionName, type Names } from './measure-words.ts';

/** A measure that the sheet has already. */
export interface Standing {
	id: string;
	name: string;
	unit: string;
	kind: 'number' | 'text';
	confidential: boolean;
	/** joined to the same boundaries as the table under review */
	comparable: boolean;
	values: (number | null)[] | null;
	texts: (string | null)[] | null;
}

export interface Against {
	refusals: string[];
	change: MeasureChange | null;
	/** what is to be stored; null for words and where nothing can be taken */
	stored: Float64Array | null;
}

interface Ground {
	options: Pick<TableOptions, 'existing'>;
	regions: Names;
	standing: Standing[];
}

/** Holds a column against the measure of the same name, if the sheet has one. */
export function changeOf(
	choice: ColumnChoice,
	values: Float64Array | null,
	texts: (string | null)[] | null,
	{ options: { existing }, regions, standing }: Ground,
): Against {
	const before = standing.find(({ name }) => name === choice.name);
	if (!before) return { refusals: [], change: null, stored: values };
	const refusals = refusalsOf(choice, before, existing);
	if (refusals.length > 0) return { refusals, change: null, stored: null };
	if (texts) return { refusals, change: wordsChange(before, texts), stored: null };
	if (!values) return { refusals, change: null, stored: null };
	const old = Float64Array.from(before.values ?? [], (value) => value ?? NaN);
	const stored = existing === 'add' ? added(old, values) : values;
	const change = before.comparable
		? numbersChange(existing, old, stored, regions)
		: unlike(old, stored);
	return { refusals, change, stored };
}

function refusalsOf(choice: ColumnChoice, before: Standing, mode: 'replace' | 'add'): string[] {
	if (before.kind !== choice.kind) {
		const has = before.kind === 'number' ? 'numbers' : 'words';
		return [`The sheet has a column of ${has} called so already; give this one another name.`];
	}
	if (mode === 'replace') return [];
	if (choice.kind === 'text') return ['Words cannot be added to words; replace them instead.'];
	if (!before.comparable) {
		return ['What is there is joined to earlier boundaries, so nothing can be added to it.'];
	}
	if (before.unit === choice.unit) return [];
	return [
		`What is there is in ${before.unit || 'no unit'} and this is in ${choice.unit || 'no unit'}; only the same unit can be added.`,
	];
}

/** A region without a value on one side keeps the other's. */
const added = (old: Float64Array, more: Float64Array): Float64Array =>
	old.map((value, region) => {
		if (Number.isNaN(value)) return more[region];
		return Number.isNaN(more[region]) ? value : value + more[region];
	});

function numbersChange(
	mode: 'replace' | 'add',
	before: Float64Array,
	after: Float64Array,
	regions: Names,
): MeasureChange {
	const { changed, added: gained, removed, largest, totals } = changesBetween(before, after);
	const most = largest && {
		region: regionName(regions, largest.region),
		before: largest.from,
		after: largest.to,
	};
	const parts = [
		`${changed.length} ${changed.length === 1 ? 'region changes' : 'regions change'}`,
		`${gained.length} ${gained.length === 1 ? 'gets' : 'get'} a value that had none`,
		`${removed.length} ${removed.length === 1 ? 'loses its' : 'lose their'} value`,
	];
	const biggest = most
		? ` Largest change: ${most.region.name}, ${figure(most.before)} to ${figure(most.after)}.`
		: '';
	return {
		...{ mode, changed: changed.length, added: gained.length, removed: removed.length },
		...{ largest: most, before: totals.before, after: totals.after },
		sentence: `${parts.join(', ')}.${biggest} In all ${figure(totals.before)} before, ${figure(totals.after)} after.`,
	};
}

const none = { changed: 0, added: 0, removed: 0, largest: null, before: null, after: null };

function unlike(old: Float64Array, stored: Float64Array): MeasureChange {
	const sum = (values: Float64Array) => values.reduce((all, value) => all + (value || 0), 0);
	const [before, after] = [sum(old), sum(stored)];
	return {
		...{ ...none, mode: 'replace', before, after },
		sentence: `Joined to earlier boundaries, so regions cannot be compared one by one. In all ${figure(before)} before, ${figure(after)} after.`,
	};
}

function wordsChange({ texts, comparable }: Standing, after: (string | null)[]): MeasureChange {
	const changed = comparable
		? after.filter((text, region) => text !== (texts?.[region] ?? null)).length
		: after.length;
	const what = changed === 1 ? '1 region changes' : `${changed} regions change`;
	return { ...none, mode: 'replace', changed, sentence: `${what}.` };
}
