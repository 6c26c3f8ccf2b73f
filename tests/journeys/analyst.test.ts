import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { expectAccessible, openPage, picture, signInAs, startBrowser } from '../support/browser.ts';
import { docket, drawn, enterTeam, fills, saved, uploadSheet } from '../support/desk.ts';
import { statesGeoJson } from '../support/uploads.ts';

/** Makes the sheet that the analyst works on, as a cartographer of the same team. */
async function makeSheet(browser: Browser, name: string): Promise<string> {
	const { page, context } = await openPage(browser);
	await signInAs(page, 'cartographer');
	await enterTeam(page);
	const sheet = await uploadSheet(page, statesGeoJson(), name);
	await context.close();
	return sheet;
}

describe('an analyst', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];
	let sheet: string;

	beforeAll(async () => {
		browser = await startBrowser();
		sheet = await makeSheet(browser, 'States for locks, journey');
	});
	afterAll(() => browser.close());
	beforeEach(async () => {
		({ page, context, complaints } = await openPage(browser));
		await signInAs(page, 'analyst');
		await page.goto(`${sheet}/colours`);
		await drawn(page);
	});
	afterEach(() => context.close());

	const lockInTable = (name: string, ink: string) =>
		page.getByLabel(`Lock of ${name}`, { exact: true }).selectOption({ label: ink });

	/** The label of a reader's choice: the button itself is for keyboards and screen readers. */
	const reader = (name: string) =>
		page.getByRole('group', { name: 'Reader' }).getByText(name, { exact: true });

	async function findInTable(name: string) {
		await page.getByRole('button', { name: 'Table of regions' }).click();
		await page.getByLabel('Find a region').fill(name);
	}

	it('locks a region and sees the sheet answer, then undoes and redoes it', async () => {
		const before = await fills(page);
		await findInTable('Ohio');
		await lockInTable('Ohio', '3 Slate blue');
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('1 lock');
		await saved(page);
		await page.getByRole('button', { name: 'Sheet', exact: true }).click();
		await expect.poll(async () => (await fills(page))['39']).toBe('#648fdf');
		await page.getByRole('button', { name: /^Undo/ }).click();
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('No locks');
		await expect.poll(() => fills(page)).toEqual(before);
		await page.getByRole('button', { name: /^Redo/ }).click();
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('1 lock');
		await saved(page);
		await page.reload();
		await drawn(page);
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('1 lock');
		expect((await fills(page))['39']).toBe('#648fdf');
		expect(complaints).toEqual([]);
	});

	it('meets locks that collide, reads why, and takes the cheapest way out', async () => {
		await findInTable('Oregon');
		await lockInTable('Oregon', '2 Chalk');
		await page.getByLabel('Find a region').fill('Idaho');
		await lockInTable('Idaho', '2 Chalk');
		await expect
			.poll(() => page.locator('#because').innerText())
			.toMatch(/Oregon.*Idaho|Idaho.*Oregon/s);
		await page.locator('#because').getByRole('button', { name: 'Show where' }).click();
		await page.getByText(/^Solid outline: the locks in the way/).waitFor();
		const ways = page.getByRole('table', { name: 'Ways out' });
		await expect.poll(() => ways.getByRole('button').count(), { timeout: 30_000 }).toBe(2);
		await picture(page, 'collision');
		await expectAccessible(page);
		await saved(page);
		const before = await fills(page);
		const undo = page.getByRole('button', { name: /^Undo: lock Idaho/ });
		await ways.getByRole('button').last().click();
		const bar = page.getByRole('group', { name: /^Trying: release/ });
		await expect.poll(() => bar.evaluate((it) => it === document.activeElement)).toBe(true);
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('2 locks collide');
		await picture(page, 'way-on-trial');
		await expectAccessible(page);
		await page.keyboard.press('Escape');
		await bar.waitFor({ state: 'detached' });
		await expect.poll(() => fills(page)).toEqual(before);
		expect(await undo.count()).toBe(1);
		await ways.getByRole('button').first().click();
		await bar.getByRole('button', { name: 'Keep' }).click();
		await expect
			.poll(() => page.locator('#because').innerText(), { timeout: 30_000 })
			.toMatch(/inks? (are|is) needed/);
		await saved(page);
		expect(complaints).toEqual([]);
	});

	it('reads the verdicts on the palette for every kind of reader', async () => {
		await page.goto(`${sheet}/palette`);
		await drawn(page);
		await expectAccessible(page);
		await picture(page, 'palette');
		const typical = await fills(page);
		await reader('deutan').click();
		await expect.poll(() => fills(page)).not.toEqual(typical);
		await picture(page, 'deutan');
		await reader('typical').click();
		await expect.poll(() => fills(page)).toEqual(typical);
		await page.getByLabel('Value of ink 2').fill('#ebb055');
		await page.getByLabel('Value of ink 2').press('Tab');
		await expect.poll(() => docket(page, 'Palette').innerText()).toMatch(/look alike/);
		await page.getByRole('button', { name: /^Undo/ }).click();
		await saved(page);
		expect(complaints).toEqual([]);
	});

	it('is told when a colleague saved first, and nothing is overwritten', async () => {
		const other = await openPage(browser);
		await signInAs(other.page, 'cartographer');
		await other.page.goto(`${sheet}/colours`);
		await drawn(other.page);
		await findInTable('Texas');
		await lockInTable('Texas', '1 Ochre');
		await saved(page);
		await expect.poll(() => page.getByRole('banner').innerText()).toMatch(/Saved/);
		await other.page.getByRole('button', { name: 'Table of regions' }).click();
		await other.page.getByLabel('Find a region').fill('Maine');
		await other.page
			.getByLabel('Lock of Maine', { exact: true })
			.selectOption({ label: '3 Slate blue' });
		await other.page.getByText(/saved this sheet while you worked/).waitFor({ timeout: 30_000 });
		await picture(other.page, 'stale');
		await expectAccessible(other.page);
		await other.page.getByRole('button', { name: 'Put my changes on top' }).click();
		await saved(other.page);
		await page.reload();
		await drawn(page);
		await findInTable('Texas');
		expect(await page.getByLabel('Lock of Texas', { exact: true }).inputValue()).not.toBe('');
		await page.getByLabel('Find a region').fill('Maine');
		expect(await page.getByLabel('Lock of Maine', { exact: true }).inputValue()).not.toBe('');
		await other.context.close();
	});

	it('keeps the work when the sign-in ends while editing', async () => {
		await findInTable('Utah');
		await context.clearCookies();
		await lockInTable('Utah', '4 Flint');
		await page.getByText('Your sign-in has ended').waitFor({ timeout: 30_000 });
		await picture(page, 'signed-out');
		const again = await context.newPage();
		await signInAs(again, 'analyst');
		await page.getByRole('button', { name: 'Try again' }).click();
		await saved(page);
		await page.reload();
		await drawn(page);
		await findInTable('Utah');
		expect(await page.getByLabel('Lock of Utah', { exact: true }).inputValue()).not.toBe('');
	});

	it('may not issue an edition and is told who can', async () => {
		await page.goto(`${sheet}/editions`);
		expect(await page.getByRole('button', { name: /^Issue/ }).count()).toBe(0);
		await expect.poll(() => page.getByRole('complementary').innerText()).toMatch(/approver/i);
	});
});
