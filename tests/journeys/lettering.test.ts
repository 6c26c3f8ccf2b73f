import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { expectAccessible, openPage, picture, signInAs, startBrowser } from '../support/browser.ts';
import { drawn, enterTeam, saved, uploadSheet } from '../support/desk.ts';
import { statesGeoJson } from '../support/uploads.ts';

describe('names on a sheet', () => {
	let browser: Browser;
	let page: Page;
	let contexts: BrowserContext[];
	let complaints: string[][];
	let sheet: string;
	const enter = async (role: string) => {
		const opened = await openPage(browser);
		contexts.push(opened.context);
		complaints.push(opened.complaints);
		await signInAs(opened.page, role);
		return opened.page;
	};
	beforeAll(async () => {
		browser = await startBrowser();
	});
	afterAll(() => browser.close());
	beforeEach(async () => {
		[contexts, complaints] = [[], []];
		const first = await enter('cartographer');
		await enterTeam(first);
		sheet = await uploadSheet(first, statesGeoJson(), 'Names, journey');
		page = await enter('designer');
		await page.goto(`${sheet}/layout`);
		await drawn(page);
	});
	afterEach(async () => {
		for (const context of contexts) await context.close();
		expect(complaints.flat()).toEqual([]);
	});

	const label = (name: string) =>
		page.locator('#sheet-labels text', { hasText: new RegExp(`^${name}$`) });
	const place = async (name: string): Promise<[number, number]> => {
		const [x, y] = await Promise.all(['x', 'y'].map((axis) => label(name).getAttribute(axis)));
		return [Number(x), Number(y)];
	};
	const bar = () => page.getByRole('group', { name: /^The name of/ });
	const choose = async (name: string) => {
		await label(name).evaluate((text) => text.scrollIntoView());
		const box = (await label(name).boundingBox())!;
		await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2);
		await page.getByRole('group', { name: `The name of ${name}` }).waitFor();
	};
	const undo = () => page.getByRole('button', { name: /^Undo/ }).first().click();

	it('are moved by keys and by pointer, hidden, abbreviated, taken back, saved and numbered', async () => {
		const kansas = await place('Kansas');
		await choose('Kansas');
		await bar().getByRole('button', { name: 'Move the name right' }).focus();
		await page.keyboard.press('Shift+ArrowRight');
		await page.keyboard.press('ArrowUp');
		// to a hundredth of a millimetre, as places are whole ones
		const moved = async () =>
			(await place('Kansas')).map((at, axis) => at - kansas[axis] - [500, -50][axis]);
		await expect.poll(async () => Math.max(...(await moved()).map(Math.abs))).toBeLessThan(2);
		await expectAccessible(page);
		await picture(page, 'lettering');

		const utah = await place('Utah');
		const box = (await label('Utah').boundingBox())!;
		await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
		await page.mouse.down();
		await page.mouse.move(box.x - 60, box.y + 10, { steps: 6 });
		await page.mouse.up();
		await expect.poll(async () => (await place('Utah'))[0]).toBeLessThan(utah[0] - 500);

		await choose('Ohio');
		await bar().getByRole('button', { name: 'Hide' }).click();
		await expect.poll(() => label('Ohio').count()).toBe(0);
		await undo();
		await expect.poll(() => label('Ohio').count()).toBe(1);
		await page.getByRole('button', { name: /^Redo/ }).first().click();
		await expect.poll(() => label('Ohio').count()).toBe(0);

		// Maryland finds no room by itself
		const names = page.getByRole('button', { name: 'Table of names', exact: true });
		await names.click();
		const table = page.getByRole('group', { name: 'Table of names' });
		await table.getByLabel('Find').fill('Maryland');
		await expect.poll(() => table.innerText()).toContain('in the table only');
		await table.getByRole('button', { name: 'Maryland' }).click();
		await bar().getByLabel('Abbreviation').fill('Md.');
		await expect.poll(() => label('Md\\.').count()).toBe(1);

		// so large that several names find no room
		await page.getByLabel('Size, pt', { exact: true }).fill('11');
		const numbers = page.getByLabel('Numbers and a list');
		await numbers.check();
		const collar = page.locator('#sheet-collar');
		await expect.poll(() => collar.textContent()).toContain('Names by number');
		await saved(page);
		const stands = await Promise.all([place('Kansas'), place('Utah')]);

		await page.reload();
		await drawn(page);
		await expect.poll(() => collar.textContent()).toContain('Names by number');
		expect(await Promise.all([place('Kansas'), place('Utah')])).toEqual(stands);
		expect(await label('Ohio').count()).toBe(0);
		await names.click();
		await table.getByLabel('Find').fill('by hand');
		await expect.poll(() => table.innerText()).toContain('Kansas');
		await expectAccessible(page);
		await picture(page, 'lettering-table');
	});
});
