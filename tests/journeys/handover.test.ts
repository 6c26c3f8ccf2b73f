import { readFileSync } from 'node:fs';
import Papa from 'papaparse';
import type { Browser, Page } from 'playwright-core';
import readXlsxFile from 'read-excel-file/node';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { adoptedSheet } from '../support/adopted-sheet.ts';
import {
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { firm } from '../support/planned-sheet.ts';

/** From an adopted proposal to an approved list: the planner, the people in the field, the approver. */
describe('handing over', () => {
	let browser: Browser;
	let planner: Page;
	let complaints: string[];
	let territories: string;
	let list: string;

	beforeAll(async () => {
		browser = await startBrowser();
		({ page: planner, complaints } = await openPage(browser));
		await signInAs(planner, 'planner');
		territories = await adoptedSheet(planner);
		list = `${territories}/handovers/1`;
	}, 300_000);
	afterAll(() => browser.close());

	const say = (page: Page, words: string | RegExp) =>
		page.getByText(words).first().waitFor({ state: 'visible' });

	it('the planner makes a list of the moves, by keyboard alone', async () => {
		await planner.goto(`${territories}/handovers`);
		await say(planner, /No list yet/);
		await expectAccessible(planner);
		await planner.getByLabel('Moves of').focus();
		await planner.keyboard.press('Tab');
		await planner.keyboard.type('05012020');
		await planner.getByLabel('Note').focus();
		await planner.keyboard.type('As talked over in the autumn.');
		await planner.keyboard.press('Tab');
		await planner.keyboard.press('Enter');
		await say(planner, /This day has passed/);
		await planner.getByLabel('Effective date').fill('2099-01-01');
		await planner.getByRole('button', { name: 'Make the list' }).press('Enter');
		await planner.waitForURL(/handovers\/1$/);
		await say(planner, 'As talked over in the autumn.');
		await picture(planner, 'handover-list');
		await expectAccessible(planner);
	});

	it('the planner sorts, filters and changes a move', async () => {
		await planner.getByRole('link', { name: 'To', exact: true }).press('Enter');
		await planner.waitForURL(/sort=to/);
		const cells = await planner.locator('tbody td[data-label="To"]').allInnerTexts();
		expect(cells).toEqual([...cells].sort((a, b) => a.localeCompare(b, 'en')));
		await planner.getByLabel('Find').fill('closes');
		await planner.getByLabel('Find').press('Enter');
		await planner.waitForURL(/words=closes/);
		const leaver = firm.rows.filter(({ territory }) => territory === 'T13').length;
		expect(await planner.locator('tbody tr').count()).toBe(leaver);
		await planner.getByRole('link', { name: 'Show all', exact: true }).press('Enter');
		await planner.waitForURL((url) => !url.search.includes('words'));
		await planner
			.getByRole('link', { name: /^Change / })
			.first()
			.press('Enter');
		await planner.getByLabel('Reason', { exact: true }).fill('nearer to the depot');
		await planner.getByRole('button', { name: 'Keep this reason' }).press('Enter');
		await say(planner, 'The reason is changed.');
		await expectAccessible(planner);
		await planner.getByLabel(/^State, as/).selectOption('disputed');
		await planner.getByRole('button', { name: 'Set the state' }).press('Enter');
		await say(planner, 'Say in a word why it is disputed.');
		await planner.goto(list);
	});

	it('the planner sends the letters, once', async () => {
		await planner.getByRole('button', { name: /^Send \d+ letters$/ }).press('Enter');
		await say(planner, /\d+ letters sent\./);
		expect(await planner.getByRole('button', { name: /^Send \d+ letter/ }).count()).toBe(0);
		await picture(planner, 'handover-sent');
		await expectAccessible(planner);
	});

	it('the planner takes the list as CSV and as a workbook', async () => {
		const fetchFile = async (kind: string) => {
			const [download] = await Promise.all([
				planner.waitForEvent('download'),
				planner.getByRole('link', { name: kind, exact: true }).click(),
			]);
			return readFileSync(await download.path());
		};
		const rows = Papa.parse<Record<string, string>>((await fetchFile('CSV')).toString(), {
			header: true,
			skipEmptyLines: true,
		}).data;
		expect(rows.length).toBeGreaterThan(10);
		expect(rows[0].reason).toBeTruthy();
		const [moves] = await readXlsxFile(await fetchFile('XLSX'));
		expect(moves.data).toHaveLength(rows.length + 1);
	});

	/** Opens the letter of the leaver, out of the demo's mail, as nobody in particular. */
	async function openLetter(options: Parameters<typeof openPage>[1]) {
		const { page: admin, context } = await openPage(browser);
		await signInAs(admin, 'admin');
		await admin.goto('/mail');
		const leaver = firm.territories.find(({ key }) => key === 'T13')?.email ?? '';
		const mail = admin.locator('article', { hasText: `To ${leaver}` }).first();
		const href = await mail.locator('a[href*="/handover/"]').getAttribute('href');
		await context.close();
		const visitor = await openPage(browser, options);
		await visitor.page.goto(href ?? '');
		return visitor;
	}

	it('the leaver answers on a telephone, without an account and without a script', async () => {
		const { page, context } = await openLetter({ viewport: phone, javaScript: false });
		await say(page, /You lose \d+ regions/);
		expect(await page.getByText(/hours a year/).count()).toBe(0);
		await page.getByLabel('I dispute it').first().check();
		await page.getByRole('button', { name: 'Send my answers' }).click();
		await say(page, 'Say in a word why.');
		await page.getByLabel('Why, if you dispute it').first().fill('my best customer');
		await page.getByRole('button', { name: 'Send my answers' }).click();
		await say(page, 'Your answers are kept.');
		await page.getByRole('button', { name: /^Accept all \d+ not answered yet$/ }).click();
		await say(page, 'Your answers are kept.');
		await context.close();
	});

	it('the leaver’s page is accessible, and goes by keyboard', async () => {
		const { page, context, complaints: heard } = await openLetter({ viewport: phone });
		await say(page, /You lose \d+ regions/);
		await picture(page, 'handover-letter');
		await expectAccessible(page);
		await page.getByLabel('I dispute it').nth(1).focus();
		await page.keyboard.press('ArrowUp');
		expect(await page.getByLabel('I accept').nth(1).isChecked()).toBe(true);
		expect(heard).toEqual([]);
		await context.close();
	});

	it('an address that was never sent shows nothing', async () => {
		const { page, context } = await openPage(browser);
		const response = await page.goto(`/handover/${'A'.repeat(43)}`);
		expect(response?.status()).toBe(404);
		await expectAccessible(page);
		await context.close();
	});

	it('the approver cannot approve while a move is disputed; once it is settled, they can', async () => {
		const { page: approver, context } = await openPage(browser);
		await signInAs(approver, 'approver');
		await approver.goto(list);
		await say(approver, /1 move disputed/);
		const approve = approver.getByRole('button', { name: 'Approve this list' });
		expect(await approve.isDisabled()).toBe(true);
		expect(await approver.getByRole('link', { name: /^Change / }).count()).toBe(0);
		await expectAccessible(approver);
		await planner.goto(`${list}?state=disputed`, { waitUntil: 'networkidle' });
		await say(planner, 'my best customer');
		await planner.getByRole('link', { name: /^Change / }).press('Enter');
		await planner.getByLabel(/^State, as/).selectOption('accepted');
		await planner.getByLabel('Word', { exact: true }).fill('agreed by telephone');
		await planner.getByRole('button', { name: 'Set the state' }).press('Enter');
		await say(planner, 'The move is accepted now.');
		await approver.reload();
		await approve.press('Enter');
		await say(approver, 'The list is approved. It will not change again.');
		await say(approver, 'Digest, checked now:');
		await picture(approver, 'handover-approved');
		await expectAccessible(approver);
		await context.close();
		expect(complaints).toEqual([]);
	});

	it('is read on a telephone as well', async () => {
		const { page, context, complaints: heard } = await openPage(browser, { viewport: phone });
		await signInAs(page, 'planner');
		await page.goto(list);
		await say(page, /^Approved by/);
		const wide = await page.evaluate(() => document.documentElement.scrollWidth > innerWidth);
		expect(wide).toBe(false);
		await picture(page, 'handover-phone');
		await expectAccessible(page);
		expect(heard).toEqual([]);
		await context.close();
	});

	it('a designer is not shown any of it', async () => {
		const { page, context } = await openPage(browser);
		await signInAs(page, 'designer');
		for (const address of [list, `${territories}/handovers`, `${list}/handover-1.csv`]) {
			expect((await page.goto(address))?.status()).toBe(403);
		}
		await context.close();
	});
});
