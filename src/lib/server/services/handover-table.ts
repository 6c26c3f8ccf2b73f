import { exportTableCsv, exportWorkbook, type DataTable } from '../../engines/exports/index.ts';
import type { Handover } from '../../schemas/handover.ts';

/** A handover list as a file, for those who work it into other systems. */

export const handoverFormats = ['csv', 'xlsx'] as const;
export type HandoverFormat = (typeof handoverFormats)[number];

const mediaTypes: Record<HandoverFormat, string> = {
	csv: 'text/csv; charset=utf-8',
	xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

export async function handoverBytes(
	handover: Handover,
	format: HandoverFormat,
): Promise<{ name: string; mediaType: string; bytes: Uint8Array }> {
	const moves = movesTable(handover);
	return {
		name: `handover-${handover.number}.${format}`,
		mediaType: mediaTypes[format],
		bytes:
			format === 'csv'
				? exportTableCsv(moves)
				: await exportWorkbook([moves, territoriesTable(handover)]),
	};
}

function movesTable({ measures, moves, effectiveOn }: Handover): DataTable {
	return {
		name: 'Moves',
		columns: [
			{ heading: 'region', kind: 'text' },
			{ heading: 'name', kind: 'text' },
			{ heading: 'from', kind: 'text' },
			{ heading: 'from name', kind: 'text' },
			{ heading: 'to', kind: 'text' },
			{ heading: 'to name', kind: 'text' },
			...measures.map(({ name, unit }) => ({ heading: name, unit, kind: 'number' as const })),
			{ heading: 'reason', kind: 'text' },
			{ heading: 'effective date', kind: 'date' },
			{ heading: 'state', kind: 'text' },
			{ heading: 'word', kind: 'text' },
			{ heading: 'by', kind: 'text' },
		],
		rows: moves.map((move) => [
			...[move.region.key, move.region.name],
			...[move.from?.key ?? null, move.from?.name ?? null, move.to.key, move.to.name],
			...measures.map(({ name }) => move.figures[name] ?? null),
			...[move.reason, effectiveOn, move.state, move.word, move.by],
		]),
	};
}

function territoriesTable({ measures, territories }: Handover): DataTable {
	return {
		name: 'Territories',
		columns: [
			{ heading: 'territory', kind: 'text' },
			{ heading: 'name', kind: 'text' },
			{ heading: 'person', kind: 'text' },
			{ heading: 'regions gained', kind: 'number' },
			{ heading: 'regions lost', kind: 'number' },
			...measures.map(({ name, unit }) => ({
				...{ heading: `${name}, gained less lost`, unit },
				kind: 'number' as const,
			})),
		],
		rows: territories.map((one) => [
			...[one.key, one.name, one.person, one.gains, one.losses],
			...measures.map(({ name }) => one.balance[name] ?? 0),
		]),
	};
}
