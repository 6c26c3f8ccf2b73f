import { readFile, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { expectAccessible, openPage, phone, signInAs, startBrowser } from '../support/browser.ts';

describe('a proof that is handed on', () => {
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
	});
	afterEach(() => context.close());

	it('is downloaded by an analyst and checked by somebody without an account', async () => {
		await signInAs(page, 'analyst');
		await page.getByRole('link', { name: 'Tavaröe Survey Office' }).click();
		await page.getByRole('link', { name: 'Districts of Tavaröe', exact: true }).click();
		await page.waitForURL(/\/sheets\/\d+/);
		await page.goto(page.url().replace(/(\/sheets\/\d+).*/, '$1/colours'));
		const [download] = await Promise.all([
			page.waitForEvent('download'),
			page.getByRole('link', { name: 'Proof file', exact: true }).click(),
		]);
		const path = await download.path();
		expect(complaints).toEqual([]);

		const stranger = await openPage(browser, { viewport: phone });
		await stranger.page.goto('/check-proof');
		await expectAccessible(stranger.page);
		await stranger.page.locator('input[type=file]').setInputFiles(path);
		await stranger.page.getByText('Everything this file claims is shown').waitFor();
		await expectAccessible(stranger.page);
		const shown = await stranger.page.getByRole('listitem').allInnerTexts();
		expect(shown.some((text) => text.includes('every border and every rule can be kept'))).toBe(
			true,
		);

		const spoilt = join(tmpdir(), `spoilt-${process.pid}.json`);
		const file = JSON.parse(await readFile(path, 'utf8'));
		const [[a, b]] = file.borders;
		file.claims[0].colouring[a] = file.claims[0].colouring[b];
		await writeFile(spoilt, JSON.stringify(file));
		await stranger.page.locator('input[type=file]').setInputFiles(spoilt);
		await stranger.page.getByText('does not show what it claims').waitFor();
		await stranger.page.getByText('border and have the same ink').waitFor();
		expect(stranger.complaints).toEqual([]);
		await stranger.context.close();
	});

	it('is told apart from what is none, by keyboard and pasted', async () => {
		await page.goto('/check-proof');
		await page.getByText('Paste its text instead').click();
		await page.getByLabel('Text of the file').fill('{"form":"merestone proof 1","regions":[]}');
		// a button that is not enabled yet would not be pressed by a person either
		const button = page.getByRole('button', { name: 'Check this text', disabled: false });
		await button.press('Enter');
		await page.getByText('This is no proof file').waitFor();
		await page.getByText('lacks the field').waitFor();
		await expectAccessible(page);
		expect(complaints).toEqual([]);
	});
});
