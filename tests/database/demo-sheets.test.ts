import { readFileSync } from 'node:fs';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { editionFile, readEdition } from '../../src/lib/server/services/edition.service.ts';
import { deskSheet, sheetList } from '../../src/lib/server/services/sheet.service.ts';
import { readTemplates } from '../../src/lib/server/services/templates.service.ts';
import { seedDemoSheet } from '../../src/ops/seed-sheets.ts';
import { seedDemoTheme } from '../../src/ops/seed-theme.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let several: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	several = await createMember(shop.db, 'demo', 'cartographer', 'analyst', 'approver');
	const made = await seedDemoSheet(shop, several);
	await seedDemoTheme(shop, several, made!);
});
afterAll(() => shop.close());

it('a newcomer finds a coloured and a themed sheet, both issued', async () => {
	const sheets = await sheetList(shop, several);
	expect(sheets.map(({ number }) => number).sort()).toEqual([1, 2]);
	const { theme, editions } = await deskSheet(shop, several, 2);
	expect(theme).toMatchObject({ told: 4, trouble: null, holds: true, title: 'People per km²' });
	// every district of the sample republic has people
	expect(theme?.classes.every((one) => one < 4)).toBe(true);
	expect(new Set(theme?.classes).size).toBe(4);
	expect(editions.map(({ number }) => number)).toEqual([1]);
	expect(await seedDemoSheet(shop, several)).toBeNull();
});

it('the themed sheet tells what the sample file says, divided by the area it has', async () => {
	const { files } = await readEdition(shop, several, 2, 1);
	const { name } = files.find((file) => file.name.endsWith('.geojson'))!;
	const { open } = await editionFile(shop, several, 2, 1, name);
	const { features } = JSON.parse(String(await buffer(await open()))) as Features;
	const sample = JSON.parse(readFileSync('sample-data/tavaroe.geojson', 'utf8')) as Features;
	const people = new Map(sample.features.map(({ properties: p }) => [p.code, p.population]));
	const { regions } = await deskSheet(shop, several, 2);
	features.forEach(({ properties }, i) => {
		const each = Number(people.get(properties.key)) / regions.areaKm2[i];
		expect(properties.value).toBeCloseTo(each, 9);
	});
});

it('both sheets are set by one template', async () => {
	const [template, ...others] = await readTemplates(shop, several);
	expect(others).toEqual([]);
	expect(template.sheets).toMatchObject([{ number: 2, differs: [] }]);
});

interface Features {
	features: { properties: Record<string, unknown> }[];
}
