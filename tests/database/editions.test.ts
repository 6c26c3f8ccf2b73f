import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { buffer } from 'node:stream/consumers';
import { sql } from 'kysely';
import { SaxesParser } from 'saxes';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { digestOf, type EditionContent } from '../../src/lib/engines/editions/index.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { draftSvg } from '../../src/lib/server/services/drawing.service.ts';
import {
	editionFile,
	issueEdition,
	readEdition,
} from '../../src/lib/server/services/edition.service.ts';
import { Conflict, NotFound } from '../../src/lib/server/services/outcomes.ts';
import { deskSheet, removeSheet } from '../../src/lib/server/services/sheet.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let maker: Member;
let approver: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	maker = await createMember(shop.db, 'editions', 'cartographer', 'analyst');
	approver = await createMember(shop.db, 'editions', 'approver');
	const file = readFileSync('sample-data/tavaroe.geojson');
	await ingest(shop, maker, 'tavaroe.geojson', file, { keyField: 'code', nameField: 'name' });
});
afterAll(() => shop.close());

const desk = () => deskSheet(shop, approver, 1);
const issueNow = async (note = '') =>
	issueEdition(shop, approver, 1, (await desk()).revision, note);

async function download(edition: number, extension: string): Promise<Buffer> {
	const { files } = await readEdition(shop, approver, 1, edition);
	const name = files.find((file) => file.name.endsWith(extension))?.name ?? '';
	return buffer(await (await editionFile(shop, approver, 1, edition, name)).open());
}

async function relock(key: string, ink: number) {
	const { draft, revision } = await desk();
	const document = { ...draft, locks: { ...draft.locks, [key]: { ink, cost: 1 } } };
	return saveDraft(shop, maker, 1, { revision, document });
}

describe('issuing', () => {
	it('needs the right to, and the draft as it is now', async () => {
		const { revision } = await desk();
		await expect(issueEdition(shop, maker, 1, revision, '')).rejects.toBeInstanceOf(Forbidden);
		await expect(issueEdition(shop, approver, 1, revision - 1, '')).rejects.toMatchObject({
			code: 'stale',
		});
		await expect(issueEdition(shop, approver, 2, 1, '')).rejects.toBeInstanceOf(NotFound);
		expect((await desk()).editions).toEqual([]);
	});

	it('makes a numbered edition with its files and a digest over what decides its looks', async () => {
		const issued = await issueNow('The first');
		expect(issued.number).toBe(1);
		const [edition] = (await desk()).editions;
		expect(edition).toMatchObject({ number: 1, note: 'The first', digest: issued.digest });
		expect(edition.issuedBy).toBe('approver of editions');
		expect(edition.files.map(({ name }) => name)).toEqual([
			'tavaroe-edition-1.csv',
			'tavaroe-edition-1.geojson',
			'tavaroe-edition-1.svg',
		]);
		const row = await shop.db.selectFrom('editions').selectAll().executeTakeFirstOrThrow();
		const content = row.content as unknown as EditionContent;
		expect(await digestOf(content)).toBe(issued.digest);
		expect(Object.keys(content.colouring)).toHaveLength(180);
	});

	it('writes files that other programs read', async () => {
		const svg = String(await download(1, '.svg'));
		const seen = { keys: new Set<string>(), ids: new Set<string>() };
		const parser = new SaxesParser();
		parser.on('error', (problem) => {
			throw problem;
		});
		parser.on('opentag', ({ name, attributes }) => {
			expect(name).not.toMatch(/script/i);
			if (attributes['data-key']) seen.keys.add(attributes['data-key']);
			if (attributes.id) {
				expect(seen.ids.has(attributes.id)).toBe(false);
				seen.ids.add(attributes.id);
			}
		});
		parser.write(svg).close();
		expect(seen.keys.size).toBe(180);
		expect(svg).toMatch(/Edition 1, \d{1,2} \p{L}+ \d{4}/u);
		const { features } = JSON.parse(String(await download(1, '.geojson')));
		expect(features).toHaveLength(180);
		const lines = String(await download(1, '.csv'))
			.trim()
			.split('\r\n');
		expect(lines).toHaveLength(181);
	});
});

describe('an issued edition', () => {
	it('stays byte for byte the same while the draft goes on', async () => {
		const before = await download(1, '.svg');
		const { colouring, regions } = await desk();
		const inks = colouring?.status === 'coloured' ? colouring.inks : [];
		await relock('0101', (inks[regions.key.indexOf('0101')] + 1) % 4);
		const second = await issueNow();
		expect(second.number).toBe(2);
		expect(await download(1, '.svg')).toEqual(before);
		expect(await download(2, '.svg')).not.toEqual(before);
		const { files } = await readEdition(shop, approver, 1, 1);
		for (const { name } of files) {
			const file = await editionFile(shop, approver, 1, 1, name);
			const digest = createHash('sha256').update(await buffer(await file.open()));
			expect(digest.digest('hex')).toBe(file.digest);
		}
	});

	it('cannot be changed in the database either', async () => {
		const statements = [
			sql`update editions set digest = 'x'`,
			sql`update editions set number = 9`,
			sql`update edition_files set digest = 'x'`,
		];
		for (const statement of statements) {
			await expect(statement.execute(shop.db)).rejects.toThrow('does not change');
		}
	});

	it('keeps its sheet from being deleted', async () => {
		await expect(removeSheet(shop, maker, 1)).rejects.toBeInstanceOf(Conflict);
	});

	it('is unknown to another team', async () => {
		const stranger = await createMember(shop.db, 'others', 'approver');
		await expect(readEdition(shop, stranger, 1, 1)).rejects.toBeInstanceOf(NotFound);
		await expect(editionFile(shop, stranger, 1, 1, 'tavaroe-edition-1.svg')).rejects.toBeInstanceOf(
			NotFound,
		);
		await expect(editionFile(shop, approver, 1, 1, '../secret')).rejects.toBeInstanceOf(NotFound);
	});
});

describe('what cannot be issued', () => {
	it('two at once get numbers one after the other', async () => {
		const issued = await Promise.all([issueNow(), issueNow(), issueNow()]);
		expect(issued.map(({ number }) => number).sort()).toEqual([3, 4, 5]);
		expect(new Set(issued.map(({ digest }) => digest)).size).toBe(1);
	});

	it('a draft whose locks collide', async () => {
		const { borders, regions } = await desk();
		await relock(regions.key[borders.a[0]], 1);
		await relock(regions.key[borders.b[0]], 1);
		const stored = await shop.stored();
		await expect(issueNow()).rejects.toMatchObject({ code: 'not-coloured' });
		expect(await shop.stored()).toEqual(stored);
		expect((await desk()).editions).toHaveLength(5);
	});
});

describe('the draft as a file', () => {
	it('has another tag for every revision and reader', async () => {
		const one = await draftSvg(shop, approver, 1, 'typical');
		const two = await draftSvg(shop, approver, 1, 'deutan');
		expect(one.tag).not.toBe(two.tag);
		expect((await one.paint()).length).toBeGreaterThan(1_000);
		await relock('0102', 2);
		expect((await draftSvg(shop, approver, 1, 'typical')).tag).not.toBe(one.tag);
	});
});
