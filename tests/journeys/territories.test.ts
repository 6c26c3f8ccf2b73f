import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import {
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { docket, drawn, enterTeam, fills, saved, uploadSheet } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';
import type { ChosenFile } from '../support/uploads.ts';

/** Sixteen square fields, A1 in the south-west to D4 in the north-east; A and B lie in the west. */
const columns = ['A', 'B', 'C', 'D'];
const names = columns.flatMap((column) => [1, 2, 3, 4].map((row) => `${column}${row}`));

function fields(): ChosenFile {
	const features = names.map((name) => {
		const [x, y] = [columns.indexOf(name[0]), Number(name[1]) - 1];
		const corners = [
			[x, y],
			[x + 1, y],
			[x + 1, y + 1],
			[x, y + 1],
			[x, y],
		].map((corner) => corner.map((at) => at / 10));
		return {
			type: 'Feature',
			id: name,
			properties: { name, half: x < 2 ? 'West' : 'East' },
			geometry: { type: 'Polygon', coordinates: [corners] },
		};
	});
	const buffer = Buffer.from(JSON.stringify({ type: 'FeatureCollection', features }));
	return { name: 'fields.geojson', mimeType: 'application/geo+json', buffer };
}

/** Ten visits in every field, so that half of them, 80, is the target of two territories. */
const visits: ChosenFile = {
	name: 'visits.csv',
	mimeType: 'text/csv',
	buffer: Buffer.from(['field,Visits [visits]', ...names.map((name) => `${name},10`)].join('\n')),
};

async function makeSheet(browser: Browser): Promise<string> {
	const { page, context } = await openPage(browser);
	await signInAs(page, 'cartographer');
	await enterTeam(page);
	const sheet = await uploadSheet(page, fields(), 'Fields for territories, journey');
	await context.close();
	return sheet;
}

async function joinVisits(browser: Browser, sheet: string) {
	const { page, context } = await openPage(browser);
	await signInAs(page, 'planner');
	await page.goto(`${sheet}/measures`);
	await drawn(page);
	await page.locator('input[type=file]').setInputFiles(visits);
	await page.getByRole('button', { name: 'Upload and review' }).click();
	await page.getByRole('button', { name: 'Take over 1 column' }).click({ timeout: 60_000 });
	await page.waitForURL(/\/measures$/);
	await context.close();
}

describe('a planner', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];
	let sheet: string;

	beforeAll(async () => {
		browser = await startBrowser();
		sheet = await makeSheet(browser);
	});
	afterAll(() => browser.close());
	beforeEach(() => open());
	afterEach(() => context.close());

	async function open(options: Parameters<typeof openPage>[1] = {}, role = 'planner') {
		({ page, context, complaints } = await openPage(browser, options));
		await signInAs(page, role);
		await page.goto(`${sheet}/territories`);
		await drawn(page);
	}
	const hand = () => page.getByRole('group', { name: 'Give regions by hand' });
	const field = (name: string) => page.locator(`main svg [data-key="${name}"]`);
	const words = (name: string) => field(name).getAttribute('aria-label');
	const said = () => page.getByRole('main').innerText();
	const says = (part: string) => expect.poll(said).toContain(part);
	const stage = (part: string | RegExp) =>
		expect.poll(() => docket(page, 'Territories').innerText()).toMatch(part);
	const undo = () => page.getByRole('button', { name: 'Undo', exact: true }).click();
	const holds = (territory: string) => hand().getByLabel('Give to').selectOption(territory);

	it('makes territories from a column and sees at once who is outside a tolerance', async () => {
		await expectAccessible(page);
		await expect
			.poll(() => page.getByRole('complementary').innerText())
			.toContain('No territories yet.');
		await picture(page, 'territories-none');
		await joinVisits(browser, sheet);
		await page.reload();
		await drawn(page);
		await page.getByLabel('From a column').selectOption('attribute:half');
		await page.getByText('2 territories: ').waitFor();
		await page.getByRole('button', { name: 'Make territories from it' }).click();
		await stage('2 territories');
		const within = page.getByLabel('Visits: within');
		await within.fill('10');
		await within.press('Tab');
		await expect.poll(() => page.locator('#list').innerText()).toContain('on target');
		await saved(page);
		const inks = await fills(page);
		expect(new Set(names.filter((name) => name < 'C').map((name) => inks[name])).size).toBe(1);
		expect(inks.A1).not.toBe(inks.D1);
		await expectAccessible(page);
		expect(complaints).toEqual([]);
	});

	it('gives a region by a press, undoes it, and has the colours of regions back elsewhere', async () => {
		const before = await fills(page);
		await holds('West');
		await field('C2').click();
		await says('C2 given to West, from East. West: 90 visits, 12.5 % over. East: 70 visits');
		await stage('2 outside 10 %');
		await expect.poll(async () => (await fills(page)).C2).toBe(before.A1);
		expect(await words('C2')).toBe('C2, West, nobody serves it, 10 visits');
		await saved(page);
		await undo();
		await expect.poll(() => docket(page, 'Territories').innerText()).not.toContain('outside');
		await saved(page);

		await docket(page, 'Colours').getByRole('link', { name: 'Colours', exact: true }).click();
		await expect.poll(() => words('A1')).toMatch(/^A1, ink \d/);
		await stage('2 territories');
		expect(complaints).toEqual([]);
	});

	it('is told of a torn territory at once, led to the part, and not stopped', async () => {
		await holds('West');
		await field('D4').click();
		await says('West is torn: cut off D4.');
		await stage('1 torn');
		await page.locator('#torn').getByRole('button', { name: 'D4' }).click();
		await says('1 region cut off from the rest of West: D4.');
		await expectAccessible(page);
		await picture(page, 'territories-torn');
		await undo();
		await expect.poll(() => docket(page, 'Territories').innerText()).not.toContain('torn');
		await saved(page);
	});

	it('draws a line round regions and gives them as one step', async () => {
		await hand().getByRole('button', { name: 'Lasso' }).click();
		const [from, to] = [await field('C1').boundingBox(), await field('C2').boundingBox()];
		if (!from || !to) throw new Error('the fields are not on the sheet');
		const [left, right] = [from.x + 3, from.x + from.width - 3];
		const [top, bottom] = [to.y + 3, from.y + from.height - 3];
		await page.mouse.move(left, top);
		await page.mouse.down();
		await page.mouse.move(right, top, { steps: 4 });
		await page.mouse.move(right, bottom, { steps: 8 });
		await page.mouse.move(left, bottom, { steps: 4 });
		await page.mouse.up();
		await says('2 regions selected');
		await picture(page, 'territories-lasso');
		await holds('West');
		await hand().getByRole('button', { name: 'Give to West' }).click();
		await says('2 regions given to West, from East.');
		await undo();
		await expect.poll(() => words('C1')).toContain('East');
		expect(await words('C2')).toContain('East');
		await saved(page);
		expect(complaints).toEqual([]);
	});

	it('gives by keys alone: arrows walk, Space selects, Enter gives', async () => {
		await tabTo(page, hand().getByLabel('Give to'));
		await page.keyboard.type('West');
		await tabTo(page, page.locator('main svg [tabindex="0"], main svg[tabindex="0"]'));
		for (let steps = 0; steps < 4; steps++) await page.keyboard.press('ArrowRight');
		for (let steps = 0; steps < 4; steps++) await page.keyboard.press('ArrowDown');
		await page.keyboard.press('Space');
		await says('D1 selected, 1 region in all.');
		await page.keyboard.press('Space');
		await page.keyboard.press('Enter');
		await says('D1 given to West, from East.');
		await tabTo(page, page.getByRole('button', { name: 'Undo', exact: true }), 'Shift+Tab');
		await page.keyboard.press('Enter');
		await expect.poll(() => words('D1')).toContain('East');
		await saved(page);
	});

	it('gives in the table, row by row and many at once', async () => {
		await page.getByRole('button', { name: 'Table of regions' }).click();
		await page.getByLabel('Territory of C3').selectOption('West');
		await says('C3 given to West, from East.');
		for (const name of ['C2', 'C4']) await page.getByLabel(`Select ${name}`).check();
		const many = page.getByRole('group', { name: 'Give selected regions' });
		await many.getByRole('combobox').selectOption('West');
		await many.getByRole('button', { name: 'Give', exact: true }).click();
		await says('2 regions given to West, from East.');
		await expectAccessible(page);
		await page.getByRole('button', { name: 'Table of territories' }).click();
		const west = page.getByRole('main').getByRole('row', { name: /West/ });
		await expect.poll(() => west.innerText()).toContain('37.5 % over');
		await expectAccessible(page);
		await picture(page, 'territories-table');
		await undo();
		await undo();
		await expect.poll(() => west.innerText()).toContain('on target');
		await saved(page);
		expect(complaints).toEqual([]);
	});

	it('names, bases and locks', async () => {
		await page.locator('#list').getByRole('button', { name: 'East' }).click();
		await page.getByLabel('Person').fill('Ada Berg');
		await page.getByLabel('Base', { exact: true }).fill('D2');
		await page.getByLabel('Base', { exact: true }).press('Tab');
		await expect.poll(() => words('D2')).toBe('D2, East, Ada Berg, 10 visits, base of East');
		await field('D3').click();
		await page.getByLabel('Lock it to East, because').fill('A contract');
		await page.getByRole('button', { name: 'Lock', exact: true }).click();
		await expect.poll(() => words('D3')).toContain('locked');
		await expectAccessible(page);
		await saved(page);
		await page.reload();
		await drawn(page);
		await expect.poll(() => words('D3')).toBe('D3, East, Ada Berg, 10 visits, locked');
		expect(complaints).toEqual([]);
	});

	it('reads them on a phone, and an approver reads them only', async () => {
		await context.close();
		await open({ viewport: phone }, 'approver');
		await expectAccessible(page);
		expect(await hand().count()).toBe(0);
		await expect.poll(() => page.getByRole('banner').innerText()).toContain('Read only');
		const width = await page.evaluate(() => document.documentElement.scrollWidth);
		expect(width).toBeLessThanOrEqual(phone.width);
		await picture(page, 'territories-phone');
	});
});
