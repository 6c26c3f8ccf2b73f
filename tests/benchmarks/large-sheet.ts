import { readFileSync } from 'node:fs';
import type { Browser, Page } from 'playwright-core';
import { openPage, signInAs, startBrowser } from '../support/browser.ts';
import { painted, uploadLand } from '../support/large-sheet.ts';

const land = { regions: 33_000, inner: 95, seed: 1 };

/**
 * A sheet of 33,000 regions and 12.7 million coordinates opened in Debian's chromium without a graphics
 * card: from the address to words, to the coarse picture in the sheet's own inks and to the painted sheet, frames while it is moved, memory. Needs a
 * running product (`npm start` in the same folder). `MERESTONE_SHEET` names a sheet that is there already.
 */
export async function* run(): AsyncGenerator<object> {
	const address = process.env.MERESTONE_SHEET ?? (await uploadLand(land, 'Large, bench', 600));
	const browser = await startBrowser();
	try {
		const { page } = await openPage(browser);
		page.setDefaultTimeout(120_000);
		await signInAs(page, 'cartographer');
		const fetched: [string, number][] = [];
		page.on('response', (response) => {
			const { pathname, search } = new URL(response.url());
			if (!pathname.startsWith(address)) return;
			fetched.push([pathname + search, Number(response.headers()['content-length'] ?? 0)]);
		});
		for (const visit of ['first', 'again'])
			yield { visit, ...(await opened(page, address)), bytes: fetched.splice(0) };
		yield { name: 'moved at the fitted size', ...(await moved(page)) };
		yield { name: 'zoomed in', ...(await zoomed(page)) };
		yield { name: 'moved while zoomed in', ...(await moved(page)) };
		yield { name: 'memory', ...(await memory(browser, page)) };
	} finally {
		await browser.close();
	}
}

/** From the list of sheets, as one comes to a sheet: another page's work left behind would be counted. */
async function opened(page: Page, address: string) {
	await page.goto(address.split('/sheets/')[0]);
	await page.waitForLoadState('networkidle');
	const start = performance.now();
	const since = () => Math.round(performance.now() - start);
	await page.goto(`${address}/colours`, { waitUntil: 'commit' });
	const answered = since();
	const told = page.getByText(/(Loading|Drawing) [\d,]+ regions/);
	await told.or(page.locator('main canvas')).first().waitFor();
	const words = since();
	await page.locator('main canvas[data-first-picture]').waitFor();
	const first = since();
	await page.locator('main canvas:not([data-first-picture])').waitFor();
	const canvas = since();
	await painted(page, 120_000);
	return { name: 'opened', milliseconds: { answered, words, first, canvas, painted: since() } };
}

/** Drags the sheet to and fro for two seconds, and how long each frame took meanwhile. */
async function moved(page: Page) {
	const box = await page.locator('main canvas').boundingBox();
	if (!box) throw new Error('nothing is painted');
	const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
	const frames = page.evaluate(framesFor, 2_000);
	await page.mouse.move(x, y);
	await page.mouse.down();
	for (let i = 0; i < 80; i++) {
		await page.mouse.move(x + 120 * Math.sin(i / 8), y + 80 * Math.cos(i / 8));
		await page.waitForTimeout(12);
	}
	await page.mouse.up();
	const sorted = (await frames).sort((a, b) => a - b);
	const at = (share: number) =>
		Math.round(10 * sorted[Math.floor(share * (sorted.length - 1))]) / 10;
	return { frames: sorted.length, median: at(0.5), ninety: at(0.9), longest: at(1) };
}

async function framesFor(milliseconds: number): Promise<number[]> {
	const lengths: number[] = [];
	const start = performance.now();
	for (let last = start; last - start < milliseconds;) {
		const now = await new Promise<number>(requestAnimationFrame);
		lengths.push(now - last);
		last = now;
	}
	return lengths.slice(1);
}

/** Eight turns of the wheel, then until the new tiles and the finer lines are there. */
async function zoomed(page: Page) {
	const start = performance.now();
	const finer = page
		.waitForResponse((response) => response.url().includes('level=2'), { timeout: 30_000 })
		.then(
			() => Math.round(performance.now() - start),
			() => 'there is none',
		);
	for (let turn = 0; turn < 8; turn++) await page.mouse.wheel(0, -250);
	await page.waitForTimeout(200);
	await painted(page);
	const sharp = Math.round(performance.now() - start);
	const answered = await finer;
	await page.waitForTimeout(3_000);
	await painted(page);
	return { milliseconds: { sharp, finer: answered } };
}

/** Resident memory of the page's own process, and the heap of its main thread. */
async function memory(browser: Browser, page: Page) {
	const session = await browser.newBrowserCDPSession();
	const { processInfo } = await session.send('SystemInfo.getProcessInfo');
	const resident = processInfo
		.filter(({ type }) => type === 'renderer')
		.map(({ id }) =>
			Number(/VmRSS:\s+(\d+)/.exec(readFileSync(`/proc/${id}/status`, 'utf8'))?.[1]),
		);
	const heap = await page.evaluate(
		() => (performance as unknown as { memory: { usedJSHeapSize: number } }).memory.usedJSHeapSize,
	);
	return {
		rendererMegabytes: Math.round(Math.max(...resident) / 1024),
		mainHeapMegabytes: Math.round(heap / 2 ** 20),
	};
}
