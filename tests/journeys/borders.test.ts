import { readFileSync } from 'node:fs';
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
import { statesGeoJson } from '../support/uploads.ts';
import { docket, drawn, enterTeam, saved, uploadSheet } from '../support/desk.ts';
import { edgesOfCol } from '../support/named-graphs.ts';

describe('the stage of borders', () => {
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
		await signInAs(page, 'cartographer');
		await enterTeam(page);
	});
	afterEach(async () => {
		await context.close();
		expect(complaints).toEqual([]);
	});

	const borders = () => docket(page, 'Borders').innerText();
	const aside = () => page.locator('#beside');
	/** The saved graph of the borders that count, read by the reader of DIMACS files. */
	async function edges(): Promise<number> {
		const [file] = await Promise.all([
			page.waitForEvent('download'),
			page.getByRole('link', { name: /as a graph/ }).click(),
		]);
		return edgesOfCol(readFileSync(await file.path(), 'utf8')).borders.a.length;
	}

	it('counts by rule, measures gaps, decides about many borders at once by keyboard', async () => {
		const sheet = await uploadSheet(page, statesGeoJson(), 'Borders, journey');
		await page.goto(`${sheet}/borders`);
		await expect.poll(borders).toContain('107 by line, 2 by point');
		await expectAccessible(page);
		await picture(page, 'borders');

		await aside().getByLabel('Shortest shared line that counts').fill('20000');
		await page.keyboard.press('Enter');
		await expect.poll(borders).toContain('of them too short to count');
		await page.getByRole('button', { name: 'Undo' }).click();
		await expect.poll(borders).not.toContain('too short');

		await aside().getByLabel('Measure gaps up to').fill('100');
		await page.keyboard.press('Enter');
		await expect
			.poll(() => aside().innerText(), { timeout: 60_000 })
			.toMatch(/pairs? across water known, up to 100\.0 km/);
		await aside().getByLabel('Pairs across water that must differ').selectOption('gap');
		await expect.poll(borders).toContain('across water');
		await picture(page, 'borders-water');
		await saved(page);
		expect(await edges()).toBeGreaterThan(107);
		await page.getByRole('button', { name: /^Undo/ }).first().click();
		await expect.poll(borders).not.toContain('across water');

		await page.getByRole('button', { name: 'Lay the table in the middle' }).click();
		const table = page.locator('.further');
		await table.getByLabel('Region', { exact: true }).fill('Kentucky');
		await expect.poll(() => table.locator('caption').innerText()).toMatch(/^\d+ of \d+ borders$/);
		await table.locator('[data-row="0"]').focus();
		await page.keyboard.press('Space');
		await page.keyboard.press('Shift+ArrowDown');
		await page.keyboard.press('Shift+ArrowDown');
		await expect.poll(() => aside().innerText()).toContain('3 borders ticked');
		await aside().getByLabel('One reason for all of them').fill('Told apart by a river in print');
		await picture(page, 'borders-table');
		await expectAccessible(page);
		await page.keyboard.press('Enter');
		await expect.poll(borders).toContain('3 struck out');
		await expect.poll(() => table.innerText()).toContain('Told apart by a river in print');
		await saved(page);
		expect(await edges()).toBe(104);
		await page.keyboard.press('Control+z');
		await expect.poll(borders).not.toContain('struck out');
	});

	it('says at once when an added border makes four inks no promise, and shows why', async () => {
		const sheet = await uploadSheet(page, statesGeoJson(), 'Planarity, journey');
		await page.goto(`${sheet}/borders`);
		await expect.poll(() => page.locator('#planar').innerText()).toContain('four inks are always');
		// Maine touches New Hampshire alone; joined to both ends of the country the map is no longer flat
		for (const [one, other] of [
			['Maine', 'California'],
			['Florida', 'Washington'],
			['Michigan', 'Texas'],
		]) {
			await aside().getByLabel('First region').fill(one);
			await aside().getByLabel('Second region').fill(other);
			await aside()
				.locator('form', { hasText: 'Add a border by hand' })
				.getByLabel('Reason')
				.fill('trial');
			await page.getByRole('button', { name: 'Add the border' }).click();
		}
		await expect
			.poll(() => page.locator('#planar').innerText(), { timeout: 20_000 })
			// one text, read once: between two borders the panel judges anew and says only that
			.toMatch(
				/cannot all be drawn in a plane without crossing[^]*\(added by hand\)[^]*Four inks are no longer promised/,
			);
		await page.getByRole('button', { name: 'Show where' }).click();
		await picture(page, 'borders-crossed');
		await expectAccessible(page);
		expect(await borders()).toContain('Four inks not guaranteed');
	});

	it('lists the pieces when they are asked for, and traces the one that is chosen', async () => {
		const sheet = await uploadSheet(page, statesGeoJson(), 'Pieces, journey');
		await page.goto(`${sheet}/borders`);
		await drawn(page);
		await page.locator('#pieces summary').click();
		await expect.poll(() => page.locator('#pieces').innerText()).toMatch(/\d+ pieces/);
		await page.locator('#pieces [data-row]').first().click();
		await expect.poll(() => page.locator('path.line.border').count()).toBe(1);
		await picture(page, 'borders-pieces');
		await expectAccessible(page);
		await page.setViewportSize(phone);
		await page.locator('#planar').scrollIntoViewIfNeeded();
		await picture(page, 'borders-phone');
		await page.locator('#borders').scrollIntoViewIfNeeded();
		await picture(page, 'borders-phone-table');
		const wide = await page.evaluate(() => document.documentElement.scrollWidth);
		expect(wide).toBeLessThanOrEqual(phone.width);
	});
});
