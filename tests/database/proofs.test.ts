import { readFileSync } from 'node:fs';
import { unzipSync } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkProofText } from '../../src/lib/engines/colouring/index.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { Conflict, NotFound } from '../../src/lib/server/services/outcomes.ts';
import { revisionAsked, sheetProof } from '../../src/lib/server/services/proof.service.ts';
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
const proof = (format: 'json' | 'zip', revision: number | null = null, sheet = 1) =>
	sheetProof(shop, maker, sheet, { revision, format }, new AbortController().signal);
const checked = async (revision: number | null = null) => {
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

	it('is for members who may read the sheet, and only where there is one', async () => {
		await expect(proof('json', 99)).rejects.toBeInstanceOf(NotFound);
		await expect(proof('json', NaN)).rejects.toBeInstanceOf(NotFound);
		await expect(proof('json', null, 2)).rejects.toBeInstanceOf(NotFound);
		const nobody = { ...maker, roles: [] };
		const asked = { revision: null, format: 'json' } as const;
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

it('reads the revision of an address, and refuses what is none', () => {
	const asked = (query: string) =>
		revisionAsked(new URL(`https://maps.example/proof.json${query}`));
	expect([asked(''), asked('?revision=7'), asked('?revision=-1'), asked('?revision=x')]).toEqual([
		...[null, 7, NaN, NaN],
	]);
});
