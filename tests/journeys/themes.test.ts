import { readFileSync } from 'node:fs';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { sampleSheet } from '../support/adopted-sheet.ts';
import {
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { docket, drawn, fills, saved, team } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';
import { xlsx } from '../support/measure-tables.ts';
import type { ChosenFile } from '../support/uploads.ts';

interface District {
	code: string;
	name: string;
}
const districts: District[] = JSON.parse(
	readFileSync('sample-data/tavaroe.geojson', 'utf8'),
).features.map(({ properties }: { properties: District }) => properties);

/** No other figure on any page looks like it. */
const telltale = 734_219;

/** Invented visits: the first district is left out, the second has 3, the third the telltale; one name is mistyped. */
async function visits(): Promise<ChosenFile> {
	const rows = districts
		.slice(1)
		.map(({ name }, i): [string, number] => [
			i === 4 ? `${name.slice(0, -1)}` : name,
			i === 0 ? 3 : i === 1 ? telltale : 20 + ((i * 97) % 900),
		]);
	const bytes = await xlsx({ Visits: [['District', 'Visits'], ...rows] });
	return {
		name: 'visits.xlsx',
		mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
		buffer: Buffer.from(bytes),
	};
}

describe('a themed map', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];
	let sheet: string;

	beforeAll(async () => {
		browser = await startBrowser();
		sheet = `${team}/sheets/${await sampleSheet(`Visits ${Date.now()}`)}`;
	});
	afterAll(() => browser.close());
	afterEach(() => context.close());

	async function open(role: string, stage: string, viewport?: { width: number; height: number }) {
		({ page, context, complaints } = await openPage(browser, viewport ? { viewport } : {}));
		await signInAs(page, role);
		await page.goto(`${sheet}/${stage}`);
		await drawn(page);
	}
	const classes = () => page.locator('#classes');
	const strip = () => page.getByRole('region', { name: 'Classes shown' });

	async function joinVisits() {
		await page.getByRole('link', { name: 'Join a table of figures' }).click();
		await page.locator('input[type=file]').setInputFiles(await visits());
		await page.getByRole('button', { name: 'Upload and review' }).click();
		await page.getByRole('heading', { name: 'Rows and regions' }).waitFor({ timeout: 60_000 });
		await page.getByRole('button', { name: /^Give every row its nearest region/ }).click();
		const take = page.getByRole('button', { name: 'Take over 1 column' });
		const show = page.getByRole('button', { name: 'Show what comes of it' });
		await take.or(show).first().waitFor();
		if (await show.isVisible()) await show.click();
		await take.click();
		await page.waitForURL(/\/measures$/);
		await drawn(page);
	}

	it('is made by an analyst from a workbook, warned about, divided, suppressed and moved by keyboard', async () => {
		await open('analyst', 'theme');
		await expectAccessible(page);
		await joinVisits();
		await docket(page, 'Theme').getByRole('link', { name: 'Theme', exact: true }).click();
		const before = await fills(page);
		await page.getByRole('button', { name: /^Show it.*Visits$/ }).click();
		await strip().waitFor();
		await expect.poll(() => fills(page)).not.toEqual(before);
		await page.getByText('A count on areas misleads').waitFor();
		await expect.poll(() => docket(page, 'Theme').innerText()).toContain('A count fills areas');
		await picture(page, 'theme-count');
		await page.getByRole('button', { name: 'Show it per km²' }).click();
		await page.getByText('A count on areas misleads').waitFor({ state: 'detached' });
		await expect
			.poll(() => page.getByLabel('Heading of the legend').inputValue())
			.toBe('Visits per km²');

		await page.getByLabel('Suppress counts below').fill('5');
		await page.keyboard.press('Tab');
		await page.getByText('1 region is suppressed.').waitFor();
		await expect.poll(() => classes().innerText()).toMatch(/no data\s+1\b[\s\S]*suppressed\s+1\b/);

		const limit = page.getByRole('slider', { name: 'Limit between classes 2 and 3' });
		const from = Number(await limit.getAttribute('aria-valuenow'));
		await tabTo(page, limit);
		await page.keyboard.press('PageUp');
		await expect
			.poll(async () => Number(await limit.getAttribute('aria-valuenow')))
			.toBeGreaterThan(from);
		await expect.poll(() => page.getByLabel('Classes by').inputValue()).toBe('by-hand');
		await expectAccessible(page);
		await picture(page, 'theme-made');

		const typical = await fills(page);
		for (const reader of ['deutan', 'grey print']) {
			await page.getByRole('radio', { name: reader, exact: true }).check({ force: true });
			await expect.poll(() => fills(page)).not.toEqual(typical);
			await picture(page, `theme-${reader.split(' ')[0]}`);
		}
		const grey = Object.values(await fills(page));
		for (const hex of grey) expect(hex).toMatch(/^#(..)\1\1$/);
		await saved(page);
		await page.reload();
		await drawn(page);
		await expect.poll(() => classes().innerText()).toContain('Visits per km²');
		expect(complaints).toEqual([]);
	});

	it('is seen by a designer as classes, without one figure', async () => {
		await open('designer', 'theme');
		await strip().waitFor();
		await expect.poll(() => classes().innerText()).toMatch(/suppressed\s+1\b/);
		expect(await page.getByRole('slider').count()).toBe(0);
		for (const path of ['theme', 'theme/__data.json', 'layout/__data.json', 'sheet.svg']) {
			const text = await (await page.request.get(`${sheet}/${path}`)).text();
			expect(text).not.toMatch(/734.?219/);
		}
		expect((await page.request.get(`${sheet}/measures`)).status()).toBe(403);
		await expectAccessible(page);
		expect(complaints).toEqual([]);
	});

	it('is issued by an approver, its classes with it', async () => {
		await open('approver', 'editions');
		await page.getByLabel('Note').fill('Visits by district');
		await page.getByRole('button', { name: 'Issue edition 1' }).click();
		await page.getByText('Edition 1 is issued').waitFor({ timeout: 90_000 });
		const table = page.locator('a[href$=".csv"]').first();
		const text = await (await page.request.get((await table.getAttribute('href')) ?? '')).text();
		expect(text).toContain(',class,range');
		expect(text).toContain('suppressed');
		expect(text).not.toContain(String(telltale));
	});

	it('is read on a phone, and taken off and brought back', async () => {
		await open('analyst', 'theme', phone);
		const { width } = (await page.locator('main').boundingBox()) ?? { width: Infinity };
		expect(width).toBeLessThanOrEqual(phone.width);
		await picture(page, 'theme-phone');
		await page.getByRole('button', { name: 'Show the colouring instead' }).click();
		await page.getByRole('region', { name: 'Inks in use' }).waitFor();
		await page.getByRole('button', { name: /^Undo/ }).first().click();
		await strip().waitFor();
		expect(complaints).toEqual([]);
	});
});
