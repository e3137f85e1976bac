import { expect, test } from '@playwright/test';
import { collectFaults, expectAccessible, openBench, readingRow, signIn } from './bench-page';
import { ready } from './ready';

test.use({ viewport: { width: 1440, height: 900 } });

test('a term is explained where it stands, everything can be found, and a shut unit says what opens it', async ({
	page
}) => {
	const faults = await collectFaults(page);
	// Whoever does the exercises of unit 6 right in other tests finds unit 7 open.
	await signIn(page, 'ewan.brack@skerrycoast.example');
	await page.goto('/learn/units/the-floor');
	await ready(page);
	const term = page.locator('a.term', { hasText: /^noise figure$/i });
	const note = page.getByText(/^By how many decibels a receiver/).filter({ visible: true });
	const top = await page.evaluate(() => document.body.scrollHeight);
	await term.focus();
	await page.keyboard.press('Shift+Tab');
	await page.keyboard.press('Tab');
	await expect(note).toBeVisible();
	expect(await page.evaluate(() => document.body.scrollHeight)).toBe(top);
	await page.keyboard.press('Escape');
	await expect(note).toBeHidden();
	await term.hover();
	await expect(note).toBeVisible();
	await expect(term).toHaveAccessibleDescription(/^By how many decibels a receiver/);

	await page.getByRole('searchbox').fill('noise figure');
	await page.keyboard.press('Enter');
	await expect(page.getByRole('status').filter({ hasText: 'places for “noise figure”' })).toBeVisible();
	await expectAccessible(page);
	await page.getByRole('link', { name: 'Noise figure' }).first().click();
	await expect(page).toHaveURL(/glossary#noise-figure$/);
	await page.goto('/learn/find?q=submarine');
	await expect(page.getByText('Nothing has all of “submarine” in it.')).toBeVisible();

	await page.goto('/learn/exercises/width-of-a-telemetry-carrier');
	await expect(page.getByText('First comes unit 6')).toBeVisible();
	await expect(page.getByRole('button', { name: /^Start/ })).toHaveCount(0);
	await page.goto('/learn/skills');
	await expect(page.getByRole('row', { name: /Connect safely/ })).toBeVisible();
	await expectAccessible(page);
	expect(faults).toEqual([]);
});

test('a reading and a picture go from the bench into the logbook, and out of it as a document', async ({
	page
}) => {
	const faults = await collectFaults(page);
	await signIn(page, 'bridget.hale@tarnvale.example');
	await openBench(page, 'two-carriers-or-one');
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	const row = readingRow(page, 'Marker');
	await row.getByRole('button', { name: /^Log/ }).click();
	await expect(row.getByRole('link', { name: /^Logged/ })).toBeVisible();
	await page.getByRole('button', { name: 'Keep' }).click();
	await page.getByRole('button', { name: /^Put the picture in the logbook/ }).click();
	await expect(page.getByText('The picture is in the logbook.')).toBeVisible();

	await page.goto('/learn/logbook');
	await expect(page.getByRole('link', { name: /^Picture, sweep/ })).toBeVisible();
	for (const box of await page.getByRole('checkbox').all()) await box.check();
	const download = page.waitForEvent('download');
	await page.getByRole('button', { name: 'Chosen ones as PDF' }).click();
	expect((await download).suggestedFilename()).toBe('logbook.pdf');
	await expectAccessible(page);
	await page.setViewportSize({ width: 390, height: 844 });
	await page.emulateMedia({ colorScheme: 'dark' });
	expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
	await page.getByRole('link', { name: /^Picture, sweep/ }).click();
	await expect(page.getByRole('img', { name: /^Spectrum from/ })).toBeVisible();
	await expectAccessible(page);
	expect(faults).toEqual([]);
});
