import { readFileSync } from 'node:fs';
import { unzipSync } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkProofText } from '../../src/lib/engines/colouring/index.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { issueEdition } from '../../src/lib/server/services/edition.service.ts';
import { Conflict, NotFound } from '../../src/lib/server/services/outcomes.ts';
import { proofAsked, sheetProof } from '../../src/lib/server/services/proof.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let maker: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	maker = await createMember(shop.db, 'proofs', 'cartographer', 'analyst');
	const file = readFileSync('sample-data/tavaroe.geojson');
	await ingest(shop, maker, 'tavaroe.geojson', file, { keyField: 'code', nameField: 'name' });
});
afterAll(() => shop.close());

const desk = () => deskSheet(shop, maker, 1);
const proof = (format: 'json' | 'zip', revision?: number, sheet = 1) =>
	sheetProof(shop, maker, sheet, { revision, format }, new AbortController().signal);
const checked = async (revision?: number) => {
	const { bytes } = await proof('json', revision);
	return checkProofText(new TextDecoder().decode(bytes));
};

describe('the proof of a sheet', () => {
	it('shows that its inks do and that fewer do not', async () => {
		const { claims, faults, valid, about } = await checked();
		expect(faults).toEqual([]);
		expect(valid).toBe(true);
		expect(about).toContain('180 regions');
		expect(claims.map((claim) => /with (\d+) inks?/.exec(claim)?.[1])).toEqual(['4', '3']);
	});

	it('is there in open forms as well, the same bytes each time', async () => {
		const { bytes, name, mediaType } = await proof('zip');
		expect(Object.keys(unzipSync(bytes)).sort()).toEqual(
			['part.cnf', 'part.col', 'proof.drup', 'read-me.txt', 'regions.csv'].sort(),
		);
		expect(name).toMatch(/^tavaroe-revision-1-proof\.zip$/);
		expect(mediaType).toBe('application/zip');
		expect(Buffer.from((await proof('zip')).bytes).equals(Buffer.from(bytes))).toBe(true);
	});

	it('of a draft whose locks collide is the proof of the collision; earlier drafts keep theirs', async () => {
		const { draft, revision, regions, borders } = await desk();
		const [a, b] = [regions.key[borders.a[0]], regions.key[borders.b[0]]];
		const lock = { ink: 0, cost: 1 };
		const document = { ...draft, locks: { [a]: lock, [b]: lock } };
		await saveDraft(shop, maker, 1, { revision, document });
		const now = await checked();
		expect(now).toMatchObject({ valid: true, faults: [] });
		expect(now.claims[0]).toContain('cannot be kept');
		expect(now.claims[1]).toContain('dropped');
		expect(Object.keys(unzipSync((await proof('zip')).bytes))).toContain('proof.drup');
		expect((await checked(revision)).claims[1]).toContain('3 inks or fewer');
	});

	it('of an edition is that of the draft it was issued from', async () => {
		const approver = await createMember(shop.db, 'proofs', 'approver');
		const { draft, revision } = await desk();
		await saveDraft(shop, maker, 1, { revision, document: { ...draft, locks: {} } });
		await issueEdition(shop, approver, 1, revision + 1, '');
		const { draft: later } = await desk();
		const document = { ...later, inks: 5 };
		await saveDraft(shop, maker, 1, { revision: revision + 1, document });
		const of = (edition: number) =>
			sheetProof(shop, maker, 1, { edition, format: 'json' }, new AbortController().signal);
		expect((await of(1)).name).toContain(`revision-${revision + 1}-`);
		await expect(of(2)).rejects.toBeInstanceOf(NotFound);
	});

	it('is for members who may read the sheet, and only where there is one', async () => {
		await expect(proof('json', 99)).rejects.toBeInstanceOf(NotFound);
		await expect(proof('json', NaN)).rejects.toBeInstanceOf(NotFound);
		await expect(proof('json', undefined, 2)).rejects.toBeInstanceOf(NotFound);
		const nobody = { ...maker, roles: [] };
		const asked = { format: 'json' } as const;
		await expect(
			sheetProof(shop, nobody, 1, asked, new AbortController().signal),
		).rejects.toBeInstanceOf(Forbidden);
	});

	it('of what was not settled is refused with the reason', async () => {
		const { draft, revision } = await desk();
		await saveDraft(shop, maker, 1, { revision, document: { ...draft, locks: {} } });
		await shop.db
			.updateTable('colourings')
			.set({ proof: JSON.stringify({ kind: 'not-proved', regions: [] }), lower_bound: 3 })
			.execute();
		await expect(proof('zip')).rejects.toBeInstanceOf(Conflict);
		expect((await checked()).claims).toHaveLength(1);
	});
});

it('reads the revision of an address, and finds none where it is no number', () => {
	const asked = (query: string) =>
		proofAsked(new URL(`https://maps.example/proof.json${query}`), 'json');
	expect(asked('')).toEqual({ format: 'json' });
	expect(asked('?revision=7')).toEqual({ format: 'json', revision: 7 });
	expect(asked('?edition=2')).toEqual({ format: 'json', edition: 2 });
	expect(asked('?revision=-1').revision).toBeNaN();
	expect(asked('?edition=x').edition).toBeNaN();
});
