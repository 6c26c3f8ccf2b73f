export type Cell = string | number | boolean | null;

/** Attributes row by row, with columns in the order in which they first appear. */
export class AttributeTable {
	columns: string[] = [];
	rows: Cell[][] = [];
	/** the features' own ids, null where there is none */
	ids: (string | number | null)[] = [];
	private places = new Map<string, number>();

	add(id: string | number | null, properties: object | null): void {
		const row: Cell[] = new Array(this.columns.length).fill(null);
		for (const [name, value] of Object.entries(properties ?? {})) {
			row[this.column(name)] = cell(value);
		}
		this.ids.push(id);
		this.rows.push(row);
	}

	/** Rows all as long as the header, in the order of `keep` where given. */
	take(keep?: ArrayLike<number>): { columns: string[]; rows: Cell[][] } {
		const order = keep ? Array.from(keep) : this.rows.map((_, i) => i);
		const width = this.columns.length;
		const rows = order.map((i) => Array.from({ length: width }, (_, c) => this.rows[i][c] ?? null));
		return { columns: this.columns, rows };
	}

	private column(name: string): number {
		let place = this.places.get(name);
		if (place === undefined) {
			place = this.columns.length;
			this.places.set(name, place);
			this.columns.push(name);
		}
		return place;
	}
}

/** Anything nested is kept as its JSON text; a date as its ISO day. */
function cell(value: unknown): Cell {
	if (value === null || value === undefined) return null;
	if (typeof value === 'string' || typeof value === 'boolean') return value;
	if (typeof value === 'number') return Number.isFinite(value) ? value : null;
	if (value instanceof Date) {
		return Number.isNaN(value.getTime()) ? null : value.toISOString().slice(0, 10);
	}
	return JSON.stringify(value);
}
