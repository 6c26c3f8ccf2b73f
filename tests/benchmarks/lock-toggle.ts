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
		page.setDefaultTimeout(120_000);
		await signInAs(page, 'cartographer');
		await enterTeam(page);
		await uploadSheet(page, countiesGeoJson(), 'Counties, bench');
		await drawn(page);
		await page.waitForTimeout(5000);
		const keys = ['17031', '48201', '06037', '36061', '53033', '12086', '39035'];
		const milliseconds: number[] = [];
		for (const key of keys) milliseconds.push(await toggle(page, key));
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

/** Selects the region, presses another ink than it has, and waits within the page for its fill to change. */
async function toggle(page: Page, key: string): Promise<number> {
	const region = page.locator(`main svg [data-key="${key}"]`);
	await region.dispatchEvent('click');
	await region.focus();
	await page.keyboard.press('Enter');
	const inks = page.getByRole('group', { name: /^Lock .* to an ink/ }).getByRole('button');
	await inks.first().waitFor();
	return page.evaluate(timeToFill, key);
}

function timeToFill(key: string): Promise<number> {
	const region = document.querySelector(`main svg [data-key="${key}"]`) as SVGElement;
	const fill = region.getAttribute('fill');
	const choices = [
		...document.querySelectorAll<HTMLButtonElement>('[role=group][aria-label^="Lock "] button'),
	];
	return new Promise((resolve) => {
		const seen = new MutationObserver(() => {
			if (region.getAttribute('fill') === fill) return;
			seen.disconnect();
			resolve(performance.now() - started);
		});
		seen.observe(region, { attributes: true, attributeFilter: ['fill'] });
		const swatch = (button: Element) => button.querySelector('rect')?.getAttribute('fill');
		const other = choices.find((button) => swatch(button) !== fill) ?? choices[0];
		const started = performance.now();
		other.click();
	});
}
