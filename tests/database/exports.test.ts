import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { buffer } from 'node:stream/consumers';
import { sql } from 'kysely';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { exportKinds } from '../../src/lib/engines/exports/index.ts';
import { askExport } from '../../src/lib/schemas/export.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { runExport } from '../../src/lib/server/jobs/export.job.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import {
	editionFile,
	issueEdition,
	readEdition,
} from '../../src/lib/server/services/edition.service.ts';
import { endExpiredExports, stopExport } from '../../src/lib/server/services/export-end.service.ts';
import { mostOpenExports } from '../../src/lib/server/services/ask-export.ts';
import {
	askForExport,
	deskExports,
	exportFileOf,
	readExport,
	sheetExports,
} from '../../src/lib/server/services/exports.service.ts';
import { Conflict, NotFound, Unfit } from '../../src/lib/server/services/outcomes.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let maker: Member;
let designer: Member;
let approver: Member;
let admin: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	maker = await createMember(shop.db, 'exports', 'cartographer', 'analyst');
	designer = await createMember(shop.db, 'exports', 'designer');
	approver = await createMember(shop.db, 'exports', 'approver');
	admin = await createMember(shop.db, 'exports', 'admin');
	const file = readFileSync('sample-data/tavaroe.geojson');
	await ingest(shop, maker, 'tavaroe.geojson', file, { keyField: 'code', nameField: 'name' });
	const { revision } = await deskSheet(shop, approver, 1);
	await issueEdition(shop, approver, 1, revision, '');
});
afterAll(() => shop.close());

const never = new AbortController().signal;
const ask = (wanted: object, member = designer) =>
	askForExport(shop, member, 1, askExport.parse(wanted));

/** Row of an export, with what no page is told. */
const rowOf = (number: number) =>
	shop.db.selectFrom('exports').selectAll().where('number', '=', number).executeTakeFirstOrThrow();

const make = async (number: number) => runExport(shop, (await rowOf(number)).id, never);

async function made(wanted: object) {
	const { number } = await ask(wanted);
	await make(number);
	const note = await readExport(shop, designer, 1, number);
	expect(note).toMatchObject({ state: 'done', sentence: '' });
	return { note, bytes: await bytesOf(number) };
}
const bytesOf = async (number: number) =>
	buffer(await (await exportFileOf(shop, designer, 1, number)).open());

/** As if the row had never been: the next request makes it again. */
async function forget(number: number) {
	await shop.db
		.updateTable('exports')
		.set({ expires_at: new Date(0) })
		.where('number', '=', number)
		.execute();
	await endExpiredExports(shop.db, shop.files);
	await expect(readExport(shop, designer, 1, number)).rejects.toBeInstanceOf(NotFound);
}

const relabel = async (title: string) => {
	const { draft, revision } = await deskSheet(shop, maker, 1);
	const document = { ...draft, layout: { ...draft.layout, title } };
	return saveDraft(shop, maker, 1, { revision, document });
};

describe('a file of an edition', () => {
	it('is made by a job, kept by its digest, and told with its size', async () => {
		const { note, bytes } = await made({ kind: 'csv', edition: 1 });
		expect(note.file).toMatchObject({
			...{ name: 'tavaroe-edition-1.csv', mediaType: 'text/csv; charset=utf-8' },
			...{ bytes: bytes.length, digest: createHash('sha256').update(bytes).digest('hex') },
		});
		expect(note).toMatchObject({ edition: 1, expiresAt: null, createdBy: 'designer of exports' });
		expect(String(bytes).trim().split('\r\n')).toHaveLength(181);
	});

	it('is the very file that was issued where that is of the same kind', async () => {
		const { files } = await readEdition(shop, approver, 1, 1);
		const name = files.find((file) => file.name.endsWith('.svg'))!.name;
		const issued = await buffer(await (await editionFile(shop, approver, 1, 1, name)).open());
		const { bytes } = await made({ kind: 'svg', edition: 1 });
		expect(bytes.equals(issued)).toBe(true);
	});

	it('is made once for all who ask in the same words', async () => {
		const [one, two] = await Promise.all([
			ask({ kind: 'geojson', edition: 1 }),
			ask({ kind: 'geojson', edition: 1 }, approver),
		]);
		expect(two.number).toBe(one.number);
		await make(one.number);
		const again = await ask({ kind: 'geojson', edition: 1, options: {} });
		expect(again).toMatchObject({ number: one.number, state: 'done' });
		const other = await ask({ kind: 'svg', edition: 1, reader: 'deutan' });
		expect(other.number).not.toBe(one.number);
		await stopExport(shop, designer, 1, other.number);
	});

	it('comes out byte for byte the same when it is made again, after the draft went on', async () => {
		const asked = { kind: 'svg', edition: 1, reader: 'protan' };
		const first = await made(asked);
		expect(String(first.bytes)).toMatch(/Edition 1, \d+ \p{L}+ \d{4}, as protan readers/u);
		expect(first.note.file?.name).toBe('tavaroe-edition-1-protan.svg');
		await forget(first.note.number);
		expect(await shop.files.has(first.note.file!.digest)).toBe(false);
		await relabel('Renamed since the edition');
		const second = await made(asked);
		expect(second.bytes.equals(first.bytes)).toBe(true);
		expect(String(second.bytes)).not.toContain('Renamed since');
	});

	it(
		'can be of every kind, each the same bytes whenever it is made',
		{ timeout: 300_000 },
		async () => {
			const names = new Set<string>();
			for (const { id, extension } of exportKinds) {
				const first = await made({ kind: id, edition: 1 });
				expect(first.note.file?.name).toBe(`tavaroe-edition-1.${extension}`);
				names.add(first.note.file!.name);
				await forget(first.note.number);
				const second = await made({ kind: id, edition: 1 });
				expect(second.bytes.equals(first.bytes), id).toBe(true);
			}
			expect(names.size).toBe(exportKinds.length);
		},
	);

	it('is refused when the stored boundaries are not those it was issued with', async () => {
		const { number } = await ask({ kind: 'csv', edition: 1, options: { byteOrderMark: false } });
		const { boundarySet } = await deskSheet(shop, approver, 1);
		const spoil = (name: string) =>
			shop.db
				.updateTable('regions')
				.set({ attributes: sql`jsonb_set(attributes, '{name}', to_jsonb(${name}::text))` })
				.where('boundary_set_id', '=', boundarySet.id)
				.where('key', '=', '0101')
				.execute();
		const { attributes } = await shop.db
			.selectFrom('regions')
			.select('attributes')
			.where('boundary_set_id', '=', boundarySet.id)
			.where('key', '=', '0101')
			.executeTakeFirstOrThrow();
		await spoil('Elsewhere');
		await make(number);
		await spoil(String((attributes as { name: unknown }).name));
		const note = await readExport(shop, designer, 1, number);
		expect(note).toMatchObject({ state: 'failed', file: null });
		expect(note.sentence).toContain('not those that this edition was issued with');
	});
});

describe('a file of the draft', () => {
	it('says that it is one, and is another for each revision', async () => {
		const { revision } = await deskSheet(shop, maker, 1);
		const { note, bytes } = await made({ kind: 'svg' });
		expect(String(bytes)).toContain(`DRAFT ${revision}, not issued`);
		expect(note.file?.name).toBe(`tavaroe-draft-${revision}.svg`);
		expect(new Date(note.expiresAt!).getTime()).toBeGreaterThan(Date.now() + 6 * 86_400_000);
		expect((await ask({ kind: 'svg' })).number).toBe(note.number);
		await relabel('Another title');
		const later = await made({ kind: 'svg' });
		expect(later.note.number).not.toBe(note.number);
		expect(String(later.bytes)).toContain('Another title');
	});

	it('is of the revision that was looked at, or none', async () => {
		const { revision } = await deskSheet(shop, maker, 1);
		const asked = askExport.parse({ kind: 'css' });
		const stale = askForExport(shop, designer, 1, asked, revision - 1);
		await expect(stale).rejects.toMatchObject({ code: 'stale' });
		const note = await askForExport(shop, designer, 1, asked, revision);
		expect(note).toMatchObject({ revision, edition: null });
		await stopExport(shop, designer, 1, note.number);
	});

	it('is kept for as long again when it is asked for again', async () => {
		const { note } = await made({ kind: 'tokens' });
		await shop.db
			.updateTable('exports')
			.set({ expires_at: new Date(Date.now() + 3_600_000) })
			.where('number', '=', note.number)
			.execute();
		const again = await ask({ kind: 'tokens' });
		expect(again.number).toBe(note.number);
		expect(new Date(again.expiresAt!).getTime()).toBeGreaterThan(Date.now() + 6 * 86_400_000);
	});

	it('is dropped when its time is over, and the bytes with it unless another row has them', async () => {
		const { note } = await made({ kind: 'csv' });
		const { digest } = note.file!;
		expect((await readEdition(shop, approver, 1, 1)).files.length).toBeGreaterThan(0);
		await forget(note.number);
		// the edition's table has the same content, and its file stays
		expect(await shop.files.has(digest)).toBe(true);
	});
});

describe('what is asked', () => {
	it('names only options that the kind has, and readers where something is drawn', async () => {
		const dpi = ask({ kind: 'csv', edition: 1, options: { dpi: 300 } });
		await expect(dpi).rejects.toThrow('CSV has no option "dpi".');
		await expect(ask({ kind: 'css', reader: 'grey' })).rejects.toBeInstanceOf(Unfit);
		expect(askExport.safeParse({ kind: 'png', options: { dpi: 6_000 } }).success).toBe(false);
		expect(askExport.safeParse({ kind: 'doc' }).success).toBe(false);
	});

	it('is about an edition that there is', async () => {
		await expect(ask({ kind: 'svg', edition: 9 })).rejects.toBeInstanceOf(NotFound);
		await expect(askForExport(shop, designer, 9, askExport.parse({ kind: 'svg' }))).rejects.toThrow(
			NotFound,
		);
	});
});

describe('stopping', () => {
	it('ends the job, leaves no bytes, and lets it be asked for again', async () => {
		const asked = { kind: 'svg', edition: 1, options: { colours: 'attribute' } };
		const before = (await shop.stored()).length;
		const { number } = await ask(asked);
		const running = make(number);
		await stopExport(shop, designer, 1, number);
		await running;
		expect(await readExport(shop, designer, 1, number)).toMatchObject({
			...{ state: 'cancelled', file: null },
		});
		expect((await shop.stored()).length).toBe(before);
		await expect(stopExport(shop, designer, 1, number)).rejects.toBeInstanceOf(Conflict);
		await expect(exportFileOf(shop, designer, 1, number)).rejects.toBeInstanceOf(Conflict);
		const again = await ask(asked);
		expect(again.number).not.toBe(number);
		await stopExport(shop, designer, 1, again.number);
	});
});

/** As a page is told of them. */
const offered = async (member: Member, one: number) =>
	(await deskExports(shop, member, 1, [one])).map(({ number, mayStop }) => [number, mayStop]);

describe('somebody else’s file', () => {
	it('is stopped by the one who asked or by an admin, by nobody else', async () => {
		const asked = { kind: 'svg', edition: 1, reader: 'grey' };
		const { number } = await ask(asked);
		expect(await offered(approver, number)).toEqual([[number, false]]);
		await expect(stopExport(shop, approver, 1, number)).rejects.toBeInstanceOf(Forbidden);
		const token: Member = { ...approver, userId: null, roles: [], actions: ['files.download'] };
		await expect(stopExport(shop, token, 1, number)).rejects.toBeInstanceOf(Forbidden);
		expect(await readExport(shop, designer, 1, number)).toMatchObject({ state: 'waiting' });
		expect(await offered(designer, number)).toEqual([[number, true]]);
		await stopExport(shop, designer, 1, number);
		const again = await ask(asked);
		expect(await offered(admin, again.number)).toEqual([[again.number, true]]);
		await stopExport(shop, admin, 1, again.number);
	});
});

describe('the list', () => {
	it('keeps files of editions, however many drafts were taken since', async () => {
		const { number } = await ask({ kind: 'css', edition: 1 });
		const row = await rowOf(number);
		const { id: _, options, ...same } = row;
		const drafts = Array.from({ length: 250 }, (_one, i) => ({
			...same,
			...{ number: 100_000 + i, edition: null, options: JSON.stringify(options) },
			...{ state: 'cancelled' as const, request_digest: String(i), expires_at: new Date(0) },
			...{ file_digest: null, file_bytes: null, media_type: null },
		}));
		await shop.db.insertInto('exports').values(drafts).execute();
		const listed = (await sheetExports(shop, designer, 1)).map((one) => one.number);
		await endExpiredExports(shop.db, shop.files);
		expect(listed).toContain(number);
		expect(listed).toEqual([...listed].sort((a, b) => b - a));
	});
});

describe('rights and limits', () => {
	it('are those of the team, and what is another team’s is not there', async () => {
		const stranger = await createMember(shop.db, 'export-strangers', 'designer');
		const { number } = await ask({ kind: 'svg', edition: 1 });
		for (const attempt of [
			() => ask({ kind: 'svg' }, stranger),
			() => sheetExports(shop, stranger, 1),
			() => readExport(shop, stranger, 1, number),
			() => exportFileOf(shop, stranger, 1, number),
			() => stopExport(shop, stranger, 1, number),
		]) {
			await expect(attempt()).rejects.toBeInstanceOf(NotFound);
		}
		const reading: Member = { ...designer, roles: [], actions: ['sheet.read'] };
		await expect(ask({ kind: 'svg' }, reading)).rejects.toBeInstanceOf(Forbidden);
		await expect(readExport(shop, reading, 1, number)).rejects.toBeInstanceOf(Forbidden);
	});

	it('let so many wait at once and no more', async () => {
		const dpi = (i: number) => ({ kind: 'png', edition: 1, options: { dpi: 72 + i } });
		for (const { number, state } of await sheetExports(shop, designer, 1)) {
			if (state === 'waiting') await stopExport(shop, admin, 1, number);
		}
		const numbers: number[] = [];
		for (let i = 0; i < mostOpenExports; i++) numbers.push((await ask(dpi(i))).number);
		await expect(ask(dpi(400))).rejects.toMatchObject({ code: 'too-many-open' });
		for (const number of numbers) await stopExport(shop, designer, 1, number);
	});

	it('are written down', async () => {
		const actions = await shop.db
			.selectFrom('activity')
			.select('action')
			.where('action', 'like', 'export.%')
			.distinct()
			.execute();
		expect(actions.map(({ action }) => action).sort()).toEqual([
			...['export.asked', 'export.failed', 'export.made', 'export.stopped'],
		]);
	});
});
