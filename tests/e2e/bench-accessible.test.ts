import { expect, test } from '@playwright/test';
import {
	answerField,
	collectFaults,
	expectAccessible,
	handIn,
	openBench,
	order,
	setUp,
	signIn,
	startReading
} from './bench-page';

test.setTimeout(300_000);
test.use({ viewport: { width: 1440, height: 900 } });

test('every page of an exercise is without violations of accessibility or of the content policy', async ({
	page
}) => {
	const faults = await collectFaults(page);
	await page.emulateMedia({ reducedMotion: 'reduce' });
	await signIn(page, 'greta.scarth@tarnvale.example');
	await page.goto('/learn');
	await expectAccessible(page);
	await page.getByRole('link', { name: /Channel power of a telemetry carrier/ }).click();
	await expect(page.getByRole('button', { name: /^Start/ })).toBeVisible();
	await expectAccessible(page);
	await openBench(page);
	const { channel } = await order(page);
	await setUp(page, 'Centre', channel);
	await setUp(page, 'Span', '100 kHz');
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	await startReading(page, 'Channel power', { Centre: channel, Width: '25k' });
	await page.waitForTimeout(1500);
	await expectAccessible(page);
	await page.emulateMedia({ colorScheme: 'dark' });
	await expectAccessible(page);
	await page.setViewportSize({ width: 390, height: 844 });
	for (const tab of ['Set-up', /^Readings/, 'Work order']) {
		await page
			.getByRole('navigation', { name: 'Parts of the bench' })
			.getByRole('button', { name: tab })
			.click();
		await expectAccessible(page);
	}
	const wide = await page.evaluate(() => document.documentElement.scrollWidth);
	expect(wide).toBeLessThanOrEqual(390);
	await answerField(page, 1).fill('-20');
	await answerField(page, 2).fill('-60');
	await handIn(page);
	await expectAccessible(page);
	expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
	await page.setViewportSize({ width: 1440, height: 900 });
	await page.emulateMedia({ colorScheme: 'light' });
	await expectAccessible(page);
	await page.getByRole('link', { name: /^2/ }).click();
	await expect(page.getByText('Power density in the middle of the channel').first()).toBeVisible();
	await expectAccessible(page);
	expect(faults).toEqual([]);
});
