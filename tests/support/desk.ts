import type { Page } from 'playwright-core';
import type { ChosenFile } from './uploads.ts';

/** The demo team's address. */
export const team = '/tavaroe-survey';

/** From the list of teams into the demo team's sheets, as a person would click. */
export async function enterTeam(page: Page): Promise<void> {
	await page.getByRole('main').getByRole('link', { name: 'Tavaröe' }).click();
	await page.waitForURL(/\/sheets$/);
}

/** Uploads a file through the page and waits for the sheet that comes of it. Returns its address. */
export async function uploadSheet(page: Page, file: ChosenFile, name: string): Promise<string> {
	await chooseAndSend(page, file, name);
	await page.waitForURL(/\/sheets\/\d+/, { timeout: 120_000 });
	await drawn(page);
	return new URL(page.url()).pathname.replace(/(\/sheets\/\d+).*/, '$1');
}

/** Fills the upload page and sends it. */
export async function chooseAndSend(page: Page, file: ChosenFile, name: string): Promise<void> {
	await page.goto(`${team}/upload`);
	await page.getByLabel('Name of the sheet').fill(name);
	await page.locator('input[type=file]').setInputFiles(file);
	await page.getByRole('button', { name: 'Upload and read' }).click();
}

/** Waits until the sheet stands on the booth's ground. */
export async function drawn(page: Page): Promise<void> {
	await page.locator('main svg [data-key]').first().waitFor({ timeout: 60_000 });
}

/** What the docket says of a stage. */
export const docket = (page: Page, stage: string) =>
	page
		.getByRole('navigation', { name: 'Docket' })
		.getByRole('listitem')
		.filter({ has: page.getByRole('link', { name: stage, exact: true }) });

/** Waits for the draft to be saved after a change. */
export async function saved(page: Page): Promise<void> {
	await page
		.getByRole('banner')
		.getByText(/^Saved/)
		.waitFor({ timeout: 30_000 });
}

/** Fills of the regions as drawn, by key. */
export const fills = (page: Page): Promise<Record<string, string>> =>
	page
		.locator('main svg [data-key]')
		.evaluateAll((all) =>
			Object.fromEntries(
				all.map((one) => [one.getAttribute('data-key') ?? '', one.getAttribute('fill') ?? '']),
			),
		);
