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
import { chooseAndSend, docket, drawn, saved, team } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';
import { compared, sampleFile, toBoundaries } from '../support/recut-pages.ts';

/** What is wrong with the file and what changed a year later stands in sample-data/README.md. */
const dirty = 'tavaroe-as-received.zip';
const later = 'tavaroe-next-year.geojson';

describe('boundaries as they come', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];

	beforeAll(async () => {
		browser = await startBrowser();
	});
	afterAll(() => browser.close());
	beforeEach(async () => {
		({ page, context, complaints } = await openPage(browser));
		page.setDefaultTimeout(60_000);
		await signInAs(page, 'cartographer');
		await forgetAll();
	});
	afterEach(async () => {
		await context.close();
		expect(complaints).toEqual([]);
	});

	const main = () => page.getByRole('main');
	const question = (words: RegExp) => page.getByRole('heading', { name: words });
	const answer = () => page.getByRole('button', { name: 'Read with this answer' });
	const beside = () => page.getByRole('complementary', { name: 'Beside the sheet' });
	const choose = (section: string, row: string) =>
		page.locator(`#${section} [data-row]`, { hasText: row }).first();

	/** What the team answered about this file is forgotten, so that it is asked about again. */
	async function forgetAll() {
		await page.goto(`${team}/upload`);
		const forget = page.getByRole('button', { name: /^Forget\b.*tavaroe-as-received/ });
		while (await forget.count()) {
			const left = await forget.count();
			await forget.first().click();
			await expect.poll(() => forget.count()).toBe(left - 1);
		}
	}

	/** The sheet's address, once its two questions are answered. */
	async function answered(): Promise<string> {
		await page.waitForURL(/\/sheets\/\d+/, { timeout: 120_000 });
		await drawn(page);
		return new URL(page.url()).pathname.replace(/(\/sheets\/\d+).*/, '$1');
	}

	it('are asked about, mended, replaced by later ones, and put back', async () => {
		await chooseAndSend(page, sampleFile(dirty), 'As received, journey');
		await question(/coordinate system/).waitFor();
		await expect
			.poll(() => page.evaluate<string>('document.activeElement.textContent'))
			.toMatch(/coordinate system/);
		await expect.poll(() => main().innerText()).toMatch(/Features\s+184/);
		await expectAccessible(page);
		await picture(page, 'boundaries-question');

		// a system that nobody knows is told beside the field, and what was typed stays
		const system = page.getByLabel('Another reference system');
		await system.fill('EPSG:1');
		await answer().click();
		await expect.poll(() => system.getAttribute('aria-invalid')).toBe('true');
		await expect.poll(() => system.inputValue()).toBe('EPSG:1');
		await system.fill('EPSG:32625');
		await page.getByText('Columns with the key and the name').click();
		await page.getByLabel('Key', { exact: true }).selectOption('CODE');
		await answer().click();

		// 0402, 0711 and 1108 have a row for each of their parts
		await question(/keys stand for more than one/).waitFor();
		await expectAccessible(page);
		await page.getByLabel(/Join features with the same key/).check();
		await answer().click();
		const sheet = await answered();
		await expect
			.poll(() => docket(page, 'Boundaries').innerText())
			.toMatch(/181 regions.*finding/s);

		await toBoundaries(page, sheet);
		await expect.poll(() => beside().innerText()).toMatch(/Key\s+CODE/);
		await expectAccessible(page);
		await picture(page, 'boundaries-findings');
		await readFindings();
		await tryTolerance(sheet);
		await mendAndApply(sheet);
		await strike(sheet, 'Merrennes', 'Quellaške');
		await replaceAndPutBack(sheet);
	});

	/** The findings as a table: filtered by kind, and a row is shown on the sheet. */
	async function readFindings() {
		await page.getByRole('button', { name: 'Open as a table' }).click();
		await page.getByLabel('Kind').selectOption({ label: 'overlaps' });
		const rows = page.getByRole('table', { name: 'Table of findings' }).getByRole('row');
		await expect.poll(() => rows.count()).toBe(2);
		await expect.poll(() => rows.nth(1).innerText()).toMatch(/0108.*0910/s);
		await expectAccessible(page);
		await rows.nth(1).getByRole('button').click();
		await drawn(page);
		await main().getByText('0108 and 0910 overlap').first().waitFor();
	}

	/** Five metres apart all along, 0202 and 0418 meet in a point; joined, they share 36.2 km. */
	async function tryTolerance(sheet: string) {
		await page.getByRole('button', { name: /^Preview joining within 6 m/ }).click();
		await compared(page);
		const border = page.locator('#borders tr', { hasText: 'Corvondry (0418)' });
		await expect.poll(() => border.innerText()).toMatch(/by point\s+by line, 36\.2 km/);
		await choose('borders', 'Corvondry (0418)').click();
		await page.getByText(/^Border changed: Ostrançon/).waitFor();
		await page.getByRole('button', { name: 'Closer' }).click();
		await expectAccessible(page);
		await picture(page, 'boundaries-tolerance');
		await page.getByRole('button', { name: 'Drop this change' }).click();
		await page.waitForURL(new RegExp(`${sheet}/boundaries$`));
		await drawn(page);
	}

	async function mendAndApply(sheet: string) {
		await page.getByRole('button', { name: /^Take the usual mend for all 10 slivers/ }).click();
		await page.getByText(/ways to mend it: 0203 and 9999/).click();
		await page.getByLabel(/^Leave out 9999/).check();
		await page.getByText(/way to mend it: The outline of 0101/).click();
		await page.getByLabel(/^Cut the outline of 0101/).check();
		await page.getByRole('button', { name: 'Preview these mends (12)' }).click();
		await compared(page);
		await expect.poll(() => main().innerText()).toContain('180 regions instead of 181');
		await expectAccessible(page);
		await picture(page, 'boundaries-mends');
		await page.getByRole('button', { name: 'Apply these boundaries' }).click();
		await page.getByText(/^Applied on/).waitFor();
		await toBoundaries(page, sheet);
		await expect.poll(() => docket(page, 'Boundaries').innerText()).toContain('180 regions');
		await expect.poll(() => beside().innerText()).toContain('12 mends in force');
	}

	async function strike(sheet: string, one: string, other: string) {
		await page.goto(`${sheet}/borders`);
		await drawn(page);
		const table = page.locator('#borders');
		await table.getByRole('searchbox').first().fill(`${one} ${other}`);
		await table.locator('[data-row="0"]').click();
		const out = page.getByRole('button', { name: 'Strike out', exact: true });
		const form = page.locator('form', { has: out });
		await form.getByLabel(/^Reason/).fill('A lake lies between them');
		await out.click();
		await expect.poll(() => docket(page, 'Borders').innerText()).toMatch(/struck out/);
		await saved(page);
	}

	async function replaceAndPutBack(sheet: string) {
		await toBoundaries(page, sheet);
		await page.getByText('Upload newer boundaries for this sheet').click();
		await page.locator('#newer input[type=file]').setInputFiles(sampleFile(later));
		await page.getByRole('button', { name: 'Upload and compare' }).click();
		await compared(page);
		const groups = page.locator('#regions tbody');
		await expect.poll(() => groups.innerText()).toMatch(/Merrennes \(0512\).*split/s);
		await expect.poll(() => groups.innerText()).toMatch(/Cerrœrn \(0807\).*merged/s);
		await expect.poll(() => groups.innerText()).toMatch(/Raskstrå \(0318\).*gone/s);
		await expect.poll(() => groups.innerText()).toMatch(/new\s+Nyhólm \(0421\)/s);

		// the struck border goes to both halves, which lie against Quellaške
		await choose('regions', 'Merrennes (0512)').click();
		await expect.poll(() => page.locator('#follows').innerText()).toMatch(/0512/);
		await expectAccessible(page);
		await picture(page, 'boundaries-newer');

		// the island that is gone is said to go on as the new one
		await choose('regions', 'Raskstrå (0318)').click();
		await page.getByLabel('Another new region').fill('Nyhólm');
		await page.getByRole('button', { name: 'Add', exact: true }).click();
		await page.getByRole('button', { name: 'Decide it so' }).click();
		await page.getByText('Raskstrå (0318) goes on as Nyhólm (0421).').first().waitFor();
		await expect.poll(() => groups.innerText()).not.toMatch(/gone/);

		await page.setViewportSize(phone);
		const wide = await page.evaluate('document.documentElement.scrollWidth');
		expect(wide).toBeLessThanOrEqual(phone.width);
		await expectAccessible(page);
		await picture(page, 'boundaries-newer-phone');
		await page.setViewportSize({ width: 1280, height: 800 });

		await page.getByRole('button', { name: 'Apply these boundaries' }).click();
		await page.getByText(/^Applied on/).waitFor();
		await expect.poll(() => page.locator('#follows').innerText()).toContain('What followed');
		await toBoundaries(page, sheet);
		await expect.poll(() => beside().innerText()).toContain(later);
		await expect.poll(() => docket(page, 'Borders').innerText()).toContain('struck out');

		await page.getByRole('link', { name: /^Put back/ }).click();
		await page.getByRole('button', { name: 'Put back', exact: true }).click();
		await page.getByText(/^Put back on/).waitFor();
		await toBoundaries(page, sheet);
		await expect.poll(() => beside().innerText()).toContain(dirty);
		await expect.poll(() => docket(page, 'Borders').innerText()).toMatch(/struck out/);
		await expect.poll(() => beside().innerText()).toContain('12 mends in force');
	}

	it('are answered, mended, applied and put back by keyboard alone', async () => {
		const press = async (target: Parameters<typeof tabTo>[1], key = 'Enter') => {
			await tabTo(page, target, 'Tab', 400);
			await page.keyboard.press(key);
		};
		await chooseAndSend(page, sampleFile(dirty), 'As received, by keyboard');
		await question(/coordinate system/).waitFor();
		await tabTo(page, page.getByLabel('Another reference system'));
		await page.keyboard.type('EPSG:32625');
		await press(page.getByText('Columns with the key and the name'));
		await tabTo(page, page.getByLabel('Key', { exact: true }));
		await page.keyboard.type('CODE');
		await press(answer());
		await question(/keys stand for more than one/).waitFor();
		await press(page.getByLabel(/Join features with the same key/), 'Space');
		await press(answer());
		const sheet = await answered();

		await toBoundaries(page, sheet);
		await press(page.getByText(/ways to mend it: 0203 and 9999/));
		const ways = page.getByRole('group', { name: /^Mend: 0203 and 9999/ });
		await tabTo(page, ways.getByRole('radio').first());
		await page.keyboard.press('ArrowDown');
		await press(page.getByRole('button', { name: 'Preview these mends (1)' }));
		await compared(page);
		await press(choose('regions', 'Lauvançon'));
		await press(page.getByRole('button', { name: 'Apply these boundaries' }));
		await page.getByText(/^Applied on/).waitFor();

		await press(page.getByRole('button', { name: 'Put back', exact: true }));
		await page.getByText(/^Put back on/).waitFor();
		await toBoundaries(page, sheet);
		await expect.poll(() => docket(page, 'Boundaries').innerText()).toContain('181 regions');
	});

	it('are asked about without JavaScript as well', async () => {
		const cookies = await context.cookies();
		const plain = await openPage(browser, { javaScript: false });
		await plain.context.addCookies(cookies);
		await chooseAndSend(plain.page, sampleFile(dirty), 'As received, without script');
		const asks = async (words: string) =>
			expect
				.poll(
					async () => {
						await plain.page.reload();
						return plain.page.locator('body').innerText();
					},
					{ timeout: 60_000, interval: 1000 },
				)
				.toContain(words);
		await asks('In which coordinate system');
		await plain.page.getByLabel('Another reference system').fill('EPSG:32625');
		await plain.page.getByRole('button', { name: 'Read with this answer' }).click();
		await asks('The sheet is ready');
		await plain.context.close();
	});

	it('are only looked at by whoever may not change them', async () => {
		const looking = await openPage(browser);
		await signInAs(looking.page, 'designer');
		await looking.page.goto(`${team}/sheets/1/boundaries`);
		await drawn(looking.page);
		expect(await looking.page.getByText('Read this file otherwise').count()).toBe(0);
		expect(await looking.page.getByText('Upload newer boundaries').count()).toBe(0);
		await expectAccessible(looking.page);
		await looking.context.close();
	});
});
