import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { expectAccessible, openPage, signInAs, startBrowser } from '../support/browser.ts';
import { drawn, enterTeam, fills, saved, uploadSheet } from '../support/desk.ts';
import { statesGeoJson } from '../support/uploads.ts';

describe('aims', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];
	let sheet: string;

	beforeAll(async () => {
		browser = await startBrowser();
		const made = await openPage(browser);
		await signInAs(made.page, 'cartographer');
		await enterTeam(made.page);
		sheet = await uploadSheet(made.page, statesGeoJson(), 'States for aims, journey');
		await made.context.close();
	});
	afterAll(() => browser.close());
	beforeEach(async () => {
		({ page, context, complaints } = await openPage(browser));
		await signInAs(page, 'analyst');
		await page.goto(`${sheet}/colours`);
		await drawn(page);
	});
	afterEach(() => context.close());

	const aims = () => page.locator('#aims');
	const order = () => aims().getByRole('heading', { level: 3 }).allInnerTexts();

	it('are chosen and put in order by keyboard, each a step that can be undone', async () => {
		await aims().getByLabel('First aim').selectOption({ label: 'Distinct neighbours' });
		await aims().getByRole('button', { name: 'Add' }).press('Enter');
		await aims().getByLabel('Another aim').selectOption({ label: 'Even use, by area' });
		await aims().getByRole('button', { name: 'Add' }).press('Enter');
		expect(await order()).toEqual(['1. Distinct neighbours', '2. Even use, by area']);
		await aims().getByRole('button', { name: 'Up: even use, by area' }).press('Enter');
		expect(await order()).toEqual(['1. Even use, by area', '2. Distinct neighbours']);
		const focused = () => page.evaluate(() => document.activeElement?.getAttribute('aria-label'));
		expect(await focused()).toBe('Down: even use, by area');
		await page.getByRole('button', { name: /^Undo/ }).click();
		expect(await order()).toEqual(['1. Distinct neighbours', '2. Even use, by area']);
		await aims().getByLabel('grey print').uncheck();
		await saved(page);
		await page.reload();
		await drawn(page);
		expect(await order()).toEqual(['1. Distinct neighbours', '2. Even use, by area']);
		expect(await aims().getByLabel('grey print').isChecked()).toBe(false);
		await expectAccessible(page);
		expect(complaints).toEqual([]);
	});

	it('are improved towards: a preview that is dropped, then kept, saved and compared', async () => {
		const before = await fills(page);
		const improve = aims().getByRole('button', { name: 'Improve', exact: true });
		await improve.click();
		await aims().getByRole('button', { name: 'Keep' }).waitFor();
		await expect.poll(() => fills(page)).not.toEqual(before);
		await expect.poll(() => aims().getByRole('table').innerText()).toContain('Least used ink');
		await expectAccessible(page);
		await aims().getByRole('button', { name: 'Drop' }).click();
		await expect.poll(() => fills(page)).toEqual(before);

		await improve.click();
		await aims().getByRole('button', { name: 'Keep' }).waitFor();
		await aims().getByRole('button', { name: 'Stop' }).click();
		const found = await fills(page);
		expect(found).not.toEqual(before);
		await aims().getByRole('button', { name: 'Keep' }).click();
		await saved(page);
		await page.reload();
		await drawn(page);
		await expect.poll(() => fills(page)).toEqual(found);

		const compare = page.locator('#compare');
		const changed = Object.keys(found).filter((key) => found[key] !== before[key]).length;
		await compare.getByLabel('Compare the inks with').selectOption('revision');
		await compare.getByLabel('Revision').fill('1');
		await compare.getByRole('button', { name: 'Compare' }).click();
		await compare.getByText(new RegExp(`^${changed} regions? of `)).waitFor();
		await compare.getByRole('button', { name: 'Show them on the sheet' }).click();
		await page.getByText('with another ink than in revision 1 of the draft.').last().waitFor();
		await expectAccessible(page);
		expect(complaints).toEqual([]);
	});
});
