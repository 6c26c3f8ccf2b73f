import { SvelteSet } from 'svelte/reactivity';
import { borderKinds } from '../engines/borders/border-list.ts';
import { sheetBorderRows, type SheetBorderRow } from '../engines/borders/sheet-rows.ts';
import { borderRowFilter, type BorderQuestion } from './border-filter';
import { kindWords, measureOf } from './border-words';
import type { Desk } from './desk.svelte';
import { evidence } from './evidence';

export const rowName = ({ a, b }: { a: number; b: number }): string => `${a} ${b}`;

const everything: BorderQuestion = {
	kind: 'any',
	standing: 'any',
	region: '',
	least: null,
	most: null,
};

/**
 * The list of a sheet's borders as it is worked on: which of them are asked for, which one is shown on
 * the sheet, and which are ticked to be decided together.
 */
export class BorderLedger {
	question: BorderQuestion = $state({ ...everything });
	readonly ticked = new SvelteSet<string>();
	chosen: string | null = $state(null);

	rows = $derived.by(() => {
		const { regions, borders } = this.desk.sheet;
		return sheetBorderRows(regions.key, borders, this.desk.borderRules.now);
	});
	asked = $derived.by(() => {
		const question = { ...this.question };
		return this.rows.filter(
			borderRowFilter(question, this.desk.sheet.regions.key, this.desk.nameOf),
		);
	});
	isFiltered = $derived.by(() => {
		const { kind, standing, region, least, most } = this.question;
		return kind !== 'any' || standing !== 'any' || !!region || least !== null || most !== null;
	});
	/** what is decided about: the rows ticked, or the one that is shown */
	inHand = $derived.by(() => {
		const { ticked, chosen } = this;
		if (ticked.size) return this.rows.filter((row) => ticked.has(rowName(row)));
		return chosen === null ? [] : this.rows.filter((row) => rowName(row) === chosen);
	});

	constructor(readonly desk: Desk) {}

	askForAll() {
		this.question = { ...everything };
	}

	tick(names: readonly string[], on: boolean) {
		for (const name of names) {
			if (on) this.ticked.add(name);
			else this.ticked.delete(name);
		}
	}

	/** Points a row out on the sheet. */
	choose(row: SheetBorderRow) {
		this.chosen = rowName(row);
		const far = measureOf(row);
		const kind = kindWords[borderKinds[row.kind]];
		this.desk.evidence = evidence({
			words: `Border between ${this.names(row)}, ${kind}${far === 'none' ? '' : `, ${far}`}.`,
			light: [row.a, row.b],
			borders: row.border < 0 ? [] : [row.border],
		});
	}

	names = ({ a, b }: SheetBorderRow): string => `${this.desk.nameOf(a)} and ${this.desk.nameOf(b)}`;

	keysOf = ({ a, b }: SheetBorderRow) => {
		const { key } = this.desk.sheet.regions;
		return { a: key[a], b: key[b] };
	};
}
