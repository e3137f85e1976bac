import { readFile } from 'node:fs/promises';
import { expect, test } from '@playwright/test';
import { expectAccessible, openBench, setUp, setUpField, signIn } from './bench-page';

test.setTimeout(240_000);
test.use({ viewport: { width: 1440, height: 900 } });

test('sweeps stand over time, are played back and saved, and a set-up is recalled by its name', async ({
	page
}) => {
	await signIn(page, 'silas.arkle@tarnvale.example');
	await openBench(page, 'power-of-a-spread-sensor');
	await setUp(page, 'Span', '4 MHz');
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	await page.getByRole('button', { name: 'Over time' }).click();
	const picture = page.getByRole('application', { name: /^Sweeps over time/ });
	await expect(picture).toBeVisible();
	await expect(picture.getByRole('slider', { name: 'Marker A' })).toBeVisible();
	await expectAccessible(page);

	const keep = page.getByRole('button', { name: 'Keep', exact: true });
	await keep.click();
	const saved = (name: string) =>
		Promise.all([page.waitForEvent('download'), page.getByRole('button', { name }).click()]);
	const [image] = await saved('Save the picture');
	expect((await readFile(await image.path())).subarray(1, 4).toString()).toBe('PNG');
	const [data] = await saved('Save the data');
	expect(await readFile(await data.path(), 'utf8')).toMatch(
		/^\uFEFFSweepwright,[^]*frequency_Hz,"1 Hold maximum, dBm"/
	);
	await page.getByLabel('Name for the set-up in force').fill('Wide');
	await page.getByRole('button', { name: 'Keep this set-up' }).click();
	await expect(page.getByText('“Wide” kept.')).toBeVisible();
	await page.keyboard.press('Escape');

	await setUp(page, 'Span', '100 kHz');
	await keep.click();
	await page.getByRole('button', { name: 'Wide', exact: true }).click();
	await expect(page.getByText('“Wide” recalled.')).toBeVisible();
	await page.keyboard.press('Escape');
	await expect(setUpField(page, 'Span')).toHaveValue('4');

	await page.getByRole('button', { name: /^Sweep \d+/ }).click();
	await page.getByRole('button', { name: /^Play back this set-up/ }).click();
	const player = page.getByRole('group', { name: 'Play back' });
	await expect(player.getByText(/the last of this set-up/)).toBeVisible();
	await player.getByRole('slider', { name: 'Sweep shown' }).press('Home');
	await expect(player.getByRole('button', { name: 'One sweep back' })).toBeDisabled();
	await expectAccessible(page);
	await player.getByRole('button', { name: 'To the bench as it is' }).click();
	await expect(player).toHaveCount(0);
});
