import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { usAtlas } from '../support/atlas.ts';
import { expectAccessible, openPage, picture, signInAs, startBrowser } from '../support/browser.ts';
import { enterTeam, saved, uploadSheet } from '../support/desk.ts';
import { textFile } from '../support/uploads.ts';

/** Drawing anew takes a moment on a busy machine. */
const soon = { timeout: 30_000 };
const territories = ['60', '66', '69', '72', '78'];

function fiftyStates() {
	const states = usAtlas('states');
	const features = states.features.filter(({ id }) => !territories.includes(String(id)));
	return textFile('states.geojson', JSON.stringify({ ...states, features }));
}

describe('a cartographer laying out the map', () => {
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

	const onSheet = (layer: string) => page.locator(`main svg [id$="${layer}"]`);
	const sheetText = () => page.locator('main svg:has([data-key])').first().textContent();

	it('chooses projection, parallels, scale, insets and graticule, and is refused a north arrow', async () => {
		const sheet = await uploadSheet(page, fiftyStates(), 'Fifty states, journey');
		await page.goto(`${sheet}/layout`);
		const form = page.locator('form[action$="layout?/save"]');
		await form.getByText('Chosen because').waitFor();
		await expectAccessible(page);

		await form.getByLabel('Set parts far off into boxes').check();
		await expect.poll(() => form.getByText(/inset 1 : /).count(), soon).toBe(2);
		await expect.poll(sheetText, soon).toContain('Hawaii');
		await form.getByLabel('Graticule').check();
		await expect.poll(sheetText, soon).toContain('100° W');
		await form.getByLabel('Line round the map').check();
		await form.getByLabel('Tint around the regions').check();

		await form.getByLabel('North arrow').check();
		await form.getByText(/north turns up to \d+° away from straight up/).waitFor();
		await form.getByLabel('North arrow').uncheck();

		await form.getByLabel('Projection', { exact: true }).selectOption('albers');
		await form.getByLabel('Southern parallel, °').fill('29.5');
		await form.getByLabel('Northern parallel, °').fill('45.5');
		await expect.poll(sheetText, soon).toContain('parallels 29.5° N and 45.5° N');
		await form.getByLabel('Southern parallel, °').fill('-45.5');
		await form.getByText(/alike on both sides of the equator/).waitFor();
		await form.getByLabel('Southern parallel, °').fill('29.5');

		await form.getByLabel('Scale, 1 :').first().fill('1000000');
		await form.getByText(/the map does not fit its place: [\d,]+ mm too wide/).waitFor();
		await form.getByText('No paper up to A0 would take it.').waitFor();
		await form.getByLabel('Scale, 1 :').first().fill('40000000');
		await form.getByText(/does not fit its place/).waitFor({ state: 'detached' });
		await expect
			.poll(() => page.getByText('About 1 : 40,000,000 at the centre').count(), soon)
			.toBeGreaterThan(0);

		await form.getByLabel('Projection', { exact: true }).selectOption('mercator');
		await form.getByText('Areas are not true on it').waitFor();
		await form.getByLabel('Projection', { exact: true }).selectOption('auto');
		await form.getByText('Chosen because').waitFor();
		await picture(page, 'layout-frame');
		await expectAccessible(page);

		await saved(page);
		await page.reload();
		await expect.poll(() => form.getByLabel('Graticule').isChecked(), soon).toBe(true);
		await expect.poll(() => form.getByLabel('Scale, 1 :').first().inputValue()).toBe('40000000');
		await expect.poll(() => onSheet('inset-frames').count(), soon).toBeGreaterThan(0);
	});
});
