import writeExcelFile, { type Cell } from 'write-excel-file/universal';
import { repeatableZip } from '../src/lib/engines/exports/repeatable-zip.ts';
import type { Distributor } from './distributor.ts';
import { randomStream, shuffled } from './random.ts';

type Row = Distributor['rows'][number];

/** Faults by how many rows have them; README.md lists them. */
const faults = { misspelt: 4, wordsInNumbers: 5, unknown: 2, empty: 3, doubled: 1, left: 2 };

/**
 * The outlets as somebody's office sent them, for practising: a cover sheet first, title rows, headings in
 * two rows with merged cells, codes whose leading zeros were eaten, words in numbers, names misspelt, a
 * district twice, two left out, and a line of sums at the foot.
 */
export async function asReceived({ rows }: Distributor, seed: number): Promise<Uint8Array> {
	const order = shuffled(rows, randomStream(seed + 7));
	const lines = order.slice(faults.left).map(line);
	spoil(lines, order.slice(faults.left));
	const [outlets, hours] = [total(order, 'outlets'), total(order, 'hours')];
	const sums: Cell[] = [null, 'All districts', outlets, hours, null, null];
	const blob = await writeExcelFile([
		{ data: [['Please see the second sheet. Figures as of the autumn count.']], sheet: 'Read me' },
		{ data: [...headings(), ...lines, sums], sheet: 'Outlets 2026' },
	]).toBlob();
	return repeatableZip(new Uint8Array(await blob.arrayBuffer()));
}

/** Two rows of title, one empty, then headings over two rows, the upper ones merged. */
const headings = (): Cell[][] => [
	[{ value: 'Quellorn Bakery Supply', fontWeight: 'bold', columnSpan: 6 }],
	['Outlets by district, autumn count'],
	[],
	[
		{ value: 'District', columnSpan: 2 },
		null,
		{ value: 'Figures', columnSpan: 3 },
		null,
		null,
		'Round',
	],
	['Code', 'Name', 'Outlets', 'Visits (hours a year)', 'Potential (thousand skells)', 'Territory'],
];

/** A code as a number: its leading zero is gone. */
const line = (row: Row): Cell[] => [
	...[Number(row.code), row.name, row.outlets, row.hours, row.potential],
	row.territory,
];

function spoil(lines: Cell[][], rows: readonly Row[]): void {
	let at = 3;
	const next = () => (at += 7) - 7;
	for (let n = 0; n < faults.misspelt; n++) {
		const place = next();
		lines[place][0] = null;
		lines[place][1] = misspelt(rows[place].name);
	}
	for (let n = 0; n < faults.wordsInNumbers; n++) {
		const place = next();
		lines[place][3] = [`${rows[place].hours} h`, `ca. ${rows[place].hours}`, 'n/a'][n % 3];
	}
	for (let n = 0; n < faults.unknown; n++) lines[next()][0] = 9901 + n;
	for (let n = 0; n < faults.empty; n++) lines[next()][4] = null;
	lines[next()][2] = -3;
	lines.push([...lines[next()]]);
}

/** A doubled letter in the middle, and the accents lost. */
function misspelt(name: string): string {
	const plain = name.normalize('NFKD').replace(/\p{M}/gu, '');
	const middle = Math.floor(plain.length / 2);
	return plain.slice(0, middle) + plain[middle - 1] + plain.slice(middle);
}

const total = (rows: readonly Row[], what: 'outlets' | 'hours'): number =>
	rows.reduce((sum, row) => sum + row[what], 0);
