import type { Browser, BrowserContext, Locator, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { demo, openPage, startBrowser } from '../support/browser.ts';
import { docket, drawn, saved } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';

describe('by keyboard alone', () => {
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

	const several = () => {
		const user = demo().users.find(({ roles }) => roles.length > 1);
		if (!user) throw new Error('no demo member has several roles');
		return user;
	};

	async function signIn() {
		const { email, password } = several();
		await page.goto('/sign-in');
		const form = page.locator('form', { has: page.getByLabel('Password') });
		await tabTo(page, form.getByLabel('E-mail'));
		await page.keyboard.type(email);
		await tabTo(page, form.getByLabel('Password'));
		await page.keyboard.type(password);
		await page.keyboard.press('Enter');
		await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
	}

	async function follow(link: Locator) {
		await tabTo(page, link);
		await page.keyboard.press('Enter');
	}

	it('signs in, finds the sheet, walks it, locks a region, undoes it and issues an edition', async () => {
		await signIn();
		await follow(page.getByRole('link', { name: 'Tavaröe Survey Office' }));
		await page.waitForURL(/\/sheets$/);
		await follow(page.getByRole('link', { name: 'Districts of Tavaröe', exact: true }));
		await drawn(page);
		const before = await docket(page, 'Colours').innerText();

		// onto the sheet, to a neighbour, and into the margin
		await tabTo(page, page.locator('main svg [tabindex="0"], main svg[tabindex="0"]'));
		for (const arrow of ['ArrowRight', 'ArrowDown', 'ArrowLeft']) await page.keyboard.press(arrow);
		await page.keyboard.press('Enter');
		const choice = page.getByRole('group', { name: /^Lock .* to an ink/ }).getByRole('button');
		const free = choice.and(page.locator('[aria-pressed="false"]')).last();
		await tabTo(page, free);
		await page.keyboard.press('Enter');
		await expect.poll(() => docket(page, 'Colours').innerText()).not.toBe(before);
		await saved(page);

		// second thoughts
		await tabTo(page, page.getByRole('button', { name: /^Undo/ }), 'Shift+Tab');
		await page.keyboard.press('Enter');
		await expect.poll(() => docket(page, 'Colours').innerText()).toBe(before);
		await saved(page);

		await follow(
			page.getByRole('navigation', { name: 'Docket' }).getByRole('link', {
				name: 'Editions',
				exact: true,
			}),
		);
		await page.waitForURL(/editions$/);
		await tabTo(page, page.getByLabel('Note'));
		await page.keyboard.type('Issued without a pointer');
		await follow(page.getByRole('button', { name: /^Issue edition \d+/ }));
		await expect
			.poll(() => page.getByRole('complementary').innerText(), { timeout: 60_000 })
			.toContain('Issued without a pointer');
		expect(complaints).toEqual([]);
	});

	it('locks from the table and releases again', async () => {
		await signIn();
		await page.goto('/tavaroe-survey/sheets/1/colours');
		await drawn(page);
		await follow(page.getByRole('button', { name: 'Table of regions' }));
		await tabTo(page, page.getByLabel('Find a region'));
		await page.keyboard.type('Mirköve');
		await tabTo(page, page.getByLabel('Lock of Mirköve', { exact: true }));
		const before = await docket(page, 'Colours').innerText();
		await page.keyboard.press('ArrowDown');
		await expect.poll(() => docket(page, 'Colours').innerText()).not.toBe(before);
		await page.keyboard.press('Home');
		await expect.poll(() => docket(page, 'Colours').innerText()).toBe(before);
		await saved(page);
		expect(complaints).toEqual([]);
	});
});
