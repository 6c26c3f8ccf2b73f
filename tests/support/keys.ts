import type { Locator, Page } from 'playwright-core';

/** Presses Tab until the focus stands on the target, as somebody without a pointer does. */
export async function tabTo(page: Page, target: Locator, key = 'Tab', most = 200): Promise<void> {
	await target.first().waitFor();
	for (let presses = 0; presses < most; presses++) {
		if (await target.first().evaluate((element) => element === document.activeElement)) return;
		await page.keyboard.press(key);
	}
	throw new Error(`${most} presses of ${key} did not reach ${String(target)}`);
}
