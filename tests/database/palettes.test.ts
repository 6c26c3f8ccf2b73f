import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { newPalette } from '../../src/lib/schemas/palette.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { NotFound } from '../../src/lib/server/services/outcomes.ts';
import {
	addPalette,
	removePalette,
	teamPalettes,
} from '../../src/lib/server/services/palette.service.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let designer: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	designer = await createMember(shop.db, 'palettes', 'designer');
});
afterAll(() => shop.close());

describe('the team’s palettes', () => {
	it('are added from a pasted list, once under a name, and deleted', async () => {
		const pasted = newPalette.parse({ name: 'Harbour', inks: '#ebb855 Ochre\n648fdf' });
		const id = await addPalette(shop, designer, pasted);
		expect(await teamPalettes(shop, designer)).toEqual([
			{
				id,
				name: 'Harbour',
				inks: [
					{ name: 'Ochre', hex: '#ebb855' },
					{ name: 'Ink 2', hex: '#648fdf' },
				],
			},
		]);
		await expect(addPalette(shop, designer, pasted)).rejects.toThrow('of this name already');
		await removePalette(shop, designer, id);
		expect(await teamPalettes(shop, designer)).toEqual([]);
	});

	it('are the team’s own', async () => {
		const pasted = newPalette.parse({ name: 'Mine', inks: '#ebb855' });
		const id = await addPalette(shop, designer, pasted);
		const stranger = await createMember(shop.db, 'other-palettes', 'designer');
		expect(await teamPalettes(shop, stranger)).toEqual([]);
		await expect(removePalette(shop, stranger, id)).rejects.toBeInstanceOf(NotFound);
	});
});
