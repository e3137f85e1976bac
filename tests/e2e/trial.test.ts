/** The bench on the front page, for anyone. */
import { expect, test, type Page } from '@playwright/test';
import { collectFaults, expectAccessible } from './bench-page';
import { ready } from './ready';

/** What the plot says of the distance between the markers, kHz. */
async function distanceKHz(page: Page): Promise<number> {
	const words = await page.getByRole('group', { name: /Spectrum around/ }).getAttribute('aria-label');
	return Number(/stand ([\d.]+) kHz apart/.exec(words ?? '')?.[1]);
}

/** Puts A on the left and B on the right of the two strongest carriers, with the keys a person would use. */
async function markTheTwo(page: Page): Promise<void> {
	const [a, b] = ['Marker A', 'Marker B'].map((name) => page.getByRole('slider', { name }));
	const level = async () =>
		Number(/([−\d.]+) dBm/.exec((await a.getAttribute('aria-valuetext')) ?? '')?.[1].replace('−', '-'));
	await a.focus();
	await page.keyboard.press('Home');
	// Peaks below −50 dBm are the weak ones that the question doesn't ask about.
	await expect(async () => {
		await page.keyboard.press('.');
		expect(await level()).toBeGreaterThan(-50);
	}).toPass({ intervals: [50] });
	const leftHz = await a.getAttribute('aria-valuenow');
	await b.focus();
	await page.keyboard.press('Home');
	await expect(async () => {
		await page.keyboard.press('.');
		expect(Number(await b.getAttribute('aria-valuenow'))).toBeGreaterThan(Number(leftHz) + 5000);
	}).toPass({ intervals: [50] });
}

test('anyone tries the bench: an answer that was not read is refused, a wrong one is told why, a right one is right', async ({
	page
}) => {
	const faults = await collectFaults(page);
	await page.goto('/');
	await ready(page);
	const answer = page.getByLabel(/then give the distance/);
	await page.getByRole('button', { name: 'Hand in' }).click();
	await expect(page.getByRole('alert')).toContainText('Give the number');
	await answer.fill('wide');
	await page.getByRole('button', { name: 'Hand in' }).click();
	await expect(page.getByRole('alert')).not.toContainText('Give the number');
	await expect(answer).toHaveValue('wide');

	await page.getByRole('radio', { name: '1 kHz', exact: true }).check({ force: true });
	await expect(page.getByText('now, through 1 kHz')).toBeVisible();
	await expect(page.getByText('before, through 30 kHz')).toBeVisible();
	await markTheTwo(page);
	await answer.fill(String((await distanceKHz(page)) / 2));
	await page.getByRole('button', { name: 'Hand in' }).click();
	const verdict = page.getByRole('heading', { level: 3 });
	await expect(verdict).toContainText('distance from the middle');
	await expect(verdict).toBeFocused();
	await expectAccessible(page);

	await page.getByRole('button', { name: 'Take another signal' }).click();
	await page.getByRole('radio', { name: '1 kHz', exact: true }).check({ force: true });
	await expect(page.getByText('now, through 1 kHz')).toBeVisible();
	await markTheTwo(page);
	await answer.fill(`${await distanceKHz(page)} kHz`);
	await page.getByRole('button', { name: 'Hand in' }).click();
	await expect(verdict).toContainText('Right');
	expect(faults).toEqual([]);
});
