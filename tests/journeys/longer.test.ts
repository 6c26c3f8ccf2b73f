import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
	expectAccessible,
	openPage,
	phone,
	picture,
	signInAs,
	startBrowser,
} from '../support/browser.ts';
import { drawn, enterTeam, uploadSheet } from '../support/desk.ts';
import { cycle, mycielski } from '../support/named-graphs.ts';
import type { ChosenFile } from '../support/uploads.ts';

/** A row of square fields, keyed by number. */
function rowOfFields(count: number): ChosenFile {
	const features = Array.from({ length: count }, (_, x) => ({
		...{ type: 'Feature', id: `f${x}`, properties: { name: `Field ${x + 1}` } },
		geometry: {
			type: 'Polygon',
			coordinates: [
				[
					[x, 0],
					[x + 1, 0],
					[x + 1, 1],
					[x, 1],
					[x, 0],
				].map(([lon, lat]) => [lon / 100, lat / 100]),
			],
		},
	}));
	const text = JSON.stringify({ type: 'FeatureCollection', features });
	const mimeType = 'application/geo+json';
	return { name: 'fields.geojson', mimeType, buffer: Buffer.from(text) };
}

/**
 * Joins the fields by hand as the graph of Mycielski (1955) that needs six inks, whose proof takes longer
 * than a first try may; what lines there are do not count.
 */
async function joinFields(page: Page, sheet: string): Promise<void> {
	const { borders } = mycielski(mycielski(mycielski(cycle(5))));
	const { revision, document } = await page.request
		.get(`${sheet}/drafts/1`)
		.then((answer) => answer.json());
	const added = borders.a.map((a, i) => {
		const [one, other] = [`f${a}`, `f${borders.b[i]}`].sort();
		return { a: one, b: other, reason: 'joined for the journey' };
	});
	const answer = await page.request.post(`${sheet}/draft`, {
		data: { revision, document: { ...document, leastMetres: 100_000, added } },
		headers: { origin: new URL(page.url()).origin },
		timeout: 240_000,
	});
	expect([answer.status(), await answer.text()]).toEqual([200, expect.any(String)]);
}

describe('a sheet of which it is not known how few inks do', () => {
	let browser: Browser;
	beforeAll(async () => void (browser = await startBrowser()));
	afterAll(() => browser.close());

	it('says so, is tried longer in the background, and can be stopped', async () => {
		const { page, context, complaints } = await openPage(browser);
		await signInAs(page, 'cartographer');
		await enterTeam(page);
		const sheet = await uploadSheet(page, rowOfFields(47), 'Fields, hard to colour');
		await joinFields(page, sheet);
		await page.goto(`${sheet}/colours`);
		await drawn(page);
		const open = page.locator('#longer');
		await open.waitFor();
		await expect.poll(() => open.innerText()).toMatch(/not (known|proved)/);
		await picture(page, 'longer-open');
		await expectAccessible(page);
		await open.getByRole('button', { name: 'Try longer' }).click();
		const progress = open.getByRole('progressbar').first();
		await progress.waitFor();
		await expect.poll(() => open.innerText(), { timeout: 60_000 }).toMatch(/At least \d inks/);
		await picture(page, 'longer-at-work');
		await expectAccessible(page);

		const small = await openPage(browser, { viewport: phone });
		await signInAs(small.page, 'designer');
		await small.page.goto(`${sheet}/colours`);
		await small.page.locator('#longer').getByRole('progressbar').first().waitFor();
		expect(await small.page.locator('#longer').getByRole('button').count()).toBe(0);
		await small.page.locator('#longer').scrollIntoViewIfNeeded();
		await picture(small.page, 'longer-phone');
		await small.context.close();

		await open.getByRole('button', { name: 'Stop' }).click();
		await page.getByRole('heading', { name: 'Last longer try: Stopped' }).waitFor();
		await picture(page, 'longer-stopped');
		await expectAccessible(page);
		expect(complaints).toEqual([]);
		await context.close();
	});
});
