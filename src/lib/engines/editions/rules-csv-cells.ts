import { rulesColumns, unguarded } from './rules-csv-write.ts';
import { ruleLimits } from './rule-limits.ts';

/** What the cells of a table of rules are looked up by. */
export interface RulesCsvGround {
	keys: readonly string[];
	/** names of the regions in the same order; keys where empty */
	names: readonly string[];
	/** names of the palette's inks */
	inks: readonly string[];
}

/** Why a line says no rule; a plain sentence without the number of the line. */
export class LineFault extends Error {}

type Column = (typeof rulesColumns)[number];

/** The cells of one line by heading. */
export type Cells = (column: Column) => string;

/** Where each column stands by the headings, in any order and case; or what is missing. */
export function columnsOf(headings: readonly (string | null)[]): Map<Column, number> | string {
	const places = new Map<Column, number>();
	headings.forEach((heading, place) => {
		const column = rulesColumns.find((name) => name === heading?.trim().toLowerCase());
		if (column !== undefined && !places.has(column)) places.set(column, place);
	});
	if (places.has('rule') && (places.has('region') || places.has('ink'))) return places;
	return `The first line must name the columns: ${rulesColumns.join(', ')}.`;
}

/** Looks regions and inks up by what stands in a cell. */
export class CellReader {
	private readonly isKey: Set<string>;
	private readonly byName = new Map<string, string | null>();
	private readonly inks = new Map<string, number | null>();

	constructor(ground: RulesCsvGround) {
		this.isKey = new Set(ground.keys);
		ground.names.forEach((name, i) => {
			if (name !== '') this.byName.set(name, this.byName.has(name) ? null : ground.keys[i]);
		});
		ground.inks.forEach((name, ink) => {
			const plain = name.trim().toLowerCase();
			if (plain !== '') this.inks.set(plain, this.inks.has(plain) ? null : ink);
		});
	}

	/** The key of the region in a cell: by key, else by a name that only one region has. */
	region(cell: string, name: string): string {
		const written = cell === '' ? name : cell;
		if (written === '') throw new LineFault('no region is named');
		const ways = [unguarded(written), written, unguarded(written.trim())];
		const key = ways.find((way) => this.isKey.has(way));
		if (key !== undefined) return key;
		const called = ways.find((way) => this.byName.has(way));
		const found = called === undefined ? undefined : this.byName.get(called);
		if (found === undefined) throw new LineFault(`there is no region ${inQuotes(written)}`);
		if (found === null) throw new LineFault(`several regions are called ${inQuotes(written)}`);
		return found;
	}

	/** The ink in a cell, from 0: by its number from 1, else by its name in the palette. */
	ink(cell: string): number {
		const written = cell.trim();
		if (written === '') throw new LineFault('no ink is given');
		if (/^\d{1,6}$/.test(written)) return inkNumbered(Number(written));
		const found = this.inks.get(unguarded(written).toLowerCase());
		if (found === undefined) throw new LineFault(`the palette has no ink ${inQuotes(written)}`);
		if (found === null) throw new LineFault(`several inks are called ${inQuotes(written)}`);
		return found;
	}

	/** What dropping a lock costs; 1 where nothing is said. A comma before decimals is taken too. */
	weight(cell: string): number {
		const written = cell.trim();
		if (written === '') return 1;
		const plain = /^\d*[.,]?\d+(e[-+]?\d+)?$/i.test(written) ? written.replace(',', '.') : 'none';
		const weight = Number(plain);
		if (weight > 0 && weight <= ruleLimits.weight) return weight;
		const most = ruleLimits.weight.toLocaleString('en');
		throw new LineFault(`a weight is a number above 0 and up to ${most}, not ${inQuotes(written)}`);
	}
}

function inkNumbered(number: number): number {
	if (number >= 1 && number <= ruleLimits.ink + 1) return number - 1;
	throw new LineFault(`inks are numbered from 1 to ${ruleLimits.ink + 1}`);
}

/** A text of the file in quotation marks, shortened where it is long. */
export const inQuotes = (text: string): string =>
	`“${text.length > 60 ? `${text.slice(0, 57)}…` : text}”`;
