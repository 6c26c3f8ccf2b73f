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
import { statesGeoJson } from '../support/uploads.ts';

/** A sheet with one edition: made by a cartographer, issued by an approver of the same team. */
async function issuedSheet(browser: Browser, name: string): Promise<string> {
	const maker = await openPage(browser);
	await signInAs(maker.page, 'cartographer');
	await enterTeam(maker.page);
	const sheet = await uploadSheet(maker.page, statesGeoJson(), name);
	await maker.context.close();
	const approver = await openPage(browser);
	await signInAs(approver.page, 'approver');
	await approver.page.goto(`${sheet}/editions`);
	await drawn(approver.page);
	await approver.page.getByRole('button', { name: 'Issue edition 1' }).click();
	await approver.page.getByText('Edition 1 is issued').waitFor();
	await approver.context.close();
	return sheet;
}

describe('an analyst colours a sheet with rules of the house', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];
	let sheet: string;

	beforeAll(async () => {
		browser = await startBrowser();
		sheet = await issuedSheet(browser, 'States by house rules, journey');
	});
	afterAll(() => browser.close());
	beforeEach(async () => {
		({ page, context, complaints } = await openPage(browser));
		await signInAs(page, 'analyst');
		await page.goto(`${sheet}/colours`);
		await drawn(page);
	});
	afterEach(async () => {
		await context.close();
		expect(complaints).toEqual([]);
	});

	const because = () => page.locator('#because');
	const lockOf = (name: string) => page.getByLabel(`Lock of ${name}`, { exact: true });
	const find = (name: string) => page.getByLabel('Find a region').fill(name);
	const show = (view: string) =>
		page.getByRole('group', { name: 'Show', exact: true }).getByRole('button', { name: view });

	it('locks twenty regions by keyboard, in one step', async () => {
		await show('Table of regions').click();
		const table = page.getByRole('table', { name: 'Table of regions' });
		await table.getByRole('button', { name: 'Alabama' }).focus();
		for (let i = 1; i < 20; i++) await page.keyboard.press('Shift+ArrowDown');
		await page.getByText('20 ticked').waitFor();
		await expectAccessible(page);
		await page.getByRole('button', { name: 'Lock as they are now' }).click();
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('20 locks');
		await picture(page, 'twenty-locks');
		await saved(page);
		await page.getByRole('button', { name: /^Undo/ }).click();
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('No locks');
		await page.getByRole('button', { name: /^Redo/ }).click();
		await saved(page);
	});

	it('meets a collision, reads why, tries the ways out, and takes the cheapest', async () => {
		await show('Table of regions').click();
		await find('Georgia');
		const georgia = Number(await lockOf('Georgia').inputValue());
		await find('Alabama');
		const alabama = Number(await lockOf('Alabama').inputValue());
		expect(alabama).not.toBe(georgia);
		await lockOf('Alabama').selectOption(String(georgia));
		await expect.poll(() => because().innerText()).toMatch(/Alabama.*Georgia|Georgia.*Alabama/s);
		await show('Sheet').click();
		const ways = page.getByRole('table', { name: 'Ways out' });
		const release = ways.getByRole('button', { name: /^Release (Alabama|Georgia)$/ }).first();
		await release.waitFor({ timeout: 30_000 });
		await expect.poll(() => ways.innerText()).toContain('Nothing cheaper would do.');
		await picture(page, 'collision-ways');
		await expectAccessible(page);
		await saved(page);

		const before = await fills(page);
		await release.press('Enter');
		const trying = page.getByRole('group', { name: /^Trying: release/ });
		await trying.waitFor();
		await picture(page, 'collision-trying');
		await expectAccessible(page);
		await trying.getByRole('button', { name: 'Back' }).click();
		await expect.poll(() => fills(page)).toEqual(before);
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('20 locks');

		await release.press('Enter');
		await trying.getByRole('button', { name: 'Keep' }).click();
		await expect.poll(() => because().innerText()).toMatch(/inks? (are|is) needed/);
		await expect.poll(() => docket(page, 'Colours').innerText()).toContain('19 locks');
		await saved(page);
	});

	it('balances the inks, keeps what was found, and has it after loading again', async () => {
		const before = await fills(page);
		await page.getByLabel('First aim').selectOption({ label: 'Even use, by regions' });
		await page.locator('#aims').getByRole('button', { name: 'Add', exact: true }).click();
		await page.getByRole('button', { name: 'Improve', exact: true }).click();
		const figures = page.getByRole('table', { name: 'Aims before and now' });
		await figures.waitFor();
		const keep = page.locator('#aims').getByRole('button', { name: 'Keep' });
		await keep.waitFor({ timeout: 30_000 });
		await picture(page, 'balanced');
		await expectAccessible(page);
		const difference = figures.getByRole('row', { name: 'Between them' }).getByRole('cell');
		const [then, now] = (await difference.allInnerTexts()).map((text) => parseInt(text, 10));
		expect(now).toBeLessThan(then);
		await keep.click();
		await saved(page);
		const after = await fills(page);
		expect(after).not.toEqual(before);
		await page.reload();
		await drawn(page);
		expect(await fills(page)).toEqual(after);
		await expect.poll(() => docket(page, 'Colours').innerText()).toMatch(/4 inks,\s*proved fewest/);
	});

	it('compares with the last edition', async () => {
		await page.locator('#compare').getByRole('button', { name: 'Compare', exact: true }).click();
		const told = page.locator('#compare').getByRole('status');
		await told.waitFor();
		await expect
			.poll(() => told.innerText())
			.toMatch(/regions? of 49 ha(s|ve) another ink than in edition 1/);
		await page.getByRole('button', { name: 'Show them on the sheet' }).click();
		await picture(page, 'compared');
		await expectAccessible(page);
		const rows = await page
			.getByRole('table', { name: 'Regions with another ink' })
			.locator('tbody tr')
			.count();
		await expect
			.poll(() => told.innerText())
			.toMatch(new RegExp(`^${rows === 1 ? 'One|1' : rows}`));
	});

	it('is given by the server what the browser answered for the same seed', async () => {
		let pass = () => {};
		const held = new Promise<void>((resolve) => (pass = resolve));
		await page.route('**/draft', async (route) => {
			await held;
			await route.continue();
		});
		const before = await fills(page);
		await page.getByRole('button', { name: 'Another arrangement' }).click();
		await expect.poll(() => fills(page)).not.toEqual(before);
		await expect.poll(() => because().innerText()).toMatch(/inks? (are|is) needed/);
		const inBrowser = await fills(page);
		const sent = page.waitForRequest('**/draft');
		pass();
		expect((await sent).postDataJSON()).not.toHaveProperty('inks');
		await saved(page);
		await page.reload();
		await drawn(page);
		expect(await fills(page)).toEqual(inBrowser);
	});

	it('reads rules on a phone', async () => {
		const small = await openPage(browser, { viewport: phone });
		await signInAs(small.page, 'analyst');
		await small.page.goto(`${sheet}/colours`);
		await drawn(small.page);
		await small.page.getByRole('button', { name: 'Open the table of rules' }).click();
		await small.page.getByText('Alabama').first().waitFor();
		await expectAccessible(small.page);
		await picture(small.page, 'rules-phone');
		await small.context.close();
	});
});
