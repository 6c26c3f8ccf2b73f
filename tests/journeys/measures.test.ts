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
import { docket, drawn, team } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';
import { xlsx } from '../support/measure-tables.ts';
import type { ChosenFile } from '../support/uploads.ts';

const stage = `${team}/sheets/1/measures`;

/** Names of districts of the sample republic, and what a person mistypes of them. */
const districts = [
	'Saelhavn',
	'Prinennes',
	'Thyruvar',
	'Pellösk',
	'Quoröya',
	'Brylilde',
	'Dolarroy',
];

/** Headings in the third row, a name cut short, one in capitals, one twice, a total, a word, a debt. */
async function accounts(measure: string): Promise<ChosenFile> {
	const rows = [
		['Accounts by district'],
		[null],
		['District', `${measure} [pcs]`, 'Hours [h]'],
		...districts.map((name, at) => [
			at === 3 ? 'Pellös' : at === 5 ? name.toUpperCase() : name,
			at + 1,
			at === 1 ? 'call back' : at === 4 ? -4 : 10 * at,
		]),
		['Saelhavn', 100, 5],
		['Total', 128, 999],
	];
	const bytes = await xlsx({ Figures: rows, Notes: [['made for a test']] });
	return {
		name: 'accounts.xlsx',
		mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
		buffer: Buffer.from(bytes),
	};
}

describe('a table of figures', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];

	beforeAll(async () => {
		browser = await startBrowser();
	});
	afterAll(() => browser.close());
	afterEach(() => context.close());

	async function open(options: Parameters<typeof openPage>[1] = {}) {
		({ page, context, complaints } = await openPage(browser, options));
		await signInAs(page, 'analyst');
		await page.goto(stage);
	}
	const upload = async (measure: string) => {
		await page.locator('input[type=file]').setInputFiles(await accounts(measure));
		await page.getByRole('button', { name: 'Upload and review' }).click();
		await page.getByRole('heading', { name: 'Rows and regions' }).waitFor({ timeout: 60_000 });
	};
	const outcome = (name: string) => page.getByRole('article', { name });
	const open2 = () => page.getByRole('heading', { name: /names? no region/ });

	async function dropTable() {
		await page.getByText('Drop this table').click();
		await page.getByRole('button', { name: /^Drop the table/ }).click();
		await page.waitForURL(/\/measures$/);
	}

	describe('with a pointer', () => {
		beforeEach(() => open());

		it('is uploaded, mended, taken over, looked at, replaced and dropped', async () => {
			const measure = `Accounts ${Date.now()}`;
			await drawn(page);
			await expectAccessible(page);
			await picture(page, 'measures-empty');
			await upload(measure);
			await expect.poll(() => page.locator('#join').innerText()).toContain('7 of 9 rows joined');
			await expect.poll(() => page.getByRole('main').innerText()).toContain('headings in row 3');
			await picture(page, 'measures-review');
			await expectAccessible(page);

			// a wrong word first: it is told beside the field and what was typed stays
			const other = page.getByLabel('Another region for Pellös, by key or name');
			await other.fill('Nowhere');
			await page.getByRole('button', { name: 'Keep these decisions' }).click();
			await page.getByText('No region has this key or this name.').waitFor();
			await expect.poll(() => other.inputValue()).toBe('Nowhere');
			await expectAccessible(page);
			await other.fill('');
			await page.getByLabel('What to do with Pellös').selectOption({ label: 'Pellösk (0104)' });
			await page.getByLabel('What to do with Total').selectOption('leave it out');
			await page.getByRole('button', { name: 'Keep these decisions' }).click();
			await open2().waitFor({ state: 'detached' });

			// sums by hand: 1 to 7 and 100 joined, 128 in the total; hours refuse a word and a debt
			await expect
				.poll(() => outcome(measure).innerText())
				.toContain('128 of 256 pcs joined; 128 pcs in 1 row without a region.');
			await expect.poll(() => outcome('Hours').innerText()).toMatch(/1 cell holds no number/);
			expect(await page.getByRole('button', { name: /^Take over/ }).count()).toBe(0);
			await page.getByLabel('Cells that hold no number').selectOption('count as missing');
			await page.getByLabel('Numbers below zero').selectOption('are kept');
			await page.getByLabel('Name', { exact: true }).nth(1).fill(`Hours of ${measure}`);
			await page.getByRole('button', { name: 'Show what comes of it' }).click();
			await page.getByRole('button', { name: 'Take over 2 columns' }).waitFor();
			expect(await page.getByLabel('Confidential').isChecked()).toBe(true);
			await picture(page, 'measures-before-taking');
			await expectAccessible(page);
			await page.getByRole('button', { name: 'Take over 2 columns' }).click();

			await page.waitForURL(/\/measures$/);
			await drawn(page);
			await expect.poll(() => page.locator('#measures').innerText()).toContain('128 pcs in all');
			await expect.poll(() => docket(page, 'Measures').innerText()).toMatch(/\d+ measures?/);
			await page.getByRole('button', { name: new RegExp(`: ${measure}$`) }).click();
			const row = page.getByRole('row', { name: /Saelhavn/ });
			await expect.poll(() => row.innerText()).toContain('101 pcs');
			await picture(page, 'measures-taken');
			await expectAccessible(page);

			// the same once more: what changes is shown before
			await page.getByRole('button', { name: 'Sheet', exact: true }).click();
			await upload(measure);
			await page.getByRole('button', { name: /^Give every row its nearest region/ }).click();
			await page.getByRole('button', { name: 'Leave it out' }).click();
			await open2().waitFor({ state: 'detached' });
			await expect
				.poll(() => outcome(measure).innerText())
				.toContain('Replaces what is there: 0 regions change');
			await expectAccessible(page);
			await dropTable();
			await page.getByRole('link', { name: 'accounts' }).first().click();
			await page.getByText('Columns in use').waitFor();
			await expectAccessible(page);
			await picture(page, 'measures-table');
			await dropTable();
			await expect.poll(() => page.locator('#measures').innerText()).not.toContain(measure);
			expect(complaints.filter((line) => !line.includes('status of 422'))).toEqual([]);
		});
	});

	it('is mended and taken over by keyboard alone', async () => {
		await open();
		await drawn(page);
		const measure = `Keyed ${Date.now()}`;
		// the file chooser is the browser's own window; everything after it is done by keys
		await page.locator('input[type=file]').setInputFiles(await accounts(measure));
		const press = async (name: string | RegExp) => {
			await tabTo(page, page.getByRole('button', { name }));
			await page.keyboard.press('Enter');
		};
		await press('Upload and review');
		await page.getByRole('heading', { name: 'Rows and regions' }).waitFor({ timeout: 60_000 });
		await tabTo(page, page.getByLabel('What to do with Pellös'));
		await page.keyboard.type('Pell');
		await tabTo(page, page.getByLabel('What to do with Total'));
		await page.keyboard.type('leave');
		await press('Keep these decisions');
		await open2().waitFor({ state: 'detached' });
		// the column of hours is not wanted: its tick goes
		await tabTo(page, page.getByRole('checkbox', { name: 'Hours [h]' }));
		await page.keyboard.press('Space');
		await press('Show what comes of it');
		await press('Take over 1 column');
		await page.waitForURL(/\/measures$/);
		await expect.poll(() => page.locator('#measures').innerText()).toContain(measure);
		await tabTo(page, page.locator('#tables a').first());
		await page.keyboard.press('Enter');
		await tabTo(page, page.locator('summary', { hasText: 'Drop this table' }));
		await page.keyboard.press('Enter');
		await press(/^Drop the table/);
		await page.waitForURL(/\/measures$/);
		await expect.poll(() => page.locator('#measures').innerText()).not.toContain(measure);
		expect(complaints).toEqual([]);
	});

	it('is taken over without JavaScript, on a phone', async () => {
		await open({ javaScript: false, viewport: phone });
		const measure = `Plain ${Date.now()}`;
		await upload(measure);
		await expectReadable();
		await page.getByLabel('Another region for Pellös, by key or name').fill('0104');
		await page.getByLabel('What to do with Total').selectOption('leave it out');
		await page.getByRole('button', { name: 'Keep these decisions' }).click();
		await page.getByRole('checkbox', { name: 'Hours [h]' }).uncheck();
		await page.getByRole('button', { name: 'Show what comes of it' }).click();
		await page.getByRole('button', { name: 'Take over 1 column' }).click();
		await page.waitForURL(/\/measures$/);
		await expect.poll(() => page.locator('#measures').innerText()).toContain(measure);
		await page.getByRole('link', { name: 'accounts' }).first().click();
		await dropTable();
		expect(complaints).toEqual([]);
	});

	/** Nothing is wider than the screen of a phone. */
	async function expectReadable() {
		const { width } = (await page.locator('main').boundingBox()) ?? { width: Infinity };
		expect(width).toBeLessThanOrEqual(phone.width);
		await picture(page, 'measures-phone');
	}

	it('is not shown to a designer, whose docket has no such stage', async () => {
		({ page, context, complaints } = await openPage(browser));
		await signInAs(page, 'designer');
		await page.goto(stage.replace('measures', 'colours'));
		await drawn(page);
		expect(await docket(page, 'Measures').count()).toBe(0);
		expect((await page.goto(stage))?.status()).toBe(403);
	});
});
