import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';
import { drawn } from './desk.ts';
import type { ChosenFile } from './uploads.ts';

/** A file of the sample data as the browser's file chooser takes it. */
export const sampleFile = (name: string): ChosenFile => ({
	name,
	mimeType: 'application/octet-stream',
	buffer: readFileSync(`sample-data/${name}`),
});

/** Waits until a change of boundaries has been read and laid beside what stands. */
export async function compared(page: Page): Promise<void> {
	await page.waitForURL(/\/recuts\/\d+/, { timeout: 60_000 });
	await page.getByRole('heading', { name: 'Before and after' }).waitFor({ timeout: 120_000 });
}

/** Goes to the stage of the boundaries, once the sheet can be worked on. */
export async function toBoundaries(page: Page, sheet: string): Promise<void> {
	await page.goto(`${sheet}/boundaries`);
	await drawn(page);
}
