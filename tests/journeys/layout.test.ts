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
import { drawn, enterTeam, saved, team, uploadSheet } from '../support/desk.ts';
import { statesGeoJson } from '../support/uploads.ts';

const stamp = Date.now().toString(36);
const house = `House, journey ${stamp}`;

/** The groups of the sheet's file, by name, as a browser reads them. */
const groupsOf = (page: Page, sheet: string) =>
	page.evaluate(async (address) => {
		// a style block would be refused by the page's policy, and nobody asks for it here
		const text = (await (await fetch(`${address}/sheet.svg`)).text()).replace(
			/<style[\s\S]*?<\/style>/,
			'',
		);
		const root = new DOMParser().parseFromString(text, 'image/svg+xml').documentElement;
		const groups: Record<string, string> = {};
		for (const group of root.querySelectorAll('g[id]')) {
			const { id } = group;
			groups[id] =
				`${group.getAttribute('stroke')} ${group.getAttribute('stroke-width')} ${group.getAttribute('stroke-dasharray')} | ${group.textContent?.trim()}`;
		}
		return groups;
	}, sheet);

const section = (page: Page, title: string) =>
	page.locator('details').filter({ has: page.getByRole('heading', { name: title, exact: true }) });

async function openSection(page: Page, title: string) {
	const found = section(page, title).first();
	if (!(await found.evaluate((one) => (one as HTMLDetailsElement).open)))
		await found.locator('summary').first().click();
	return found;
}

describe('the layout of a sheet', () => {
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

	it('is kept as a template, which sets a second sheet so that both look alike', async () => {
		const first = await uploadSheet(page, statesGeoJson(), `Layout one ${stamp}`);
		const second = await uploadSheet(page, statesGeoJson(), `Layout two ${stamp}`);
		await page.goto(`${first}/layout`);
		await drawn(page);
		const lines = await openSection(page, 'Lines');
		await lines.getByLabel('Regions: drawn').selectOption({ label: 'as set here' });
		const region = lines.getByRole('group', { name: 'Regions' });
		await region.getByLabel('Width, mm').fill('0.25');
		await region.getByLabel('Line', { exact: true }).selectOption({ label: 'short dashes' });
		await expect
			.poll(() => page.locator('#sheet-borders-region').getAttribute('stroke-dasharray'))
			.toBe('120 80');
		const texts = await openSection(page, 'Legend and texts');
		await texts.getByLabel('Place of the legend').selectOption({ label: 'right of the map' });
		await texts.getByLabel('Heading of the legend').fill('Inks in use');
		await texts.getByLabel('What the lines stand for').check();
		await texts.getByRole('button', { name: 'Add a text block' }).click();
		await texts.getByLabel('Text 1', { exact: true }).fill('Gulf of the journey');
		await texts.getByLabel('Type').selectOption({ label: 'serif italic, as for waters' });
		const block = page.locator('#sheet-text-blocks text');
		await expect.poll(() => block.textContent()).toBe('Gulf of the journey');
		const before = Number(await block.getAttribute('x'));
		const handle = page.getByRole('application', { name: /^Text block 1/ });
		await handle.press('Shift+ArrowRight');
		await expect.poll(async () => Number(await block.getAttribute('x'))).toBe(before + 1000);
		await dragBy(page, handle, 60, -30);
		await expect
			.poll(async () => Number(await block.getAttribute('x')))
			.toBeGreaterThan(before + 1500);
		await saved(page);
		await expectAccessible(page);
		await picture(page, 'layout-lines-legend');

		const templates = await openSection(page, 'Templates');
		await templates.getByLabel('Keep this layout as').fill(house);
		await templates.getByRole('button', { name: 'Keep as a template' }).click();
		await templates.getByRole('region', { name: `Template ${house}` }).waitFor();
		await saved(page);

		await page.goto(`${second}/layout`);
		await drawn(page);
		await openSection(page, 'Templates');
		const item = page.getByRole('region', { name: `Template ${house}` });
		await item.getByText('What it changes here').click();
		expect(await item.getByRole('listitem').allInnerTexts()).toContain(
			'place of the legend: foot, by the template right',
		);
		await item.getByRole('button', { name: /^Set this sheet by it/ }).click();
		await expect
			.poll(() => page.locator('#sheet-borders-region').getAttribute('stroke-dasharray'))
			.toBe('120 80');
		await saved(page);
		await expectAccessible(page);
		await picture(page, 'layout-template');
		const [one, two] = [await groupsOf(page, first), await groupsOf(page, second)];
		expect(two['borders-region']).toBe(one['borders-region']);
		expect(two['borders-region']).toMatch(/ 25 120 80 /);
		expect(two['text-blocks']).toBeUndefined();
		expect(one['text-blocks']).toContain('Gulf of the journey');

		// undone in one step, and done again
		await page.getByRole('button', { name: 'Undo', exact: true }).click();
		await expect
			.poll(() => page.locator('#sheet-borders-region').getAttribute('stroke-dasharray'))
			.toBeNull();
		await page.getByRole('button', { name: 'Redo', exact: true }).click();
		await saved(page);

		// the first goes its own way, is told to, and is set alike again from the second
		await page.goto(`${first}/layout`);
		await drawn(page);
		await page.getByLabel('Margin, mm').fill('20');
		await saved(page);
		await page.goto(`${second}/layout`);
		await drawn(page);
		await openSection(page, 'Templates');
		await item.getByText(/other sheet set by it, 1 not alike now/).click();
		await expect
			.poll(() => item.innerText())
			.toContain(`Layout one ${stamp}: differs in margin, mm`);
		await item.getByRole('button', { name: 'Set the ticked sheets alike' }).click();
		await page.getByText('1 sheet set alike.').waitFor();
		await expect.poll(() => item.innerText()).toContain('all alike');
	});

	it('can be read by those who may not change it, and by phone', async () => {
		const address = `${team}/sheets/1/layout`;
		await context.clearCookies();
		await signInAs(page, 'planner');
		await page.setViewportSize(phone);
		await page.goto(address);
		await openSection(page, 'Lines');
		await openSection(page, 'Templates');
		expect(await page.getByLabel('Outer boundary: drawn').isDisabled()).toBe(true);
		expect(await page.getByRole('button', { name: 'Keep as a template' }).count()).toBe(0);
		expect(await page.getByRole('button', { name: 'Add a text block' }).count()).toBe(0);
		expect(await page.getByText('Drag a name on the sheet').count()).toBe(0);
		await expectAccessible(page);
		await picture(page, 'layout-phone');
	});
});

async function dragBy(page: Page, handle: ReturnType<Page['locator']>, dx: number, dy: number) {
	const box = await handle.boundingBox();
	if (!box) throw new Error('the text block has no handle');
	const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
	await page.mouse.move(x, y);
	await page.mouse.down();
	await page.mouse.move(x + dx / 2, y + dy / 2);
	await page.mouse.move(x + dx, y + dy);
	await page.mouse.up();
}
