import { expect, test, type Locator } from '@playwright/test';
import { collectFaults, expectAccessible, signIn } from './bench-page';
import { ready } from './ready';

test.setTimeout(300_000);

/** What a figure shows: its lines and its readings. */
const shown = (figure: Locator): Promise<string> =>
	figure.evaluate((element) =>
		[
			...[...element.querySelectorAll('[data-trace]')].map((path) => path.getAttribute('d')),
			element.querySelector('tbody tr.present')?.textContent
		].join('\n')
	);

test('every lesson opens from the outline, and each of its figures follows a setting that is changed in it', async ({
	page
}) => {
	await signIn(page, 'ailsa.tyson@northmoor.example');
	await page.goto('/learn');
	const links = page.getByRole('link', { name: /^Read the lesson/ });
	const lessons = await links.evaluateAll((all) => all.map((link) => link.getAttribute('href') ?? ''));
	expect(lessons.length).toBeGreaterThan(0);
	for (const lesson of lessons) {
		await page.goto(lesson);
		await ready(page);
		const figures = page.getByRole('figure');
		expect(await figures.count(), lesson).toBeGreaterThan(0);
		for (const figure of await figures.all()) {
			const before = await shown(figure);
			const control = figure.getByRole('radiogroup').first();
			const other = control.getByRole('radio', { checked: false }).first();
			await other.focus();
			await other.press('Space');
			await expect(figure).toHaveAttribute('aria-busy', 'false');
			await expect(figure.getByRole('status')).not.toBeEmpty();
			expect(await shown(figure), `${lesson}: ${await figure.getAttribute('id')}`).not.toBe(before);
		}
	}
});

test('a figure is turned by pointer and by arrow keys, keeps the earlier line, and reads itself out', async ({
	page
}) => {
	const faults = await collectFaults(page);
	await page.emulateMedia({ reducedMotion: 'reduce' });
	await page.setViewportSize({ width: 1440, height: 900 });
	await signIn(page, 'ailsa.tyson@northmoor.example');
	await page.goto('/learn/units/power-of-a-spread-signal');
	await ready(page);
	const figure = page.getByRole('figure').first();
	const control = figure.getByRole('radiogroup', { name: 'Resolution' });
	await control.getByRole('radio', { checked: true }).press('ArrowRight');
	await expect(control.getByRole('radio', { name: '1 kHz' })).toBeChecked();
	await expect(figure.getByRole('status')).toContainText(/^1\s?kHz\. .*Channel power, 25\s?kHz: −\d/);
	await expect(figure.getByRole('row', { name: /^300\s?Hz/ })).toBeVisible();
	// Drag the pointer to the end of the rule.
	const cells = control.locator('label');
	const [from, to] = [await cells.nth(1).boundingBox(), await cells.nth(2).boundingBox()];
	if (!from || !to) throw new Error('The rule is not on the screen');
	await page.mouse.move(from.x + from.width / 2, from.y + 10);
	await page.mouse.down();
	await page.mouse.move(to.x + to.width / 2, to.y + 10, { steps: 4 });
	await page.mouse.up();
	await expect(control.getByRole('radio', { name: '3 kHz' })).toBeChecked();
	await expect(figure.getByRole('status')).toContainText(/^3\s?kHz/);
	await expectAccessible(page);
	await page.emulateMedia({ colorScheme: 'dark' });
	await page.setViewportSize({ width: 390, height: 844 });
	await page.getByText('In this unit').first().click();
	await expectAccessible(page);
	expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
	await figure.getByRole('button', { name: 'Clear earlier lines' }).click();
	await expect(figure.getByRole('row', { name: /^300\s?Hz/ })).toBeHidden();
	expect(faults).toEqual([]);
});

test('a lesson and its figures are there without script', async ({ browser, page }) => {
	await signIn(page, 'bridget.hale@tarnvale.example');
	const context = await browser.newContext({
		javaScriptEnabled: false,
		storageState: await page.context().storageState()
	});
	const plain = await context.newPage();
	await plain.goto('/learn/units/power-of-a-spread-signal');
	await expect(plain.getByRole('heading', { level: 1 })).toBeVisible();
	await expect(plain.getByRole('figure').first().getByRole('img')).toBeVisible();
	await expect(plain.getByRole('figure').first().getByRole('row', { name: /dBm/ })).toBeVisible();
	await context.close();
});
