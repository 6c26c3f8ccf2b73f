import { Readable } from 'node:stream';
import type { MeasureSent } from '../../schemas/api/measures.ts';
import type { TableReading } from '../../schemas/measure-forms.ts';
import type { DeskMeasure } from '../../schemas/desk-territories.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Received } from '../files/index.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { listMeasureTables, readMeasures } from '../repositories/measures.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { sheetOf } from './draft.service.ts';
import { optionsOf } from './measure-options.ts';
import { takeTable } from './measure-taking.service.ts';
import { dropTable } from './measure-upkeep.service.ts';
import { enterTable, readBytes } from './measure-entry.ts';
import { deskMeasures } from './measures.service.ts';
import { Conflict, NotFound, Unfit } from './outcomes.ts';

/** A measure by its name, with its values by region key. */
export async function measureByName(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	name: string,
): Promise<{ measure: DeskMeasure; values: Record<string, number> }> {
	requireAccess(member, 'measures.read');
	const { measures } = await deskMeasures(shop, member, number);
	const measure = measures.find((one) => one.name === name);
	if (!measure) throw new NotFound('measure');
	const sheet = await sheetOf(shop.db, member, number);
	const row = (await readMeasures(shop.db, sheet.id)).find(({ id }) => id === measure.id);
	// what is stale is numbered as the boundaries were when it was joined
	const { keys } = await boundaryView(shop.db, row?.boundary_set_id ?? sheet.boundary_set_id);
	const entries = keys.flatMap((key, region) => {
		const value = measure.values[region];
		return value === null || value === undefined ? [] : [[key, value] as const];
	});
	return { measure, values: Object.fromEntries(entries) };
}

/**
 * Stores a measure that a program sends. It becomes a table like any other, read, joined by key and checked
 * on the same way; the file kept holds what is stored, so that it can be joined again.
 */
export async function feedMeasure(
	shop: Workshop,
	member: Member,
	number: number,
	name: string,
	sent: MeasureSent,
): Promise<{ measure: DeskMeasure; change: string | null }> {
	requireAccess(member, 'measures.edit');
	if (name.trim() !== name || name === '' || name.length > 200) {
		throw new Unfit('bad-name', 'a measure’s name has 1 to 200 characters, no blanks at its ends');
	}
	const values = await valuesToStore(shop, member, number, name, sent);
	const file = await shop.files.receive(Readable.from([csvOf(name, values)]));
	const table = await enterFed(shop, member, number, { name, sent, file });
	try {
		const { sentences } = await takeTable(shop, member, number, table, sent.confidential);
		await dropReplacedFeeds(shop, member, number);
		const { measure } = await measureByName(shop, member, number, name);
		return { measure, change: sentences[0]?.slice(name.length + 2) ?? null };
	} catch (problem) {
		await dropTable(shop, member, number, table);
		throw problem;
	}
}

/** A program sends again; what it sent before and nothing is left of need not be kept. */
async function dropReplacedFeeds(shop: Workshop, member: Member, number: number): Promise<void> {
	const sheet = await sheetOf(shop.db, member, number);
	for (const row of await listMeasureTables(shop.db, sheet.id)) {
		if (row.state === 'replaced' && optionsOf(row).fed) {
			await dropTable(shop, member, number, row.number);
		}
	}
}

/** What was sent, checked against the regions and, with `add`, on top of what is there. */
async function valuesToStore(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	name: string,
	{ unit, values, mode }: MeasureSent,
): Promise<Map<string, number>> {
	const sheet = await sheetOf(shop.db, member, number);
	const { keys } = await boundaryView(shop.db, sheet.boundary_set_id);
	const stored = new Map(Object.entries(values));
	requireKnown([...stored.keys()], new Set(keys));
	requireNoneBelowZero(stored);
	if (stored.size === 0) throw new Unfit('no-values', 'send a value for at least one region');
	if (mode === 'replace') return stored;
	const { measures } = await deskMeasures(shop, member, number);
	const before = measures.find((one) => one.name === name);
	if (!before) return stored;
	if (before.stale) {
		throw new Conflict(
			'stale',
			'what is there is joined to earlier boundaries; replace it instead',
		);
	}
	if (before.unit !== unit) {
		const units = { there: before.unit, sent: unit };
		throw new Unfit('other-unit', 'only the same unit can be added', units);
	}
	before.values.forEach((value, region) => {
		if (value === null) return;
		stored.set(keys[region], value + (stored.get(keys[region]) ?? 0));
	});
	return stored;
}

function requireKnown(sent: string[], known: Set<string>): void {
	const unknown = sent.filter((key) => !known.has(key));
	if (unknown.length === 0) return;
	const named = unknown.slice(0, 20);
	throw new Unfit(
		'unknown-regions',
		`the sheet has no region ${named.map((key) => JSON.stringify(key)).join(', ')}${unknown.length > 20 ? ` and ${unknown.length - 20} more` : ''}`,
		{ regions: named, count: unknown.length },
	);
}

function requireNoneBelowZero(values: Map<string, number>): void {
	const below = [...values].filter(([, value]) => value < 0).map(([key]) => key);
	if (below.length === 0) return;
	throw new Unfit('negative', 'a measure has no values below zero', {
		regions: below.slice(0, 20),
		count: below.length,
	});
}

const quoted = (text: string): string => `"${text.replaceAll('"', '""')}"`;

/** As RFC 4180 writes it. */
const csvOf = (name: string, values: Map<string, number>): Buffer =>
	Buffer.from(
		[
			`"region key",${quoted(name)}`,
			...[...values].map(([key, value]) => `${quoted(key)},${value}`),
		].join('\r\n'),
	);

async function enterFed(
	shop: Workshop,
	member: Member,
	number: number,
	{ name, sent, file }: { name: string; sent: MeasureSent; file: Received },
): Promise<number> {
	const text = { delimiter: ',', encoding: 'utf-8', decimal: '.' } as const;
	const reading: TableReading = { ...text, headingRow: 1, headingRows: 1 };
	try {
		const read = await readBytes(shop, file.path, 'sent.csv', reading);
		const rules = { doubled: 'refuse', empty: 'missing', notNumber: 'refuse' } as const;
		const column = { column: 1, name, unit: sent.unit, kind: 'number' } as const;
		const entered = await enterTable(shop, member, number, {
			...{ fileName: 'sent over the API', file, name, reading, read },
			options: {
				join: { column: 0, by: 'key' },
				columns: [{ ...column, ...rules, negative: 'refuse' }],
				existing: 'replace',
				fed: true,
			},
		});
		return entered.number;
	} finally {
		await file.discard();
	}
}
