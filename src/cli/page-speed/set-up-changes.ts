import type { Page } from '@playwright/test';

const seenIn = (page: Page) =>
	page.evaluate(() => (window as unknown as { seen: { paintedMs: number[] } }).seen.paintedMs);

/** Types resolution bandwidths by turns; from the key that sets each to the first new trace on the screen, ms. */
export async function setUpChangesMs(page: Page, changes: number): Promise<number[]> {
	const field = page
		.getByRole('group', { name: 'Set-up' })
		.getByRole('textbox', { name: /^Resolution bandwidth/ });
	for (let i = 0; i < changes; i++) {
		await field.fill(i % 2 === 0 ? '30 kHz' : '10 kHz');
		await field.press('Enter');
		await page.waitForFunction(
			(least) => (window as unknown as { seen: { paintedMs: number[] } }).seen.paintedMs.length >= least,
			i + 1
		);
	}
	return seenIn(page);
}
