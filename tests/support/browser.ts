import assert from 'node:assert/strict';
import { mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createRequire } from 'node:module';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

/** Debian's browser, driven without a sandbox when root and without a word to the outside. */
const launchOptions = {
	executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
	args: [
		'--no-sandbox',
		'--disable-gpu',
		'--disable-quic',
		'--no-first-run',
		'--disable-background-networking',
		'--disable-component-update',
		'--disable-sync',
	],
};

export const desk = { width: 1280, height: 800 };
export const phone = { width: 390, height: 844 };

export interface Demo {
	url: string;
	token: string;
	users: { email: string; password: string; roles: string[] }[];
}

const dataDir = process.env.MERESTONE_DATA ?? '.data';

/** The running product: where it is and who may sign in. */
export function demo(): Demo {
	const read: Demo = JSON.parse(readFileSync(join(dataDir, 'demo.json'), 'utf8'));
	return { ...read, url: process.env.MERESTONE_URL ?? read.url };
}

export const startBrowser = (): Promise<Browser> => chromium.launch(launchOptions);

/** A page of its own cookie jar, with everything the browser complains about kept for the test to see. */
export async function openPage(
	browser: Browser,
	options: { viewport?: { width: number; height: number }; javaScript?: boolean } = {},
): Promise<{ page: Page; context: BrowserContext; complaints: string[] }> {
	const context = await browser.newContext({
		baseURL: demo().url,
		viewport: options.viewport ?? desk,
		javaScriptEnabled: options.javaScript ?? true,
		acceptDownloads: true,
	});
	context.setDefaultTimeout(20_000);
	const page = await context.newPage();
	const complaints: string[] = [];
	page.on('pageerror', (error) => complaints.push(`page error: ${error.message}`));
	page.on('console', (message) => {
		if (message.type() === 'error') complaints.push(`console: ${message.text()}`);
	});
	return { page, context, complaints };
}

/** Signs in through the page, as a person would, with the first demo member who has just this role. */
export async function signInAs(page: Page, role: string): Promise<void> {
	const users = demo().users;
	const user =
		users.find((one) => one.roles.length === 1 && one.roles[0] === role) ??
		users.find((one) => one.roles.includes(role));
	if (!user) throw new Error(`no demo member is ${role}`);
	await page.goto('/sign-in');
	const form = page.locator('form', { has: page.getByLabel('Password') });
	await form.getByLabel('E-mail').fill(user.email);
	await form.getByLabel('Password').fill(user.password);
	await page.getByRole('button', { name: 'Sign in', exact: true }).click();
	await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

const axeFile = createRequire(import.meta.url).resolve('axe-core/axe.min.js');
const axeSource = readFileSync(axeFile, 'utf8');

interface Violation {
	id: string;
	nodes: { target: string[]; failureSummary?: string }[];
}

/** Runs axe-core (WCAG 2.2 A and AA rules) on the page as it stands and expects no violation. */
export async function expectAccessible(page: Page): Promise<void> {
	await page.evaluate(axeSource);
	const violations: Violation[] = await page.evaluate(
		`axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] }).then((r) => r.violations)`,
	);
	const told = violations.map(
		(violation) =>
			`${violation.id}: ${violation.nodes
				.slice(0, 3)
				.map((node) => `${node.target.join(' ')} (${node.failureSummary ?? ''})`)
				.join('; ')}`,
	);
	assert.deepEqual(told, [], page.url());
}

/** Keeps a picture for the README and for whoever wants to look; not compared with anything. */
export async function picture(page: Page, name: string): Promise<void> {
	const folder = process.env.MERESTONE_PICTURES ?? join(dataDir, 'pictures');
	mkdirSync(folder, { recursive: true });
	await page.screenshot({ path: join(folder, `${name}.png`) });
}
