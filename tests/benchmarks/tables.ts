import {
	guessJoin,
	joinTable,
	readTable,
	takeValues,
	typeColumns,
} from '../../src/lib/engines/measures/index.ts';
import { utf8 } from '../support/tables.ts';
import { handMade, sheetData } from '../support/workbook.ts';

const rows = 200_000;
const regions = 33_000;

/** Six columns; every region stands in six rows or so, one key in a hundred has lost a letter. */
const cells = (i: number) => {
	const key = String(i % regions).padStart(6, '0');
	return [
		i % 100 ? key : key.slice(1),
		`Region ${i % regions}`,
		i / 8,
		i % 977,
		'north',
		`note ${i % 7}`,
	];
};
const heading = ['Key', 'Name', 'Visits [h]', 'Accounts', 'Side', 'Note'];

/**
 * Reading, typing and joining 200,000 rows of six columns to 33,000 regions: milliseconds of
 * processor time, which other programs do not lengthen, and peak memory.
 */
export async function* run(): AsyncGenerator<object> {
	const table = [heading, ...Array.from({ length: rows }, (_, i) => cells(i))];
	const csv = table.map((row) => row.join(';')).join('\r\n');
	yield* measure('csv', utf8(csv));
	yield* measure('xlsx', handMade({ sheets: { Figures: sheetData(table) } }));
}

async function* measure(format: string, bytes: Uint8Array): AsyncGenerator<object> {
	const keys = Array.from({ length: regions }, (_, i) => String(i).padStart(6, '0'));
	const joined = { keys, names: keys.map((_, i) => `Region ${i}`) };
	const clock = stopwatch();
	const result = await readTable(bytes);
	if (result.status !== 'read') throw new Error(result.message);
	const readMs = clock();
	const typed = typeColumns(result.table, result.source);
	const typeMs = clock();
	const choice = guessJoin(result.table, typed, joined);
	if (!choice) throw new Error('No column to join by.');
	const guessMs = clock();
	const join = joinTable(result.table, choice, joined);
	const joinMs = clock();
	const rules = {
		doubled: 'sum',
		empty: 'missing',
		negative: 'keep',
		notNumber: 'refuse',
	} as const;
	const taken = takeValues(join, typed[2], rules);
	const takeMs = clock();
	yield {
		benchmark: 'tables',
		format,
		bytes: bytes.length,
		rows: result.table.rows,
		joinedBy: result.table.headings[choice.column],
		unmatched: join.unmatched.length,
		taken: taken.status,
		...{ readMs, typeMs, guessMs, joinMs, takeMs },
		// of the process so far, the making of the file included
		peakMB: Math.round(process.resourceUsage().maxRSS / 1024),
	};
}

function stopwatch(): () => number {
	let last = process.cpuUsage();
	return () => {
		const { user, system } = process.cpuUsage(last);
		last = process.cpuUsage();
		return Math.round((user + system) / 1000);
	};
}
