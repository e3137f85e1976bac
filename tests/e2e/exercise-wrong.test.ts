import { expect, test } from '@playwright/test';
import {
	answerField,
	attach,
	expectAveraged,
	figure,
	handIn,
	openBench,
	order,
	readingRow,
	setUp,
	setUpAsTaught,
	signIn,
	startReading
} from './bench-page';

test.setTimeout(300_000);
test.use({ viewport: { width: 1440, height: 900 } });
const email = 'ewan.brack@skerrycoast.example';

test('a marker read as the power is named, with the sum in own numbers', async ({ page }) => {
	await signIn(page, email);
	await openBench(page);
	const { channel, leadDb } = await order(page);
	await setUpAsTaught(page);
	await setUp(page, 'Correction', `${leadDb} dB`);
	await page.getByLabel('Detector', { exact: true }).selectOption('average');
	await page.getByLabel('Averages taken of').selectOption('power');
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	await page.getByLabel('Frequency of marker A').fill(channel);
	await page.getByLabel('Frequency of marker A').press('Enter');
	await startReading(page, 'Power density', { Centre: channel, Width: '4 kHz' });
	await expectAveraged(page, 16);
	const point = await attach(page, readingRow(page, 'Marker'), 1);
	const density = await attach(page, readingRow(page, 'Power density, 4'), 2);
	await answerField(page, 1).fill(figure(point));
	await answerField(page, 2).fill(figure(density));
	await handIn(page);
	await expect(page.getByRole('heading', { level: 1 })).toContainText(/one point/i);
	await expect(page.getByRole('heading', { name: 'A point is not a power' })).toBeVisible();
	await expect(page.locator('.sum').first()).toContainText('log');
	await expect(
		page
			.getByText('What you did')
			.locator('..')
			.getByText(/take channel power/)
	).toBeVisible();
});

test('a lead left out is named, and a fresh attempt starts from the finding', async ({ page }) => {
	await signIn(page, email);
	await openBench(page);
	const { channel } = await order(page);
	await setUpAsTaught(page);
	await startReading(page, 'Channel power', { Centre: channel, Width: '25 kHz' });
	await startReading(page, 'Power density', { Centre: channel, Width: '4 kHz' });
	await expectAveraged(page, 16);
	const power = await attach(page, readingRow(page, 'Channel power, 25'), 1);
	const density = await attach(page, readingRow(page, 'Power density, 4'), 2);
	await answerField(page, 1).fill(figure(power));
	await answerField(page, 2).fill(figure(density));
	await handIn(page);
	await expect(page.getByRole('heading', { level: 1 })).toContainText(/lead/i);
	await page.getByRole('button', { name: 'Third attempt, fresh signal' }).click();
	await expect(page).toHaveURL(/\/learn\/attempts\/\d+$/);
	await expect(page.getByText('third attempt')).toBeVisible();
});
