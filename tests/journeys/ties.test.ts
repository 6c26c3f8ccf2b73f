import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Browser } from 'playwright-core';
import { neighbors } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, openPage, picture, signInAs, startBrowser } from '../support/browser.ts';
import { docket, drawn, enterTeam, fills, saved, uploadSheet } from '../support/desk.ts';
import { statesGeoJson, type ChosenFile } from '../support/uploads.ts';

/** Codes of the states west of the Mississippi, where the land is cut in two sheets. */
const western = new Set(
	'04 05 06 08 16 19 20 22 27 29 30 31 32 35 38 40 41 46 48 49 53 56'.split(' '),
);

function half(west: boolean): ChosenFile {
	const file = statesGeoJson();
	const land = JSON.parse(file.buffer.toString()) as { features: { id: string }[] };
	const features = land.features.filter(({ id }) => western.has(id) === west);
	const buffer = Buffer.from(JSON.stringify({ ...land, features }));
	return { ...file, name: west ? 'west.geojson' : 'east.geojson', buffer };
}

/** Pairs of states across the cut, by topojson-client 3 on us-atlas 3.0.1. */
function acrossTheCut(): [string, string][] {
	const path = createRequire(import.meta.url).resolve('us-atlas/states-10m.json');
	const topology = JSON.parse(readFileSync(path, 'utf8')) as Topology;
	const { geometries } = topology.objects.states as GeometryCollection;
	const ids = geometries.map(({ id }) => String(id));
	return neighbors(geometries).flatMap((row, a) =>
		row
			.filter((b) => western.has(ids[a]) && !western.has(ids[b]))
			.map((b): [string, string] => [ids[a], ids[b]]),
	);
}

describe('two sheets of one land', () => {
	let browser: Browser;
	beforeAll(async () => void (browser = await startBrowser()));
	afterAll(() => browser.close());

	it('are tied along their edge, so that no two neighbours across it look alike', async () => {
		const { page, context, complaints } = await openPage(browser);
		await signInAs(page, 'cartographer');
		await enterTeam(page);
		const west = await uploadSheet(page, half(true), 'West, tied');
		const inks = await fills(page);
		const east = await uploadSheet(page, half(false), 'East, tied');
		await page.goto(`${east}/colours`);
		await drawn(page);
		const across = acrossTheCut();
		expect(across).toHaveLength(9);

		await page.getByRole('button', { name: 'Tie to an adjoining sheet' }).click();
		const number = west.split('/').at(-1) as string;
		await page.getByLabel('Sheet', { exact: true }).selectOption(number);
		await page.getByRole('button', { name: 'Look along the edge' }).click();
		const tie = page.getByRole('button', { name: `Tie to sheet ${number}` });
		await tie.waitFor();
		await picture(page, 'tie-preview');
		await expectAccessible(page);
		await tie.click();
		await page.locator('#ties').getByText('West, tied').waitFor();
		await expect.poll(() => docket(page, 'Colours').innerText()).toMatch(/4 inks|3 inks/);
		await saved(page);
		await page.reload();
		await drawn(page);
		const tied = await fills(page);
		for (const [a, b] of across) expect([a, b, inks[a] === tied[b]]).toEqual([a, b, false]);
		await picture(page, 'tied');
		await expectAccessible(page);

		await page.locator('#ties').getByRole('button', { name: 'Take back' }).click();
		await page.getByRole('button', { name: /^Undo/ }).waitFor();
		await expect.poll(() => page.locator('#ties').innerText()).not.toContain('West, tied');
		await saved(page);
		expect(complaints).toEqual([]);
		await context.close();
	});
});
