import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { api, joinHours, sampleSheet, sheetPlannedToday } from '../support/adopted-sheet.ts';
import { expectAccessible, openPage, picture, signInAs, startBrowser } from '../support/browser.ts';
import { docket, drawn, saved, team } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';
import { xlsx } from '../support/measure-tables.ts';
import { firm } from '../support/planned-sheet.ts';

/** A year's rebalance by the planner, from a workbook as it is received to letters to the field. */
let browser: Browser;
beforeAll(async () => {
	browser = await startBrowser();
});
afterAll(() => browser.close());

const xlsxType = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';
const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name }).click();
const told = (page: Page, words: string | RegExp) => page.getByText(words).first().waitFor();
/** a rebalance on a busy machine */
const patience = 120_000;

describe('the planner', () => {
	let page: Page;
	let complaints: string[];
	let number: number;
	let sheet: string;
	beforeAll(async () => {
		number = await sampleSheet('Rounds of the year');
		sheet = `${team}/sheets/${number}`;
		({ page, complaints } = await openPage(browser));
		await signInAs(page, 'planner');
	});

	it('joins a workbook as it was received and mends what is wrong with it', async () => {
		await page.goto(`${sheet}/measures`);
		await drawn(page);
		await page.locator('input[type=file]').setInputFiles('sample-data/quellorn-as-received.xlsx');
		await press(page, 'Upload and review');
		await page.getByRole('heading', { name: 'Rows and regions' }).waitFor({ timeout: patience });
		await expect.poll(() => page.locator('#join').innerText()).toContain('175 of 180 rows joined');
		await expectAccessible(page);
		await press(page, /^Give every row its nearest region/);
		await page.getByLabel('What to do with Thravvennes').waitFor({ state: 'detached' });
		await page.getByLabel('What to do with All districts').selectOption('leave it out');
		await press(page, 'Keep these decisions');
		await page.getByLabel('What to do with All districts').waitFor({ state: 'detached' });

		// codes are not wanted, outlets and potential neither; the words of the last column are
		for (const at of [0, 2, 4]) await page.locator(`input[name="take-${at}"]`).uncheck();
		await page.locator('input[name="take-5"]').check();
		await page.getByText('How Round, Territory is taken').click();
		await page.locator('input[name="name-3"]').fill('Visits');
		await page.locator('input[name="name-5"]').fill('Round');
		await page.locator('select[name="doubled-3"]').selectOption('the first counts');
		await page.locator('select[name="notNumber-3"]').selectOption('count as missing');
		await page.locator('select[name="doubled-5"]').selectOption('the first counts');
		await press(page, 'Show what comes of it');
		await press(page, 'Take over 2 columns');
		await page.waitForURL(/\/measures$/);
		await expect.poll(() => docket(page, 'Measures').innerText()).toMatch(/7 values missing/);
	});

	it('adds the figures that were missing from a second workbook', async () => {
		const { values } = await api(`/sheets/${number}/measures/Visits`);
		const known = values as Record<string, number>;
		const rows = firm.rows.filter(({ code }) => !(code in known));
		expect(rows).toHaveLength(7);
		const bytes = await xlsx({
			Late: [['code', 'Visits (hours a year)'], ...rows.map(({ code, hours }) => [code, hours])],
		});
		const late = { name: 'late.xlsx', mimeType: xlsxType, buffer: Buffer.from(bytes) };
		await page.locator('input[type=file]').setInputFiles(late);
		await press(page, 'Upload and review');
		await page.getByRole('heading', { name: 'Rows and regions' }).waitFor({ timeout: patience });
		await page.locator('select[name^="existing"]').selectOption('add to its figures');
		await press(page, 'Show what comes of it');
		await told(page, /7 get a value that had none/);
		await press(page, 'Take over 1 column');
		await page.waitForURL(/\/measures$/);
		await expect.poll(() => docket(page, 'Measures').innerText()).not.toContain('missing');
	});

	it('makes territories from a column of it, and sees who is over', async () => {
		await page.getByRole('link', { name: 'Territories', exact: true }).click();
		await page
			.getByLabel('From a column')
			.selectOption({ label: 'Round, from quellorn-as-received' });
		await told(page, /^1[34] territories: /);
		await press(page, 'Make territories from it');
		await told(page, /^1[34] territories$/);
		// bases, people and ferries as the firm has them
		await sheetPlannedToday(page, number, 1);
		await page.reload();
		await drawn(page);
		await told(page, '1 territory is torn');
		const over = page.getByRole('row', { name: /Thyruvar/ });
		await expect.poll(() => over.innerText()).toContain('22.5 % over');
		await expect.poll(() => docket(page, 'Territories').innerText()).toContain('outside 10 %');
		await picture(page, 'planner-today');
		await expectAccessible(page);
	});

	async function ask(name: string, change: () => Promise<unknown>) {
		await change();
		await page.getByLabel('Name of the proposal').fill(name);
		await press(page, 'Even the territories out');
		await told(page, 'Asked for.');
		const item = page.getByRole('listitem').filter({ hasText: name });
		await item.getByText('Moved ').waitFor({ timeout: patience });
		return item;
	}

	it('has them evened out within 10 %, and asks for two more to choose from', async () => {
		await page.getByRole('link', { name: /^Proposals/ }).click();
		await told(page, /^None yet/);
		await expectAccessible(page);
		const first = await ask(
			'Within 10 %',
			async () =>
				await expect.poll(() => page.getByLabel('Visits, hours a year').inputValue()).toBe('10'),
		);
		await expect
			.poll(() => first.innerText())
			.toMatch(/at least \d+ needed|no plan does with less/);
		await ask('Neighbours only', async () => {
			await page.getByText('Further wishes').click();
			await page.getByLabel('How far a region may go').fill('1');
			await saved(page);
		});
		await ask('As even as can be', async () => {
			await page.getByLabel('How far a region may go').fill('');
			await page.getByLabel('What to aim for').selectOption('the least deviation');
			await saved(page);
		});
		await expectAccessible(page);
	});

	it('changes two moves of a copy by hand, and sees what that does', async () => {
		await page.getByRole('link', { name: 'Within 10 %' }).click();
		await told(page, 'Today beside it');
		await press(page, 'Keep a copy');
		await page.getByRole('link', { name: 'All proposals' }).click();
		await page.getByRole('link', { name: 'Within 10 %, copy' }).click();
		await page.getByRole('main').getByRole('button', { name: 'Table of moves' }).click();
		const moves = page.getByRole('table', { name: 'Regions moved' });
		const [one, other] = await byHand(moves.getByRole('row'));
		await told(page, '2 regions changed by hand');
		await saved(page);
		await expect.poll(() => page.getByRole('main').innerText()).not.toContain(one);
		await picture(page, 'planner-by-hand');
		await page.getByRole('button', { name: 'Undo', exact: true }).click();
		await told(page, '1 region changed by hand');
		await page.getByRole('button', { name: 'Redo', exact: true }).click();
		await told(page, '2 regions changed by hand');
		await saved(page);
		expect(other).not.toBe(one);
		await expectAccessible(page);
	});

	/** Gives the first two regions that go between territories that stay back to where they are. */
	async function byHand(rows: ReturnType<Page['locator']>): Promise<string[]> {
		const names: string[] = [];
		for (const turn of [0, 1]) {
			const row = rows.filter({ has: page.getByRole('button', { name: /^Give / }) }).nth(turn * 0);
			names.push((await row.getByRole('button').first().innerText()).trim());
			await row.getByRole('button', { name: /^Give / }).click();
			await told(page, turn === 0 ? '1 region changed by hand' : '2 regions changed by hand');
		}
		return names;
	}

	it('compares three proposals with today', async () => {
		await page.getByRole('link', { name: 'All proposals' }).click();
		for (const name of ['Within 10 %', 'Neighbours only', 'As even as can be']) {
			await page.getByRole('checkbox', { name: `Compare ${name}`, exact: true }).check();
			await page.waitForURL((url) => url.search.includes('with='));
		}
		const table = page.getByRole('table', { name: 'Today beside the proposals' });
		await expect.poll(() => table.getByRole('columnheader').count()).toBe(4);
		const outside = table.getByRole('row', { name: /^Territories outside/ });
		await expect.poll(() => outside.innerText()).toMatch(/3\s+none\s+none\s+none/);
		await picture(page, 'planner-comparison');
		await expectAccessible(page);
	});

	it('adopts one and hands its moves over by letter', async () => {
		await page
			.getByRole('table', { name: 'Today beside the proposals' })
			.getByRole('link', { name: 'Within 10 %', exact: true })
			.click();
		await page.waitForURL(/proposals\/1$/);
		await press(page, 'Adopt this proposal');
		await told(page, 'It was adopted');
		await expect.poll(() => docket(page, 'Territories').innerText()).toContain('13 territories');
		await page.getByRole('link', { name: 'Hand the moves over' }).click();
		await page.getByLabel('Effective date').fill('2099-01-01');
		await press(page, 'Make the list');
		await page.waitForURL(/handovers\/1$/);
		await press(page, /^Send \d+ letters$/);
		await told(page, /\d+ letters sent\./);
		await expectAccessible(page);
		expect(complaints.filter((line) => !line.includes('status of 422'))).toEqual([]);
	});
});

describe('the planner without a pointer', () => {
	it('evens out, changes a move, compares, adopts and hands over', async () => {
		const number = await sampleSheet('Rounds by keyboard');
		const { page, complaints } = await openPage(browser);
		await signInAs(page, 'planner');
		await joinHours(number);
		const territories = await sheetPlannedToday(page, number);
		await page.goto(territories);
		await drawn(page);
		const enter = async (target: ReturnType<Page['getByRole']>) => {
			await tabTo(page, target);
			await page.keyboard.press('Enter');
		};
		const button = (name: string | RegExp) => page.getByRole('button', { name });
		await enter(page.getByRole('link', { name: /^Proposals/ }));
		await page.waitForURL(/proposals$/);
		await enter(button('Even the territories out'));
		await page
			.getByText(/^Moved \d+/)
			.first()
			.waitFor({ timeout: patience });
		await enter(page.getByRole('link', { name: 'Proposal 1', exact: true }));
		await page.waitForURL(/proposals\/1$/);

		// a region given on the sheet: the hand is filled, the arrows walk, Enter gives
		await tabTo(page, page.getByLabel('Give to'));
		await page.keyboard.type('Mirk');
		await page.keyboard.press('Enter');
		await tabTo(page, page.locator('main svg[tabindex="0"], main svg [data-key][tabindex="0"]'));
		// the first press reaches a base, which stays; the next a region beside it
		await page.keyboard.press('ArrowRight');
		await page.keyboard.press('ArrowRight');
		await page.keyboard.press('Enter');
		await told(page, /changed by hand/);
		await page.keyboard.press('Control+z');
		await page.getByText(/changed by hand/).waitFor({ state: 'detached' });
		await saved(page);

		await enter(page.getByRole('link', { name: 'All proposals' }));
		await page.waitForURL(/proposals$/);
		await tabTo(page, page.getByRole('checkbox', { name: 'Compare Proposal 1' }));
		await page.keyboard.press('Space');
		await page.getByRole('table', { name: 'Today beside the proposals' }).waitFor();
		await enter(page.getByRole('link', { name: 'Proposal 1', exact: true }));
		await page.waitForURL(/proposals\/1$/);
		await enter(button('Adopt this proposal'));
		await told(page, 'It was adopted');
		await enter(page.getByRole('link', { name: 'Hand the moves over' }));
		await page.waitForURL(/handovers$/);
		await tabTo(page, page.getByLabel('Effective date'));
		await page.keyboard.type('01012099');
		await enter(button('Make the list'));
		await page.waitForURL(/handovers\/1$/);
		await enter(button(/^Send \d+ letters$/));
		await told(page, /\d+ letters sent\./);
		expect(complaints).toEqual([]);
	});
});
