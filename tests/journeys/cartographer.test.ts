import type { Browser, BrowserContext, Page } from 'playwright-core';
import { SaxesParser } from 'saxes';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import {
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { chooseAndSend, docket, drawn, enterTeam, team, uploadSheet } from '../support/desk.ts';
import {
	countiesGeoJson,
	countriesGeoJson,
	statesGeoJson,
	statesShapefile,
	textFile,
	twoSquares,
} from '../support/uploads.ts';

/** Element names with their attributes, read by a strict XML parser that shares nothing with the painter. */
function parseSvg(text: string) {
	const elements: { name: string; attributes: Record<string, string> }[] = [];
	const parser = new SaxesParser();
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('opentag', ({ name, attributes }) =>
		elements.push({ name, attributes: attributes as Record<string, string> }),
	);
	parser.write(text).close();
	return elements;
}

async function download(page: Page, sheet: string): Promise<string> {
	const answer = await page.request.get(`${sheet}/sheet.svg?download`);
	expect(answer.status()).toBe(200);
	expect(answer.headers()['content-disposition']).toMatch(/^attachment/);
	return answer.text();
}

describe('a cartographer', () => {
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

	/** 49 and 107: the contiguous-USA graph, Knuth TAOCP 4 fasc. 0; MathWorld "Contiguous USA Graph". */
	it('takes the 48 states and DC as GeoJSON to a proved sheet and a parsed file', async () => {
		await page.goto(`${team}/upload`);
		await expectAccessible(page);
		await picture(page, 'upload');
		const sheet = await uploadSheet(page, statesGeoJson(), 'States, journey');
		await expect.poll(() => docket(page, 'Boundaries').innerText()).toContain('49 regions');
		await expect
			.poll(() => docket(page, 'Borders').innerText())
			.toContain('107 by line, 2 by point');
		await expect.poll(() => docket(page, 'Colours').innerText()).toMatch(/4 inks,\s*proved fewest/);
		await expect
			.poll(() => page.locator('#because').innerText())
			.toMatch(/^Four inks are needed because .*ring of odd length/s);
		await page.getByRole('button', { name: 'Show the ring' }).click();
		await picture(page, 'states-ring');
		await expectAccessible(page);
		const elements = parseSvg(await download(page, sheet));
		expect(elements.filter(({ attributes }) => attributes['data-key'] !== undefined)).toHaveLength(
			49,
		);
		expect(elements.map(({ name }) => name)).not.toContain('script');
	});

	it('takes the same states as a zipped shapefile to the same neighbours', async () => {
		const sheet = await uploadSheet(page, statesShapefile(), 'States by shapefile, journey');
		await expect.poll(() => docket(page, 'Boundaries').innerText()).toContain('49 regions');
		await expect
			.poll(() => docket(page, 'Borders').innerText())
			.toContain('107 by line, 2 by point');
		await expect.poll(() => docket(page, 'Colours').innerText()).toMatch(/4 inks,\s*proved fewest/);
		const elements = parseSvg(await download(page, sheet));
		expect(elements.filter(({ attributes }) => attributes['data-key'] !== undefined)).toHaveLength(
			49,
		);
	});

	it('uploads and sees 3,142 counties and the countries of the world drawn', async () => {
		const counties = await uploadSheet(page, countiesGeoJson(), 'Counties, journey');
		expect(await page.locator('main svg [data-key]').count()).toBe(3141);
		// one of the 3,142 rows (Falls Church, 51610) has no area left in this simplified file, and is told
		await expect
			.poll(() => docket(page, 'Boundaries').innerText())
			.toMatch(/3,141 regions.*finding/s);
		await picture(page, 'counties');
		const file = parseSvg(await download(page, counties));
		expect(file.filter(({ attributes }) => attributes['data-key'] !== undefined)).toHaveLength(
			3141,
		);
		await uploadSheet(page, countriesGeoJson(), 'Countries, journey');
		/** world-atlas 110m: 177 countries, 313 pairs with a line (topojson-client neighbors) */
		await expect.poll(() => docket(page, 'Borders').innerText()).toContain('313 by line');
		await picture(page, 'countries');
	});

	it('uploads without JavaScript', async () => {
		const cookies = await context.cookies();
		const plain = await openPage(browser, { javaScript: false });
		await plain.context.addCookies(cookies);
		await plain.page.goto(page.url());
		await chooseAndSend(plain.page, twoSquares('West', 'East'), 'Squares without script');
		await expect
			.poll(
				async () => {
					await plain.page.reload();
					return plain.page.locator('body').innerText();
				},
				{ timeout: 60_000, interval: 1000 },
			)
			.toContain('The sheet is ready');
		await plain.context.close();
	});

	it.each([
		[
			'cut off',
			textFile('cut.geojson', '{"type":"FeatureCollection","features":[{"type":"Fea'),
			/ends|cut/i,
		],
		['not a map', textFile('list.geojson', '[1,2,3]'), /GeoJSON/i],
		['no zip', textFile('regions.zip', 'PK not really'), /zip/i],
	])('is told what is wrong with a file that is %s, and where', async (_what, file, says) => {
		await chooseAndSend(page, file, 'Refused, journey');
		await page.waitForURL(/\/intakes\//);
		await page.getByRole('heading', { name: 'The file was refused' }).waitFor({ timeout: 60_000 });
		await expect.poll(() => page.getByRole('main').innerText()).toMatch(says);
		expect(page.url()).not.toMatch(/sheets\/\d/);
		await picture(page, `refused-${file.name}`);
		await expectAccessible(page);
	});

	it('is told at once that a file is empty', async () => {
		await chooseAndSend(page, textFile('nothing.geojson', ''), 'Refused, journey');
		await page
			.getByRole('main')
			.getByText(/the file is empty/i)
			.waitFor();
		await picture(page, 'refused-empty');
		await expectAccessible(page);
		complaints = complaints.filter((told) => !told.includes('422'));
	});

	it('meets a hostile name as text only', async () => {
		const hostile = `<script>document.title='owned'</script><img src=x onerror="document.title='owned'">`;
		const sheet = await uploadSheet(page, twoSquares(hostile, 'East'), hostile);
		expect(await page.title()).not.toBe('owned');
		expect(
			await page.locator('main svg script, main svg image, main svg foreignObject').count(),
		).toBe(0);
		const elements = parseSvg(await download(page, sheet));
		expect(elements.map(({ name }) => name)).not.toContain('script');
		expect(elements.map(({ name }) => name)).not.toContain('img');
	});

	it('walks the sheet by keyboard alone', async () => {
		await page.goto(`${team}/sheets`);
		await page.getByRole('link', { name: 'States, journey' }).first().click();
		await drawn(page);
		await page.locator('main svg[tabindex="0"], main svg [tabindex="0"]').first().focus();
		const heard = new Set<string>();
		for (const arrow of ['ArrowRight', 'ArrowLeft', 'ArrowDown', 'ArrowUp', 'ArrowLeft']) {
			await page.keyboard.press(arrow);
			heard.add(await page.locator('main p[aria-live]').innerText());
		}
		// some arrow may find no neighbour that way, so not every press moves
		expect(heard.size).toBeGreaterThanOrEqual(3);
		expect([...heard].at(-1)).toMatch(/neighbours?: /);
		await page.keyboard.press('Enter');
		await page
			.getByRole('complementary')
			.getByRole('heading', { name: /neighbours?$/ })
			.waitFor();
		await page.keyboard.press('Escape');
		await expect
			.poll(async () => (await page.locator('main p[aria-live]').allInnerTexts()).join())
			.toContain('Nothing selected');
	});

	it('finds a region under every press on the map, on border lines as well', async () => {
		await page.goto(`${team}/sheets`);
		await page.getByRole('link', { name: 'Counties, journey' }).first().click();
		await drawn(page);
		const under = await page.locator('main svg:has([data-key])').evaluate((sheet) => {
			const box = sheet.getBoundingClientRect();
			const found = [];
			for (let x = 0.6; x < 0.78; x += 0.01)
				found.push(
					document
						.elementFromPoint(box.left + x * box.width, box.top + 0.58 * box.height)
						?.hasAttribute('data-key') ?? false,
				);
			return found;
		});
		expect(under).not.toContain(false);
	});

	it('reads the sheet on a phone', async () => {
		await page.setViewportSize(phone);
		await page.goto(`${team}/sheets`);
		await page.getByRole('link', { name: 'States, journey' }).first().click();
		await drawn(page);
		const wide = await page.evaluate('document.documentElement.scrollWidth');
		expect(wide).toBeLessThanOrEqual(phone.width);
		await picture(page, 'phone-sheet');
		await expectAccessible(page);
	});
});
