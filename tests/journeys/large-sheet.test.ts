import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, openPage, signInAs, startBrowser } from '../support/browser.ts';
import { docket, saved } from '../support/desk.ts';
import { tabTo } from '../support/keys.ts';
import { colourAt, painted, uploadLand } from '../support/large-sheet.ts';

/** Cells are numbered from the south-west, row by row, 71 to a row. */
const land = { regions: 5_000, inner: 12, seed: 7 };
const columns = 71;
const patience = { timeout: 20_000 };

describe('a sheet of 5,000 regions', () => {
	let browser: Browser;
	let page: Page;
	let complaints: string[];

	beforeAll(async () => {
		browser = await startBrowser();
		const sheet = await uploadLand(land, 'Five thousand, journey', 180);
		({ page, complaints } = await openPage(browser));
		page.setDefaultTimeout(60_000);
		await signInAs(page, 'cartographer');
		await page.goto(`${sheet}/colours`);
		await painted(page);
	});
	afterAll(() => browser.close());

	/** middle of the outline round the region that is selected, on the page */
	const middle = async (): Promise<[number, number]> => {
		const box = await page.locator('main path.selected.line').boundingBox();
		if (!box) throw new Error('nothing is selected');
		return [box.x + box.width / 2, box.y + box.height / 2];
	};
	const reader = (name: string) =>
		page.getByRole('group', { name: 'Reader' }).getByText(name, { exact: true });
	const selected = () => page.locator('aside h2', { hasText: /^Cell/ }).innerText();
	const told = () => page.locator('main [aria-live]').last().innerText();
	const cell = (name: string) => Number(/\d+/.exec(name)?.[0]);
	const ink = () => page.locator('aside dl rect').getAttribute('fill');

	it('is painted on a canvas that says what it shows, and its geometry came thinned', async () => {
		const canvas = page.locator('main canvas');
		expect(await canvas.getAttribute('role')).toBe('img');
		expect(await canvas.getAttribute('aria-label')).toContain('Map of 5,000 regions');
		expect(await page.locator('main svg [data-key]').count()).toBe(0);
		const fetched = await page.evaluate(() =>
			performance.getEntriesByType('resource').map(({ name }) => new URL(name).pathname),
		);
		expect(fetched.filter((path) => path.endsWith('/columns'))).toHaveLength(1);
		await expectAccessible(page);
	});

	it('finds the region under the pointer: what is selected, painted and told is one', async () => {
		const box = (await page.locator('main canvas').boundingBox())!;
		await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
		for (let turn = 0; turn < 8; turn++) await page.mouse.wheel(0, -250);
		await page.waitForTimeout(300);
		await painted(page);
		for (const [x, y] of [
			[0.5, 0.5],
			[0.3, 0.4],
			[0.7, 0.65],
		]) {
			await page.mouse.click(box.x + x * box.width, box.y + y * box.height);
			await page.locator('main path.selected.line').waitFor();
			const name = await selected();
			// the middle of a cell lies in it: its sides stray by less than half of it
			const [cx, cy] = await middle();
			await page.mouse.click(cx, cy);
			expect(await selected()).toBe(name);
			expect(await colourAt(page, cx, cy)).toBe(await ink());
			// the words of a resting pointer
			await page.mouse.move(cx + 1, cy);
			expect(await page.locator('main canvas').getAttribute('title')).toContain(name);
		}
	});

	it('is walked by keys, from row to row and from cell to cell, and each is read out', async () => {
		const from = cell(await selected());
		await tabTo(page, page.locator('main canvas'));
		await page.keyboard.press('ArrowRight');
		expect(await told()).toContain(`Cell ${from + 1},`);
		await page.keyboard.press('ArrowUp');
		expect(await told()).toContain(`Cell ${from + 1 + columns},`);
		await page.keyboard.press('ArrowLeft');
		await page.keyboard.press('ArrowDown');
		expect(await told()).toMatch(new RegExp(`^Cell ${from},.*neighbours: Cell \\d+`));
		await page.keyboard.press('Enter');
		expect(await selected()).toBe(`Cell ${from}`);
	});

	it('shows a locked ink at once, and what another reader sees', async () => {
		const [x, y] = await middle();
		const before = await ink();
		const now = await page.locator('aside dl dd').first().innerText();
		await page
			.getByRole('group', { name: /^Lock .* to an ink/ })
			.getByRole('button', { name: /^1\b/.test(now.trim()) ? /^2 / : /^1 / })
			.click();
		await expect.poll(ink, patience).not.toBe(before);
		await expect.poll(() => colourAt(page, x, y), patience).toBe(await ink());
		await docket(page, 'Colours').getByText('1 lock').waitFor();
		await saved(page);
		await painted(page);
		const typical = await colourAt(page, x, y);
		await reader('grey print').click();
		await expect.poll(() => colourAt(page, x, y), patience).not.toBe(typical);
		await painted(page);
		expect(await colourAt(page, x, y)).toMatch(/^#(..)\1\1$/);
		await reader('typical').click();
		await expect.poll(() => colourAt(page, x, y), patience).toBe(typical);
		await expectAccessible(page);
		expect(complaints).toEqual([]);
	});
});
