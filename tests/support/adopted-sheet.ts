import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';
import { expect, vi } from 'vitest';
import { demo } from './browser.ts';
import { team } from './desk.ts';
import { firm, territoriesToday } from './planned-sheet.ts';

/**
 * A sheet of the sample republic in the demo team with the distributor's hours and territories, and an
 * adopted proposal of 10 %. Asked for over the API and by the planner's own forms, without their screens.
 * @param page signed in as the planner
 * @returns address of its territories
 */
export async function adoptedSheet(page: Page): Promise<string> {
	const number = await sampleSheet('Districts to hand over');
	await joinHours(number);
	const address = await sheetPlannedToday(page, number);
	const measure = await measureId(page, address);
	const asked = { name: 'Within 10 %', revision: '1', effort: 'quick' };
	await submit(page, `${address}/proposals?/begin`, { ...asked, [`tolerance.${measure}`]: '10' });
	await workedOut(page, address);
	await submit(page, `${address}/proposals?/adopt`, { proposal: '1', revision: '0' });
	return address;
}

/** The distributor's hours, over the API. */
export async function joinHours(number: number): Promise<void> {
	const values = Object.fromEntries(firm.rows.map(({ code, hours }) => [code, hours]));
	await api(`/sheets/${number}/measures/visits`, {
		method: 'PUT',
		headers: { 'content-type': 'application/json' },
		body: JSON.stringify({ unit: 'hours a year', values }),
	});
}

/**
 * The distributor's territories as they are today on a sheet that has one measure, with a tolerance of 10 %.
 * @param revision of the territories that are there, 0 for none
 * @returns address of its territories
 */
export async function sheetPlannedToday(page: Page, number: number, revision = 0): Promise<string> {
	const address = `${team}/sheets/${number}/territories`;
	const measure = await measureId(page, address);
	const today = territoriesToday();
	const wishes = { ...today.wishes, tolerances: { [measure]: 0.1 } };
	const saved = await page.request.post(`${address}/draft`, {
		headers: { origin: demo().url },
		data: { revision, document: { ...today, wishes } },
	});
	expect(saved.ok(), await saved.text()).toBe(true);
	return address;
}

export async function api(path: string, init: RequestInit = {}): Promise<Record<string, unknown>> {
	const { url, token } = demo();
	const headers = { ...init.headers, authorization: `Bearer ${token}` };
	const response = await fetch(`${url}/api/v1${path}`, { ...init, headers });
	const text = await response.text();
	expect(response.ok, `${path}: ${text}`).toBe(true);
	return JSON.parse(text);
}

/** Uploads the sample and waits until it is a sheet of this name. */
export async function sampleSheet(sheetName: string): Promise<number> {
	const form = new FormData();
	for (const [name, value] of Object.entries({
		sheetName,
		keyField: 'code',
		nameField: 'name',
	})) {
		form.set(name, value);
	}
	form.set('file', new Blob([readFileSync('sample-data/tavaroe.geojson')]), 'tavaroe.geojson');
	const { id } = await api('/sheets', { method: 'POST', body: form });
	return vi.waitFor(
		async () => {
			const { sheet } = await api(`/intakes/${String(id)}`);
			expect(sheet).toBeTypeOf('number');
			return Number(sheet);
		},
		{ timeout: 120_000, interval: 1000 },
	);
}

/** From the page's data as the framework sends it: values by number, objects of such numbers. */
async function measureId(page: Page, address: string): Promise<string> {
	const response = await page.request.get(`${address}/__data.json`);
	const { nodes }: { nodes: ({ data?: unknown[] } | null)[] } = await response.json();
	for (const data of nodes.map((node) => node?.data ?? [])) {
		const measure = data.find(
			(one): one is { id: number } =>
				typeof one === 'object' && one !== null && 'confidential' in one && 'values' in one,
		);
		if (measure) return String(data[measure.id]);
	}
	throw new Error('the page has no measure');
}

async function submit(page: Page, action: string, form: Record<string, string>): Promise<void> {
	const headers = { origin: demo().url, 'x-sveltekit-action': 'true', accept: 'application/json' };
	const response = await page.request.post(action, { headers, form });
	const { type, data } = await response.json();
	expect(type, JSON.stringify(data)).toBe('success');
}

async function workedOut(page: Page, address: string): Promise<void> {
	await vi.waitFor(
		async () => {
			const response = await page.request.get(`${address}/proposals/status`);
			const [proposal]: { state: string }[] = await response.json();
			expect(proposal?.state).toBe('kept');
		},
		{ timeout: 180_000, interval: 1000 },
	);
}
