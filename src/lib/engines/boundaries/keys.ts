import type { AttributeTable, Cell } from './attribute-table.ts';
import type { Finding } from './finding.ts';
import type { BoundaryOptions } from './options.ts';
import { Refusal } from './refusal.ts';

/** Which region each feature belongs to, and what the regions are called. */
export interface Naming {
	keys: string[];
	names: string[];
	/** region of each feature, -1 where it is left out */
	regionOf: Int32Array;
	/** the key each feature asks for, also where it is left out */
	wanted: string[];
	/** first feature of each region */
	featureOf: number[];
	findings: Finding[];
	/** the column the keys are from, `id` for the features' own, null for record numbers */
	keyField: string | null;
	nameField: string | null;
}

/**
 * Keys: `keyField`, else the feature's `id`, else the first column whose values are all present and
 * unique, else the record number from 1. Names: `nameField`, else a column called name, else the key.
 * `kept` says which features have an area; the others get no region.
 */
export function nameRegions(
	table: AttributeTable,
	kept: boolean[],
	options: BoundaryOptions,
): Naming {
	const { wanted, keyField } = featureKeys(table, kept, options.keyField);
	const { names, nameField } = featureNames(table, options.nameField);
	const naming: Naming = {
		wanted,
		keys: [],
		names: [],
		regionOf: new Int32Array(kept.length).fill(-1),
		featureOf: [],
		findings: [],
		keyField,
		nameField,
	};
	const known = new Map<string, number>();
	const doubles = new Set<string>();
	for (let f = 0; f < kept.length; f++) {
		if (!kept[f]) continue;
		let key = wanted[f];
		if (known.has(key)) {
			doubles.add(key);
			if (options.duplicateKeys === 'merge') {
				naming.regionOf[f] = known.get(key) as number;
				continue;
			}
			key = freshKey(key, known, wanted);
		}
		known.set(key, naming.keys.length);
		naming.regionOf[f] = naming.keys.length;
		naming.featureOf.push(f);
		naming.keys.push(key);
		naming.names.push(names[f] ?? key);
	}
	if (doubles.size)
		naming.findings.push(duplicates([...doubles], options.duplicateKeys ?? 'refuse'));
	return naming;
}

/**
 * The naming once regions have become others: `outcome` gives the region each one is now part of, -1
 * where it is left out. Also answers the new number of every old one.
 */
export function renumber(
	naming: Naming,
	outcome: Int32Array,
): { renamed: Naming; numbers: Int32Array } {
	const kept = [...naming.keys.keys()].filter((r) => outcome[r] === r);
	const places = new Map(kept.map((r, place) => [r, place]));
	const numbers = outcome.map((r) => places.get(r) ?? -1);
	const renamed: Naming = {
		...naming,
		keys: kept.map((r) => naming.keys[r]),
		names: kept.map((r) => naming.names[r]),
		regionOf: naming.regionOf.map((r) => (r < 0 ? -1 : numbers[r])),
		featureOf: kept.map((r) => naming.featureOf[r]),
	};
	return { renamed, numbers };
}

function featureKeys(table: AttributeTable, kept: boolean[], asked?: string): Wanted {
	if (asked !== undefined && asked !== 'id') {
		return { wanted: columnKeys(table, kept, asked), keyField: asked };
	}
	if (asked === 'id' && table.columns.includes('id') && !hasIds(table, kept)) {
		return { wanted: columnKeys(table, kept, 'id'), keyField: 'id' };
	}
	if (asked === 'id' || hasIds(table, kept)) {
		const wanted = table.ids.map((id, f) => keyText(id) ?? absent(kept, f, 'id'));
		return { wanted, keyField: 'id' };
	}
	const column = table.columns.findIndex((_, c) => isUnique(table, kept, c));
	if (column < 0) return { wanted: table.rows.map((_, f) => String(f + 1)), keyField: null };
	const wanted = table.rows.map((row) => keyText(row[column] ?? null) ?? '');
	return { wanted, keyField: table.columns[column] };
}

interface Wanted {
	wanted: string[];
	keyField: string | null;
}

const hasIds = (table: AttributeTable, kept: boolean[]) =>
	table.ids.every((id, f) => !kept[f] || keyText(id) !== null) &&
	table.ids.some((id) => id !== null);

function columnKeys(table: AttributeTable, kept: boolean[], name: string): string[] {
	const column = table.columns.indexOf(name);
	if (column < 0) {
		const message = `There is no column "${name}". The columns are: ${table.columns.join(', ')}.`;
		throw new Refusal('duplicate-keys', message);
	}
	return table.rows.map((row, f) => keyText(row[column] ?? null) ?? absent(kept, f, name));
}

function absent(kept: boolean[], feature: number, field: string): string {
	if (!kept[feature]) return '';
	const message = `Feature ${feature + 1} has no value in "${field}", so it has no key.`;
	throw new Refusal('duplicate-keys', message);
}

function isUnique(table: AttributeTable, kept: boolean[], column: number): boolean {
	const seen = new Set<string>();
	for (let f = 0; f < kept.length; f++) {
		if (!kept[f]) continue;
		const key = keyText(table.rows[f][column] ?? null);
		if (key === null || seen.has(key)) return false;
		seen.add(key);
	}
	return true;
}

function featureNames(table: AttributeTable, asked?: string) {
	const wanted = asked ?? table.columns.find((c) => /^(name|naam|nom|nombre|navn)$/i.test(c));
	const column = wanted === undefined ? -1 : table.columns.indexOf(wanted);
	if (asked !== undefined && column < 0) {
		const message = `There is no column "${asked}". The columns are: ${table.columns.join(', ')}.`;
		throw new Refusal('duplicate-keys', message);
	}
	const names = table.rows.map((row) => keyText(row[column] ?? null));
	return { names, nameField: column < 0 ? null : table.columns[column] };
}

/** A key as text: numbers as plain decimals, never with an exponent; empty text is no key. */
export function keyText(value: Cell): string | null {
	if (value === null || value === '') return null;
	if (typeof value !== 'number') return String(value);
	const text = String(value);
	if (!text.includes('e')) return text;
	if (Number.isInteger(value)) return BigInt(value).toString();
	return value.toFixed(100).replace(/0+$/, '');
}

function freshKey(key: string, known: Map<string, number>, wanted: string[]): string {
	const taken = new Set(wanted);
	for (let n = 2; ; n++) {
		const fresh = `${key} (${n})`;
		if (!known.has(fresh) && !taken.has(fresh)) return fresh;
	}
}

function duplicates(regions: string[], how: 'refuse' | 'merge' | 'rename'): Finding {
	const some = regions.slice(0, 5).join(', ') + (regions.length > 5 ? ', ...' : '');
	const said = {
		refuse: `Keys stand for more than one feature: ${some}.`,
		merge: `Features with the same key were joined into one region: ${some}.`,
		rename: `Features with the same key were told apart by a number in brackets: ${some}.`,
	}[how];
	const finding: Finding = {
		code: 'duplicate-keys',
		severity: how === 'refuse' ? 'error' : 'warning',
		message: said,
		regions,
		at: null,
	};
	if (how === 'refuse') throw new Refusal('duplicate-keys', said, [finding]);
	return finding;
}
