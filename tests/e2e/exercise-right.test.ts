import { expect, test } from '@playwright/test';
import {
	answerField,
	attach,
	collectFaults,
	expectAveraged,
	figure,
	handIn,
	expectSweeping,
	order,
	readingRow,
	setUp,
	setUpAsTaught,
	signIn,
	startReading
} from './bench-page';
import { ready, tabTo } from './ready';

test.setTimeout(300_000);
test.use({ viewport: { width: 1440, height: 900 } });

test('an exercise done as taught is right, and the next step is the course', async ({ page }) => {
	const faults = await collectFaults(page);
	await signIn(page, 'ailsa.tyson@northmoor.example');
	await page.goto('/learn');
	await page.getByRole('link', { name: /Channel power of a telemetry carrier/ }).click();
	await page.getByRole('button', { name: /^Start/ }).click();
	await expectSweeping(page);
	const { channel, leadDb } = await order(page);
	await setUpAsTaught(page);
	await setUp(page, 'Correction', `${leadDb} dB`);
	await startReading(page, 'Channel power', { Centre: channel, Width: '25 kHz' });
	await startReading(page, 'Power density', { Centre: channel, Width: '4 kHz' });
	await expectAveraged(page, 16);
	const power = await attach(page, readingRow(page, 'Channel power, 25'), 1);
	const density = await attach(page, readingRow(page, 'Power density, 4'), 2);
	await answerField(page, 1).fill(figure(power));
	await answerField(page, 2).fill(figure(density));
	await expect(page.getByText(/^Kept \d\d:\d\d/)).toBeVisible();
	await handIn(page);
	await expect(page.getByText('Your number')).toBeVisible();
	await expect(page.getByRole('link', { name: 'On with the course' })).toBeVisible();
	await page.goto('/learn');
	await expect(page.getByText('right at the first attempt')).toBeVisible();
	expect(faults).toEqual([]);
});

test('an exercise can be done on the keyboard alone', async ({ page }) => {
	await signIn(page, 'owen.mell@tarnvale.example');
	await page.goto('/learn');
	await tabTo(page, page.getByRole('link', { name: /Channel power of a telemetry carrier/ }));
	await page.keyboard.press('Enter');
	await expect(page).toHaveURL(/exercises/);
	await tabTo(page, page.getByRole('button', { name: /^Start/ }));
	await page.keyboard.press('Enter');
	await expect(page).toHaveURL(/attempts/);
	await ready(page);
	const { channel } = await order(page);

	await tabTo(page, page.getByRole('textbox', { name: /^Centre/ }));
	await page.keyboard.type(channel);
	await page.keyboard.press('Tab');
	await page.keyboard.type('80k');
	await page.keyboard.press('Enter');
	await expect(page.getByRole('textbox', { name: /^Span/ })).toHaveValue('80');

	await tabTo(page, page.getByRole('application'));
	await page.keyboard.press('m');
	await expect(page.getByRole('slider', { name: 'Marker A' })).toBeVisible();
	const at = () => page.getByRole('slider', { name: 'Marker A' }).getAttribute('aria-valuenow');
	const before = Number(await at());
	await page.keyboard.press('ArrowRight');
	await expect.poll(async () => Number(await at())).toBeGreaterThan(before);
	// Until the first sweep of the new span is there, it says that there is none.
	await expect(async () => {
		await page.keyboard.press('Space');
		await expect(page.locator('p[aria-live=assertive]')).toHaveText(/Marker A: .*MHz.*dBm/, { timeout: 500 });
	}).toPass({ timeout: 20_000 });

	await tabTo(page, page.getByRole('button', { name: 'Reading', exact: true }));
	await page.keyboard.press('Enter');
	await page.keyboard.press('ArrowDown');
	await page.keyboard.press('ArrowDown');
	await expect(page.getByRole('button', { name: /^Channel power/ })).toBeFocused();
	await page.keyboard.press('Enter');
	await expect(page.getByRole('textbox', { name: 'Centre', exact: true })).toBeFocused();
	await tabTo(page, page.getByRole('textbox', { name: 'Width', exact: true }));
	await page.keyboard.type('25k');
	await page.keyboard.press('Enter');
	await expect(readingRow(page, 'Channel power, 25')).toBeVisible();

	for (const [question, value] of [
		[1, '-20'],
		[2, '-60,0']
	] as const) {
		await tabTo(page, answerField(page, question));
		await page.keyboard.type(value);
	}
	await tabTo(page, page.getByRole('button', { name: 'Hand in', exact: true }));
	await page.keyboard.press('Enter');
	await tabTo(page, page.getByRole('button', { name: 'Hand in now' }));
	await page.keyboard.press('Enter');
	await expect(page).toHaveURL(/\/finding$/, { timeout: 45_000 });
	await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
});
