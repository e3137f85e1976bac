import type { Locator, Page } from '@playwright/test';

/** Waits until the script has taken the page over. A key or a press that only a script answers is lost before. */
export const ready = async (page: Page): Promise<void> => {
	await page.locator('html[data-ready]').waitFor({ state: 'attached' });
};

/** The button that opens the menu under the person's name. */
export const personMenu = (page: Page): Locator => page.locator('[data-person-menu]');
