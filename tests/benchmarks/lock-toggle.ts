import type { Page } from 'playwright-core';
import { openPage, signInAs, startBrowser } from '../support/browser.ts';
import { drawn, enterTeam, uploadSheet } from '../support/desk.ts';
import { countiesGeoJson } from '../support/uploads.ts';

/**
 * From the press that locks a region to the changed fill on the sheet, in Debian's chromium with the colouring
 * in its web worker, on the county file. Needs a running product (`npm start` in the same folder).
 */
export async function* run(): AsyncGenerator<object> {
	const browser = await startBrowser();
	try {
		const { page } = await openPage(browser);
		page.setDefaultTimeout(30_000);
		await signInAs(page, 'cartographer');
		await enterTeam(page);
		await uploadSheet(page, countiesGeoJson(), 'Counties, bench');
		await drawn(page);
		await page.waitForTimeout(5000);
		const milliseconds: number[] = [];
		for (const spot of spots) milliseconds.push(await toggle(page, spot));
		const warm = milliseconds.slice(2).sort((a, b) => a - b);
		yield {
			name: 'lock toggle in the browser worker',
			regions: await page.locator('main svg [data-key]').count(),
			first: milliseconds[0],
			median: warm[warm.length >> 1],
			all: milliseconds,
		};
	} finally {
		await browser.close();
	}
}

/** Places on the paper, in shares of its width and height, that lie on seven different counties. */
const spots = [0.6, 0.63, 0.66, 0.69, 0.72, 0.75, 0.78].map((x) => [x, 0.58] as const);

/** Selects the region there, presses another ink than it has, and waits within the page for a fill to change. */
async function toggle(page: Page, [x, y]: readonly [number, number]): Promise<number> {
	const box = await page.locator('main svg:has([data-key])').boundingBox();
	if (!box) throw new Error('no sheet is drawn');
	// two presses in quick succession are another gesture
	await page.waitForTimeout(1000);
	await page.mouse.click(box.x + x * box.width, box.y + y * box.height);
	await page.getByRole('group', { name: /^Lock .* to an ink/ }).waitFor({ state: 'attached' });
	return page.evaluate(timeToFill);
}

function timeToFill(): Promise<number> {
	const choices = [
		...document.querySelectorAll<HTMLButtonElement>('[role=group][aria-label^="Lock "] button'),
	];
	const present = document.querySelector('aside dl rect')?.getAttribute('fill');
	const other = choices.find(
		(button) => button.querySelector('rect')?.getAttribute('fill') !== present,
	);
	const sheet = document.querySelector('main svg:has([data-key])');
	if (!other || !sheet) throw new Error('nothing to press');
	return new Promise((resolve) => {
		const seen = new MutationObserver(() => {
			seen.disconnect();
			resolve(performance.now() - started);
		});
		seen.observe(sheet, { attributes: true, attributeFilter: ['fill'], subtree: true });
		const started = performance.now();
		other.click();
	});
}
