import type { Merge } from '../grid.ts';
import { textCell } from '../grid.ts';
import type { Cell } from '../table.ts';
import { columnOf, mergeOf, mostColumns } from './addresses.ts';
import { damaged } from './damaged.ts';
import { dateText } from './dates.ts';
import type { WorkbookPackage } from './package.ts';
import { RichText, unescapeText } from './shared-strings.ts';
import type { NumberStyle } from './styles.ts';
import { parsePart, type Attributes } from './xml.ts';

/** What cells point to. */
export interface Lookups {
	strings: string[];
	styles: NumberStyle[];
	from1904: boolean;
}

export interface SheetHandlers {
	/** a row that is not blank, its number from 1; the row is the handler's to keep */
	row(cells: Cell[], fileRow: number): void;
	merge(merge: Merge): void;
	/** a cell with a number, by column from 0 */
	number(column: number, style: NumberStyle): void;
	/** a formula that was saved without its value */
	unsaved(fileRow: number): void;
	read(bytes: number): void;
}

/** Reads a sheet row by row (ECMA-376 part 1, 18.3.1). Formulas count by the value they were saved with. */
export function readSheet(
	pack: WorkbookPackage,
	part: string,
	lookups: Lookups,
	handlers: SheetHandlers,
): void {
	const reading = new SheetReading(part, lookups, handlers);
	parsePart(pack, part, reading);
}

class SheetReading {
	private fileRow = 0;
	private row: Cell[] | null = null;
	private column = -1;
	private attributes: Attributes | null = null;
	private value: string | null = null;
	private inValue = false;
	private hasFormula = false;
	private inline = new RichText();

	constructor(
		private part: string,
		private lookups: Lookups,
		private handlers: SheetHandlers,
	) {}

	read(bytes: number): void {
		this.handlers.read(bytes);
	}

	open(name: string, attributes: Attributes): void {
		if (this.attributes) {
			if (name === 'v') [this.inValue, this.value] = [true, ''];
			else if (name === 'f') this.hasFormula = true;
			else this.inline.open(name);
		} else if (name === 'c' && this.row) this.openCell(attributes);
		else if (name === 'row') this.openRow(attributes);
		else if (name === 'mergeCell') {
			const merge = mergeOf(attributes.ref ?? '');
			if (merge) this.handlers.merge(merge);
		}
	}

	text(text: string): void {
		if (this.inValue) this.value += text;
		else if (this.attributes) this.inline.text(text);
	}

	close(name: string): void {
		if (name === 'v') this.inValue = false;
		else if (name === 'c') this.closeCell();
		else if (name === 'row') this.closeRow();
		else if (this.attributes) this.inline.close(name);
	}

	private openRow({ r }: Attributes): void {
		const fileRow = r === undefined ? this.fileRow + 1 : Number(r);
		if (!(Number.isInteger(fileRow) && fileRow > this.fileRow)) {
			throw damaged(`row ${r} follows row ${this.fileRow} in "${this.part}"`);
		}
		[this.fileRow, this.row, this.column] = [fileRow, [], -1];
	}

	private openCell(attributes: Attributes): void {
		this.column = attributes.r === undefined ? this.column + 1 : columnOf(attributes.r);
		if (this.column < 0 || this.column >= mostColumns)
			throw damaged(`"${attributes.r ?? 'the next one'}" is no cell (in "${this.part}")`);
		[this.attributes, this.value, this.hasFormula] = [attributes, null, false];
	}

	private closeCell(): void {
		if (!this.attributes || !this.row) return;
		const cell = this.cell(this.attributes);
		if (cell === null && this.hasFormula && this.value === null)
			this.handlers.unsaved(this.fileRow);
		if (cell !== null) {
			while (this.row.length < this.column) this.row.push(null);
			this.row[this.column] = cell;
		}
		this.attributes = null;
	}

	/** By the cell's type (18.18.11, ST_CellType). */
	private cell({ t, s }: Attributes): Cell {
		const { strings, styles, from1904 } = this.lookups;
		const { value } = this;
		if (t === 'inlineStr') return textCell(unescapeText(this.inline.take()));
		if (value === null) return null;
		if (t === 's') return textCell(this.shared(strings, value));
		if (t === 'b') return value.trim() === '1' || value.trim() === 'true';
		if (t === 'str') return textCell(unescapeText(value));
		if (t === 'e' || t === 'd') return textCell(value);
		const number = value.trim() === '' ? NaN : Number(value);
		// what is no number stays to be told
		if (!Number.isFinite(number)) return textCell(value);
		const style = styles[Number(s ?? 0)] ?? 'plain';
		this.handlers.number(this.column, style);
		return style === 'plain' || style === 'percent' ? number : dateText(number, style, from1904);
	}

	private shared(strings: string[], value: string): string {
		const text = strings[Number(value)];
		if (text === undefined) throw damaged(`row ${this.fileRow} points to a text that is missing`);
		return text;
	}

	private closeRow(): void {
		if (this.row?.length) this.handlers.row(this.row, this.fileRow);
		this.row = null;
	}
}
