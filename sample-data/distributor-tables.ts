import type { DataTable } from '../src/lib/engines/exports/data-table.ts';
import type { Distributor } from './distributor.ts';

/** The distributor's books as tables: outlets by district, its territories, its ferries. */
export function distributorTables({ rows, territories, ferries }: Distributor): {
	outlets: DataTable;
	territories: DataTable;
	ferries: DataTable;
} {
	return {
		outlets: {
			name: 'Outlets',
			columns: [
				{ heading: 'code', kind: 'text' },
				{ heading: 'name', kind: 'text' },
				{ heading: 'outlets', kind: 'number' },
				{ heading: 'visits', unit: 'hours a year', kind: 'number' },
				{ heading: 'potential', unit: 'thousand skells', kind: 'number' },
				{ heading: 'territory', kind: 'text' },
			],
			rows: rows.map((row) => [
				...[row.code, row.name, row.outlets, row.hours, row.potential],
				row.territory,
			]),
		},
		territories: {
			name: 'Territories',
			columns: [
				{ heading: 'territory', kind: 'text' },
				{ heading: 'name', kind: 'text' },
				{ heading: 'person', kind: 'text' },
				{ heading: 'base', kind: 'text' },
				{ heading: 'capacity', unit: 'share of full time', kind: 'number' },
				{ heading: 'e-mail', kind: 'text' },
				{ heading: 'note', kind: 'text' },
			],
			rows: territories.map((row) => [
				...[row.key, row.name, row.person, row.base, row.capacity, row.email],
				row.note,
			]),
		},
		ferries: {
			name: 'Ferries',
			columns: [
				{ heading: 'from', kind: 'text' },
				{ heading: 'to', kind: 'text' },
			],
			rows: ferries.map(({ from, to }) => [from, to]),
		},
	};
}
