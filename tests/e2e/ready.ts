import type { Locator, Page } from '@playwright/test';

/** Waits until the script has taken the page over. A key or a press that only a script answers is lost before. */
export const ready = async (page: Page): Promise<void> => {
	await page.locator('html[data-ready]').waitFor({ state: 'attached' });
};

/** The button that opens the menu under the person's name. */
export const personMenu = (page: Page): Locator => page.locator('[data-person-menu]');

/** Goes on by Tab, or back by Shift and Tab if that is nearer, as a person without a pointer does, until `target` has the focus. */
export async function tabTo(page: Page, target: Locator): Promise<void> {
	const key = await target.evaluate((element) => {
		const all = [...document.querySelectorAll('a[href], button, input, select, textarea, [tabindex="0"]')];
		const from = all.indexOf(document.activeElement ?? element);
		// Nothing has the focus: forward, since what comes next is not known to be nearer behind.
		if (from < 0) return 'Tab';
		const steps = all.indexOf(element) - from;
		return (steps + all.length) % all.length <= all.length / 2 ? 'Tab' : 'Shift+Tab';
	});
	for (let i = 0; i < 90; i++) {
		if (await target.evaluate((element) => element === document.activeElement)) return;
		await page.keyboard.press(key);
	}
	throw new Error('Tab never reached it');
}
