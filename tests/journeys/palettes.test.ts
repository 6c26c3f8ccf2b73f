import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import {
	desk,
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { docket, drawn, enterTeam, fills, saved, team, uploadSheet } from '../support/desk.ts';
import { statesGeoJson } from '../support/uploads.ts';

/** Red and brown look alike to protan readers; every other pair can be told apart by everybody. */
const hexes = ['#e41a1c', '#a65628', '#8dd7fd', '#e7eddf', '#e6b751', '#5e3c99'];
const names = ['Poppy', 'Leather', 'Ice', 'Chalk', 'Straw', 'Iris'];
const srgb = (hex: string) => ({
	colorSpace: 'srgb',
	components: [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16) / 255),
});
const brandFile = {
	name: 'harbour-brand.tokens.json',
	mimeType: 'application/json',
	buffer: Buffer.from(
		JSON.stringify({
			brand: {
				$type: 'color',
				...Object.fromEntries(names.map((name, i) => [name, { $value: srgb(hexes[i]) }])),
				space: { $type: 'dimension', $value: { value: 4, unit: 'px' } },
			},
			alert: { $value: '{brand.Poppy}' },
		}),
	),
};

describe('a brand palette is brought in, mended, approved, and its unsafe inks are kept apart', () => {
	let browser: Browser;
	let page: Page;
	let context: BrowserContext;
	let complaints: string[];
	let sheet: string;
	const brand = `Harbour ${Date.now()}`;

	beforeAll(async () => {
		browser = await startBrowser();
		const maker = await openPage(browser);
		maker.page.setDefaultTimeout(60_000);
		await signInAs(maker.page, 'cartographer');
		await enterTeam(maker.page);
		sheet = await uploadSheet(maker.page, statesGeoJson(), 'States in brand inks, journey');
		await maker.context.close();
	}, 300_000);
	afterAll(() => browser.close());
	afterEach(async () => {
		await context.close();
		expect(complaints).toEqual([]);
	});
	const open = async (role: string, viewport = desk) => {
		({ page, context, complaints } = await openPage(browser, { viewport }));
		page.setDefaultTimeout(60_000);
		await signInAs(page, role);
	};
	const verdict = () => page.locator('#verdict').innerText();

	describe('an analyst', () => {
		beforeEach(() => open('analyst'));

		it('brings it in from a Design Tokens file and fixes one of its inks', async () => {
			await page.goto(`${team}/palettes`);
			await page.getByRole('link', { name: 'Bring a Design Tokens file' }).click();
			await page.locator('input[type=file]').setInputFiles(brandFile);
			await page.getByRole('button', { name: 'Read the file' }).click();
			const read = page.getByRole('status').filter({ hasText: '6 inks' });
			await read.waitFor();
			await expect.poll(() => read.innerText()).toContain('1 token of type dimension is no colour');
			await expect.poll(() => read.innerText()).toContain('taken once');
			await expect.poll(() => page.getByLabel('Name of ink 1').inputValue()).toBe('Poppy');
			await page.getByLabel('Is ink 1 fixed').selectOption('yes');
			await page.getByLabel('Name', { exact: true }).fill(brand);
			await picture(page, 'palette-from-file');
			await expectAccessible(page);
			await page.getByRole('button', { name: 'Add the palette' }).click();
			const row = page.getByRole('article', { name: brand });
			await row.waitFor();
			await expect.poll(() => row.innerText()).toContain('Poppy and Leather look alike to');
			await expect.poll(() => row.innerText()).toContain('Not approved.');
			await expectAccessible(page);
		});

		it('finds it failing on a sheet, keeps the pair from touching by another colouring, and undoes it', async () => {
			await page.goto(`${sheet}/palette`);
			await drawn(page);
			await page
				.getByRole('combobox', { name: 'Palette', exact: true })
				.selectOption({ label: `${brand}, 6 inks` });
			await expect.poll(verdict).toContain('Poppy and Leather look alike to');
			await saved(page);
			const before = await fills(page);
			await page.getByRole('button', { name: 'Recolour the sheet' }).click();
			const trying = page.getByRole('group', { name: /^Trying: keep Poppy and Leather/ });
			await trying.waitFor();
			expect(await fills(page)).not.toEqual(before);
			await expect.poll(verdict).toContain('Every reader can tell');
			await picture(page, 'palette-parted');
			await expectAccessible(page);
			await trying.getByRole('button', { name: 'Keep' }).click();
			await saved(page);
			const parted = await fills(page);
			await page.reload();
			await drawn(page);
			expect(await fills(page)).toEqual(parted);
			await expect
				.poll(() => docket(page, 'Palette').innerText())
				.toContain('Every reader can tell');
		});

		it('mends it with the fixed ink as it is, and keeps it over the brand’s', async () => {
			await page.goto(`${sheet}/colours`);
			await drawn(page);
			await page.getByLabel('Inks to use').selectOption('fewest');
			await saved(page);
			await page.goto(`${sheet}/palette`);
			await drawn(page);
			await expect.poll(verdict).toContain('Poppy and Leather look alike to');
			await page.getByRole('button', { name: 'Propose mends' }).click();
			const fewest = page.getByRole('button', { name: /Fewest inks moved/ });
			await fewest.waitFor({ timeout: 120_000 });
			await expect
				.poll(() => page.getByRole('button', { name: 'Stop' }).count(), { timeout: 180_000 })
				.toBe(0);
			await picture(page, 'palette-mends');
			await expectAccessible(page);
			await fewest.click();
			const trying = page.getByRole('group', { name: 'Trying: mend the inks' });
			await trying.waitFor();
			await expect.poll(verdict).toContain('Every reader can tell');
			await trying.getByRole('button', { name: 'Keep' }).click();
			await saved(page);
			await expect.poll(() => page.getByLabel('Value of ink 1').inputValue()).toBe('#e41a1c');
			expect(await page.getByLabel('Value of ink 2').inputValue()).not.toBe('#a65628');

			await page.getByLabel('Where', { exact: true }).selectOption({ label: `over ${brand}` });
			await page.getByRole('button', { name: 'Keep the palette' }).click();
			await page.getByText(`Kept as ${brand}`).waitFor();
		});

		it('gives an ink a hatch, moves it, and is told why an ink in use stays', async () => {
			await page.goto(`${sheet}/palette`);
			await drawn(page);
			await page.getByText('No hatch: more about ink 5').click();
			await page.getByLabel('Hatch of ink 5', { exact: true }).selectOption('crossed');
			await page.getByLabel('Spacing, mm, hatch of ink 5').fill('3');
			await page.getByLabel('Spacing, mm, hatch of ink 5').press('Tab');
			await saved(page);
			await page.reload();
			await drawn(page);
			await page.getByText('Crossed lines: more about ink 5').click();
			await expect
				.poll(() => page.getByLabel('Spacing, mm, hatch of ink 5').inputValue())
				.toBe('3');
			await expectAccessible(page);
			await page.getByText('No hatch, fixed: more about ink 1').click();
			await page.getByRole('button', { name: 'Remove ink 1' }).click();
			await page.getByText(/^Poppy is in use by \d+ regions of the sheet/).waitFor();
			const before = await fills(page);
			await page.getByRole('button', { name: 'Down with ink 1' }).click();
			await expect.poll(() => page.getByLabel('Name of ink 2').inputValue()).toBe('Poppy');
			await saved(page);
			expect(await fills(page)).toEqual(before);
		});
	});

	describe('an approver', () => {
		it('approves it as it stands, and the sheet says so until its inks change', async () => {
			await open('approver');
			await page.goto(`${team}/palettes`);
			await page.getByRole('button', { name: `Approve as it stands ${brand}` }).click();
			await page.getByText('The palette is approved as it stands.').waitFor();
			const row = page.getByRole('article', { name: brand });
			await expect.poll(() => row.innerText()).toMatch(/Approved by .+ on \d+ \w+ \d{4}/);
			await expectAccessible(page);
			await page.goto(`${sheet}/palette`);
			await drawn(page);
			await page.getByText(/Changed since: the inks are not those of/).waitFor();
			await context.close();

			await open('analyst');
			await page.goto(`${sheet}/palette`);
			await drawn(page);
			await page
				.getByRole('combobox', { name: 'Palette', exact: true })
				.selectOption({ label: `${brand}, 6 inks` });
			await page.getByText(/The inks are as approved by .+ on \d+ \w+ \d{4}/).waitFor();
			await picture(page, 'palette-approved');
			await saved(page);
		});
	});

	it('all of it reads well on a phone', async () => {
		await open('analyst', phone);
		await page.goto(`${team}/palettes`);
		await page.getByRole('article', { name: brand }).waitFor();
		await page.getByRole('article', { name: brand }).scrollIntoViewIfNeeded();
		await picture(page, 'palettes-phone');
		await expectAccessible(page);
		const wide = () => page.evaluate('document.documentElement.scrollWidth - innerWidth');
		expect(await wide()).toBeLessThanOrEqual(0);
		await page.getByRole('link', { name: `Edit ${brand}` }).click();
		await page.getByRole('button', { name: 'Save the palette' }).waitFor();
		await picture(page, 'palette-edit-phone');
		await expectAccessible(page);
		expect(await wide()).toBeLessThanOrEqual(0);
		await page.goto(`${sheet}/palette`);
		await drawn(page);
		await page.locator('#verdict').scrollIntoViewIfNeeded();
		await picture(page, 'palette-stage-phone');
		await expectAccessible(page);
		expect(await wide()).toBeLessThanOrEqual(0);
	});
});
