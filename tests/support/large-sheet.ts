import assert from 'node:assert/strict';
import { setTimeout as pause } from 'node:timers/promises';
import type { Page } from 'playwright-core';
import { demo } from './browser.ts';
import { team } from './desk.ts';
import { fractalText, type FractalLand } from './fractal-land.ts';

/** Uploads a made-up land through the API and waits until it is a sheet. Answers the sheet's address. */
export async function uploadLand(
	land: FractalLand,
	name: string,
	seconds: number,
): Promise<string> {
	const { url, token } = demo();
	const headers = { authorization: `Bearer ${token}` };
	const form = new FormData();
	form.set('sheetName', name);
	form.set('file', new Blob([...fractalText(land)]), 'land.geojson');
	const sent = await fetch(`${url}/api/v1/sheets`, { method: 'POST', headers, body: form });
	assert.equal(sent.status, 202, await sent.clone().text());
	const { id } = await sent.json();
	for (let waited = 0; waited < seconds; waited++) {
		const answer = await fetch(`${url}/api/v1/intakes/${id}`, { headers });
		const { state, sheet, refusal } = await answer.json();
		if (state === 'done') return `${team}/sheets/${sheet}`;
		assert.ok(['waiting', 'reading'].includes(state), `${state}: ${JSON.stringify(refusal)}`);
		await pause(1000);
	}
	throw new Error(`the land was not read within ${seconds} s`);
}

/** Waits until everything in sight is painted as it should be. */
export const painted = (page: Page, timeout = 60_000): Promise<void> =>
	page.locator('main canvas[aria-busy="false"]').waitFor({ timeout });

/** Colour of the canvas at a place of the page, as #rrggbb. */
export const colourAt = (page: Page, x: number, y: number): Promise<string> =>
	page.locator('main canvas').evaluate(
		(element, [px, py]) => {
			const canvas = element as HTMLCanvasElement;
			const { left, top, width } = canvas.getBoundingClientRect();
			const dense = canvas.width / width;
			const pen = canvas.getContext('2d');
			if (!pen) throw new Error('no canvas');
			const [at, down] = [(px - left) * dense, (py - top) * dense].map(Math.round);
			const [red, green, blue] = pen.getImageData(at, down, 1, 1).data;
			return `#${[red, green, blue].map((one) => one.toString(16).padStart(2, '0')).join('')}`;
		},
		[x, y],
	);
