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
test.use({ viewport: { width: 390, height: 844 } });

test('a bench on a phone and the finding after it are without violations, and nothing runs off the side', async ({
	page
}) => {
	const faults = await collectFaults(page);
	const overflowPx = () => page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
	await page.emulateMedia({ reducedMotion: 'reduce', colorScheme: 'dark' });
	await signIn(page, 'greta.scarth@tarnvale.example');
	await openBench(page);
	const { channel } = await order(page);
	const tab = (name: string | RegExp) =>
		page.getByRole('navigation', { name: 'Parts of the bench' }).getByRole('button', { name }).click();
	await tab('Set-up');
	await setUp(page, 'Centre', channel);
	await setUp(page, 'Span', '100 kHz');
	await startReading(page, 'Channel power', { Centre: channel, Width: '25k' });
	// A bench that sweeps changes under the eyes of whoever looks closely.
	await page.getByRole('button', { name: 'Stop' }).click();
	for (const name of ['Set-up', /^Readings/, 'Work order']) {
		await tab(name);
		await expectAccessible(page);
		expect(await overflowPx()).toBeLessThanOrEqual(0);
	}
	await answerField(page, 1).fill('-20');
	await answerField(page, 2).fill('-60');
	await handIn(page);
	await expectAccessible(page);
	expect(await overflowPx()).toBeLessThanOrEqual(0);
	await page.setViewportSize({ width: 1440, height: 900 });
	await page.emulateMedia({ colorScheme: 'light' });
	await page.getByRole('link', { name: /^2/ }).click();
	await expect(page.getByText('Power density in the middle of the channel').first()).toBeVisible();
	await expectAccessible(page);
	expect(faults).toEqual([]);
});
