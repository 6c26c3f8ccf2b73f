import { readFileSync } from 'node:fs';
import { PNG } from 'pngjs';
import type { Browser, Locator, Page } from 'playwright-core';
import readExcel from 'read-excel-file/node';
import { SaxesParser } from 'saxes';
import { feature } from 'topojson-client';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { exportKinds } from '../../src/lib/engines/exports/index.ts';
import {
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { drawn, enterTeam, uploadSheet } from '../support/desk.ts';
import { statesGeoJson } from '../support/uploads.ts';

/** Regions of the sheet: states and what else the file holds. */
let regions = 0;
const patience = { timeout: 120_000 };

/** A page that waits for jobs on a machine that has other work. */
async function patient(browser: Browser) {
	const opened = await openPage(browser);
	opened.page.setDefaultTimeout(180_000);
	return opened;
}

/** Takes one kind by a press and answers what came. */
async function take(page: Page, within: Locator, words: string): Promise<[string, Buffer]> {
	const kind = within.getByRole('group', { name: words, exact: true });
	const button = kind.getByRole('button', { name: `Take ${words}`, exact: true });
	const coming = page.waitForEvent('download', patience);
	if (await button.isVisible()) await button.click();
	else await kind.getByRole('link').first().click(patience);
	const download = await coming;
	return [download.suggestedFilename(), readFileSync(await download.path())];
}

/** Element names of an XML file, read strictly. */
function elementsOf(text: string): string[] {
	const names: string[] = [];
	const parser = new SaxesParser();
	parser.on('error', (problem) => {
		throw problem;
	});
	parser.on('opentag', ({ name }) => names.push(name));
	parser.write(text).close();
	return names;
}

describe('a designer takes files', () => {
	let browser: Browser;
	let page: Page;
	let complaints: string[];
	let sheet: string;

	beforeAll(async () => {
		browser = await startBrowser();
		const maker = await patient(browser);
		await signInAs(maker.page, 'cartographer');
		await enterTeam(maker.page);
		sheet = await uploadSheet(maker.page, statesGeoJson(), 'States to hand out, journey');
		regions = await maker.page.locator('main svg [data-key]').count();
		await maker.context.close();
		const approver = await patient(browser);
		await signInAs(approver.page, 'approver');
		await approver.page.goto(`${sheet}/editions`);
		await drawn(approver.page);
		await approver.page.getByRole('button', { name: 'Issue edition 1' }).click();
		await approver.page.getByText('Edition 1 is issued').waitFor();
		await approver.context.close();
		({ page, complaints } = await patient(browser));
		await signInAs(page, 'designer');
		await page.goto(`${sheet}/editions`);
		await drawn(page);
	}, 600_000);
	afterAll(() => browser.close());

	const edition = () => page.getByRole('article', { name: 'Edition 1' });
	const draft = () => page.locator('#draft-files');

	it('of every kind, each of which another program opens', { timeout: 600_000 }, async () => {
		const came = new Map<string, Buffer>();
		for (const { id, words, extension } of exportKinds) {
			const [name, bytes] = await take(page, edition(), words);
			expect(name).toBe(`states-to-hand-out-journey-edition-1.${extension}`);
			came.set(id, bytes);
		}
		const text = (id: string) => String(came.get(id));
		expect(text('pdf').slice(0, 5)).toBe('%PDF-');
		expect(elementsOf(text('svg')).filter((name) => name === 'path').length).toBeGreaterThan(
			regions,
		);
		// gzip, RFC 1952
		expect([...came.get('svgz')!.subarray(0, 2)]).toEqual([0x1f, 0x8b]);
		const { width, height } = PNG.sync.read(came.get('png')!);
		// A4 across, 297 by 210 mm, at 300 pixels an inch
		expect([width, height]).toEqual([3508, 2480]);
		expect(JSON.parse(text('geojson')).features).toHaveLength(regions);
		const topology = JSON.parse(text('topojson'));
		const [objects] = Object.values(topology.objects);
		const read = feature(topology, objects as never) as unknown as { features: unknown[] };
		expect(read.features).toHaveLength(regions);
		expect(text('csv').trim().split('\r\n')).toHaveLength(regions + 1);
		const [rows] = await readExcel(came.get('xlsx')!);
		expect(rows.data.length).toBeGreaterThan(regions);
		expect(elementsOf(text('sld'))[0]).toMatch(/StyledLayerDescriptor$/);
		expect(Object.keys(JSON.parse(text('tokens'))).length).toBeGreaterThan(0);
		expect(text('css')).toMatch(/--[\w-]+:\s*#[0-9a-f]{6}/);
		// PK, the local header of a zip (APPNOTE 4.3.7)
		expect(text('zip').slice(0, 2)).toBe('PK');
	});

	it('otherwise than usual, which the file is told by', { timeout: 240_000 }, async () => {
		const kind = edition().getByRole('group', { name: 'PNG', exact: true });
		await kind.getByText('Otherwise than usual').click();
		await kind.getByLabel('Pixels an inch').fill('96');
		await kind.getByLabel('Reader').selectOption('deutan');
		const coming = page.waitForEvent('download', patience);
		await kind.getByRole('button', { name: 'Take it so' }).click();
		const download = await coming;
		expect(download.suggestedFilename()).toMatch(/-edition-1-deutan\.png$/);
		const { width } = PNG.sync.read(readFileSync(await download.path()));
		expect(width).toBe(1123);
		await kind.getByText('96 pixels an inch, as a deutan reader sees it').waitFor();
	});

	it('of the draft, which say that they are of one', { timeout: 240_000 }, async () => {
		await draft()
			.getByText(/^Files of draft/)
			.click();
		const [name, bytes] = await take(page, draft(), 'SVG');
		expect(name).toMatch(/-draft-\d+\.svg$/);
		expect(String(bytes)).toMatch(/DRAFT \d+, not issued/);
		await draft()
			.getByText(/Kept until/)
			.first()
			.waitFor();
		await expectAccessible(page);
		await picture(page, 'files-of-an-edition');
		expect(complaints).toEqual([]);
	});

	it('also on a phone', async () => {
		await page.setViewportSize(phone);
		await page.goto(`${sheet}/editions`);
		await edition()
			.getByRole('link', { name: /edition-1\.pdf$/ })
			.waitFor();
		const wide = await page.evaluate(() => document.documentElement.scrollWidth);
		expect(wide).toBeLessThanOrEqual(phone.width);
		await expectAccessible(page);
	});
});
