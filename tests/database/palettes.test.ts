import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Ink } from '../../src/lib/engines/palettes/index.ts';
import { newPalette } from '../../src/lib/schemas/palette.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { Conflict, NotFound, Refused } from '../../src/lib/server/services/outcomes.ts';
import {
	approvePalette,
	endPaletteApproval,
} from '../../src/lib/server/services/palette-approval.service.ts';
import {
	addPalette,
	changePalette,
	copyPalette,
	readPalette,
	removePalette,
	teamPalettes,
} from '../../src/lib/server/services/palette.service.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let designer: Member;
let approver: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	designer = await createMember(shop.db, 'palettes', 'designer');
	approver = { ...designer, roles: ['approver'] };
});
afterAll(() => shop.close());

const inks: Ink[] = [
	{ name: 'Ochre', hex: '#ebb855', fixed: true },
	{
		...{ name: 'Slate', hex: '#648fdf' },
		hatch: { kind: 'lines', angle: 45, spacingMm: 2, widthMm: 0.25, hex: '#000000' },
	},
];
const logged = async (id: string) => {
	const rows = await shop.db
		.selectFrom('activity')
		.select(['action', 'detail'])
		.where('subject_id', '=', id)
		.orderBy('id')
		.execute();
	return rows.map(({ action }) => action);
};

describe('the team’s palettes', () => {
	it('are added from a pasted list, once under a name, and deleted', async () => {
		const pasted = newPalette.parse({ name: 'Harbour', inks: '#ebb855 Ochre\n648fdf' });
		const id = await addPalette(shop, designer, pasted);
		expect(await teamPalettes(shop, designer)).toMatchObject([
			{
				...{ id, name: 'Harbour', revision: 1, approval: null },
				inks: [
					{ name: 'Ochre', hex: '#ebb855' },
					{ name: 'Ink 2', hex: '#648fdf' },
				],
			},
		]);
		await expect(addPalette(shop, designer, pasted)).rejects.toThrow('of this name already');
		await removePalette(shop, designer, id);
		expect(await teamPalettes(shop, designer)).toEqual([]);
		expect(await logged(id)).toEqual(['palette.added', 'palette.deleted']);
	});

	it('are the team’s own', async () => {
		const id = await addPalette(shop, designer, { name: 'Mine', inks });
		const stranger = await createMember(shop.db, 'other-palettes', 'designer');
		expect(await teamPalettes(shop, stranger)).toEqual([]);
		const change = { name: 'Theirs', inks, revision: 1 };
		for (const attempt of [
			() => removePalette(shop, stranger, id),
			() => readPalette(shop, stranger, id),
			() => copyPalette(shop, stranger, id),
			() => changePalette(shop, stranger, id, change),
			() => approvePalette(shop, { ...stranger, roles: ['approver'] }, id, 'f'.repeat(64)),
		])
			await expect(attempt()).rejects.toBeInstanceOf(NotFound);
	});

	it('keep hatches and what is fixed, are renamed and edited, and tell a change made meanwhile', async () => {
		const id = await addPalette(shop, designer, { name: 'Edited', inks });
		expect((await readPalette(shop, designer, id)).inks).toEqual(inks);
		await changePalette(shop, designer, id, { name: 'Renamed', inks: [inks[1]], revision: 1 });
		expect(await readPalette(shop, designer, id)).toMatchObject({
			...{ name: 'Renamed', revision: 2 },
			inks: [{ name: 'Slate' }],
		});
		const late = { name: 'Late', inks, revision: 1 };
		await expect(changePalette(shop, designer, id, late)).rejects.toBeInstanceOf(Conflict);
		await addPalette(shop, designer, { name: 'Taken', inks });
		const taken = { name: 'Taken', inks, revision: 2 };
		await expect(changePalette(shop, designer, id, taken)).rejects.toThrow('of this name already');
		expect(await logged(id)).toEqual(['palette.added', 'palette.changed']);
		await expect(readPalette(shop, designer, 'no uuid')).rejects.toBeInstanceOf(NotFound);
	});

	it('of which two take one name at once: one gets it, the other is told', async () => {
		const both = await Promise.all(
			['One of two', 'Two of two'].map((name) => addPalette(shop, designer, { name, inks })),
		);
		const renamed = await Promise.allSettled(
			both.map((id) => changePalette(shop, designer, id, { name: 'Same', inks, revision: 1 })),
		);
		const refused = renamed.filter((one) => one.status === 'rejected');
		expect(refused).toHaveLength(1);
		expect(refused[0].reason).toBeInstanceOf(Refused);
	});

	it('are copied from published ones with source and licence, each copy under a name of its own', async () => {
		const first = await copyPalette(shop, designer, 'okabe-ito');
		const second = await copyPalette(shop, designer, first);
		await copyPalette(shop, designer, 'okabe-ito');
		expect(await readPalette(shop, designer, second)).toMatchObject({
			name: 'Okabe and Ito, copy, copy',
			source: expect.stringContaining('Okabe and Ito 2008'),
			licence: expect.any(String),
		});
		const names = (await teamPalettes(shop, designer)).map(({ name }) => name);
		expect(names).toContain('Okabe and Ito, copy 2');
		// another value is not the published one, another name or a hatch is
		const copy = await readPalette(shop, designer, first);
		const renamed = copy.inks.map((ink) => ({ ...ink, name: `${ink.name} of ours` }));
		const sourceAfter = async (inks: Ink[], revision: number) => {
			await changePalette(shop, designer, first, { name: copy.name, inks, revision });
			return (await readPalette(shop, designer, first)).source;
		};
		expect(await sourceAfter(renamed, 1)).toBe(copy.source);
		const [one, ...rest] = renamed;
		for (const revision of [2, 3])
			expect(await sourceAfter([{ ...one, hex: `#12345${revision}` }, ...rest], revision)).toBe(
				`changed from ${copy.source}`,
			);
		await expect(copyPalette(shop, designer, 'no-such')).rejects.toBeInstanceOf(NotFound);
	});
});

describe('the approval of a palette', () => {
	const approvalOf = async (id: string) => (await readPalette(shop, designer, id)).approval;

	it('is of the palette as it was seen, by whom and when, and any change ends it', async () => {
		const id = await addPalette(shop, designer, { name: 'Brand', inks });
		const { digest } = await readPalette(shop, approver, id);
		await expect(approvePalette(shop, designer, id, digest)).rejects.toBeInstanceOf(Forbidden);
		await expect(approvePalette(shop, approver, id, 'f'.repeat(64))).rejects.toBeInstanceOf(
			Conflict,
		);
		await approvePalette(shop, approver, id, digest);
		expect(await approvalOf(id)).toMatchObject({ inForce: true, inks, digest, name: 'Brand' });
		expect(Date.parse((await approvalOf(id))?.at ?? '')).toBeGreaterThan(Date.now() - 60_000);

		// kept as it is: nothing changes
		await changePalette(shop, designer, id, { name: 'Brand', inks, revision: 1 });
		expect(await approvalOf(id)).toMatchObject({ inForce: true });

		const other = [{ ...inks[0], hex: '#ebb856' }, inks[1]];
		await changePalette(shop, designer, id, { name: 'Brand', inks: other, revision: 1 });
		expect(await approvalOf(id)).toMatchObject({ inForce: false, inks });
		// changed back is not approved again by itself
		await changePalette(shop, designer, id, { name: 'Brand', inks, revision: 2 });
		expect(await approvalOf(id)).toMatchObject({ inForce: false });
		expect(await logged(id)).toEqual([
			...['palette.added', 'palette.approved', 'palette.changed', 'palette.changed'],
		]);
	});

	it('ends with another name, a hatch or an order of inks as well', async () => {
		const hatched = [inks[0], { name: inks[1].name, hex: inks[1].hex }];
		for (const [number, change] of [
			{ name: 'Brand 0, new', inks },
			{ name: 'Brand 1', inks: hatched },
			{ name: 'Brand 2', inks: [...inks].reverse() },
		].entries()) {
			const id = await addPalette(shop, designer, { name: `Brand ${number}`, inks });
			await approvePalette(shop, approver, id, (await readPalette(shop, approver, id)).digest);
			await changePalette(shop, designer, id, { ...change, revision: 1 });
			expect((await approvalOf(id))?.inForce).toBe(false);
		}
	});

	it('can be taken back, and given again', async () => {
		const id = await addPalette(shop, designer, { name: 'Back and forth', inks });
		await expect(endPaletteApproval(shop, approver, id)).rejects.toBeInstanceOf(Refused);
		const { digest } = await readPalette(shop, approver, id);
		await approvePalette(shop, approver, id, digest);
		await endPaletteApproval(shop, approver, id);
		expect((await approvalOf(id))?.inForce).toBe(false);
		await approvePalette(shop, approver, id, digest);
		expect((await approvalOf(id))?.inForce).toBe(true);
		await removePalette(shop, designer, id);
	});
});
