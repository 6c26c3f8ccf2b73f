import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import {
	demo,
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { drawn, enterTeam, saved, team } from '../support/desk.ts';

describe('each role of a team', () => {
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

	async function enter(role: string) {
		await signInAs(page, role);
		await enterTeam(page);
	}

	/** The demo team opens with its sheet already coloured. */
	async function openDemoSheet() {
		await page.getByRole('link', { name: 'Districts of Tavaröe', exact: true }).click();
		await drawn(page);
	}

	it.each(['cartographer', 'analyst', 'planner', 'designer', 'approver', 'admin'])(
		'%s opens every stage of the demo sheet',
		async (role) => {
			await enter(role);
			await picture(page, `${role}-sheets`);
			await expectAccessible(page);
			await openDemoSheet();
			// figures are not a designer's business
			const figures = role === 'designer' ? [] : ['Measures', 'Territories'];
			const drawing = ['Boundaries', 'Borders', 'Colours', 'Palette', 'Layout'];
			for (const stage of [...drawing, ...figures, 'Editions']) {
				await page
					.getByRole('navigation', { name: 'Docket' })
					.getByRole('link', { name: stage, exact: true })
					.click();
				await page.waitForURL(new RegExp(`/${stage.toLowerCase()}$`));
				await drawn(page);
				await picture(page, `${role}-${stage.toLowerCase()}`);
				await expectAccessible(page);
			}
			expect(complaints).toEqual([]);
		},
	);

	it('a designer changes the title and sees it drawn, as text only', async () => {
		await enter('designer');
		await openDemoSheet();
		await page.goto(page.url().replace(/colours.*$/, 'layout'));
		await drawn(page);
		const title = `Districts, ${'<b>bold</b>'} & co`;
		const before = await page.getByLabel('Title', { exact: true }).inputValue();
		await page.getByLabel('Title', { exact: true }).fill(title);
		await page.getByLabel('Title', { exact: true }).press('Tab');
		await expect
			.poll(() => page.locator('main svg:has([data-key])').innerHTML())
			.toContain('&lt;b&gt;bold');
		await saved(page);
		await page.getByLabel('Title', { exact: true }).fill(before);
		await page.getByLabel('Title', { exact: true }).press('Tab');
		await saved(page);
		expect(complaints).toEqual([]);
	});

	it('an approver issues an edition whose files stay the same', async () => {
		await enter('approver');
		await openDemoSheet();
		await page.goto(page.url().replace(/colours.*$/, 'editions'));
		await drawn(page);
		await page.getByLabel('Note').fill('First for the field');
		const button = page.getByRole('button', { name: /^Issue edition \d+/ });
		const number = (await button.innerText()).replace(/\D/g, '');
		await button.click();
		await expect
			.poll(() => page.getByRole('complementary').innerText(), { timeout: 60_000 })
			.toContain('First for the field');
		await picture(page, 'edition-issued');
		await expectAccessible(page);
		const file = page.getByRole('complementary').locator(`a[href*="/editions/${number}/"]`).first();
		const href = await file.getAttribute('href');
		const once = await (await page.request.get(href ?? '')).body();
		const twice = await (await page.request.get(href ?? '')).body();
		expect(once.length).toBeGreaterThan(1000);
		expect(once.equals(twice)).toBe(true);
		expect(complaints).toEqual([]);
	});

	it('an admin invites by e-mail, and the link in the mail opens the invitation', async () => {
		await enter('admin');
		await page.getByRole('link', { name: 'Members' }).click();
		await page.waitForURL(/members$/);
		await expectAccessible(page);
		await picture(page, 'members');
		const guest = `newcomer-${Date.now()}@example.org`;
		await page.getByRole('textbox', { name: /E-mail/ }).fill(guest);
		await page
			.getByRole('main')
			.getByLabel(/designer/i)
			.last()
			.check();
		await page.getByRole('button', { name: /invit/i }).first().click();
		await page.getByText(guest).first().waitFor();
		await page.goto('/mail');
		await expectAccessible(page);
		await picture(page, 'mail');
		const link = await invitationLink(page, guest);
		const newcomer = await openPage(browser);
		await newcomer.page.goto(link);
		await expectAccessible(newcomer.page);
		await picture(newcomer.page, 'invitation');
		await newcomer.context.close();
		expect(complaints).toEqual([]);
	});

	it('an admin reads tokens, activity, settings and palettes at desk and phone width', async () => {
		await enter('admin');
		for (const place of ['tokens', 'activity', 'settings', 'palettes']) {
			await page.goto(`${team}/${place}`);
			await expectAccessible(page);
			await picture(page, place);
			await page.setViewportSize(phone);
			await picture(page, `phone-${place}`);
			expect(await page.evaluate('document.documentElement.scrollWidth')).toBeLessThanOrEqual(
				phone.width,
			);
			await page.setViewportSize({ width: 1280, height: 800 });
		}
		expect(complaints).toEqual([]);
	});

	it('a new team opens empty, with the sample at hand', async () => {
		await signInAs(page, 'admin');
		await page.goto('/teams/new');
		await expectAccessible(page);
		await page.getByRole('textbox').first().fill(`Harbour Board ${Date.now()}`);
		await page.getByRole('main').getByRole('button').first().click();
		await page.waitForURL(/\/sheets$/);
		await expectAccessible(page);
		await picture(page, 'empty-team');
		await page.setViewportSize(phone);
		await picture(page, 'phone-empty-team');
		await page.setViewportSize({ width: 1280, height: 800 });
		await page.getByRole('button', { name: /sample/i }).click();
		await page.waitForURL(/\/sheets\/\d+/, { timeout: 120_000 });
		await drawn(page);
		expect(await page.locator('main svg [data-key]').count()).toBe(180);
		expect(complaints).toEqual([]);
	});

	it('whoever is not signed in is asked to sign in and sees no team', async () => {
		const { users } = demo();
		expect(users.length).toBeGreaterThan(5);
		await page.goto('/');
		await expectAccessible(page);
		await picture(page, 'front');
		await page.goto('/sign-in');
		await expectAccessible(page);
		await picture(page, 'sign-in');
		await page.goto('/api-guide');
		await expectAccessible(page);
		await picture(page, 'api-guide');
		await page.goto('/teams');
		expect(new URL(page.url()).pathname).toBe('/sign-in');
	});

	it('a wrong password is told plainly and says nothing about the account', async () => {
		await page.goto('/sign-in');
		const form = page.locator('form', { has: page.getByLabel('Password') });
		await form.getByLabel('E-mail').fill('nobody@example.org');
		await form.getByLabel('Password').fill('not the password');
		await page.getByRole('button', { name: 'Sign in', exact: true }).click();
		await page.getByRole('alert').first().waitFor();
		expect(await page.getByRole('alert').first().innerText()).not.toMatch(/unknown|no such/i);
		await expectAccessible(page);
	});
});

/** Opens the newest message to this address in the demo inbox and returns the link in it. */
async function invitationLink(page: Page, address: string): Promise<string> {
	await expect
		.poll(
			async () => {
				await page.reload();
				return page.getByText(address).count();
			},
			{ timeout: 20_000 },
		)
		.toBeGreaterThan(0);
	const inPage = page.locator('a[href*="/invitation/"]').first();
	if ((await inPage.count()) === 0)
		await page.getByRole('link', { name: /invit/i }).first().click();
	await page.locator('a[href*="/invitation/"]').first().waitFor();
	return (await page.locator('a[href*="/invitation/"]').first().getAttribute('href')) ?? '';
}
