/** The bench on the front page, for anyone. */
import { expect, test, type Locator, type Page } from '@playwright/test';
import { collectFaults, expectAccessible } from './bench-page';
import { ready } from './ready';

test.setTimeout(240_000);

/** What the plot says of the distance between the markers, kHz. */
async function distanceKHz(page: Page): Promise<number> {
	const words = await page.getByRole('group', { name: /Spectrum around/ }).getAttribute('aria-label');
	return Number(/stand ([\d.]+) kHz apart/.exec(words ?? '')?.[1]);
}

/** Puts A on the left and B on the right of the two strongest carriers, with the keys a person would use. */
async function markTheTwo(page: Page): Promise<void> {
	const [a, b] = ['Marker A', 'Marker B'].map((name) => page.getByRole('slider', { name }));
	// Peaks below −50 dBm are noise and the weak ones that the question doesn't ask about.
	const isStrong = async (marker: Locator) => {
		const words = (await marker.getAttribute('aria-valuetext')) ?? '';
		expect(Number(/([−\d.]+) dBm/.exec(words)?.[1].replace('−', '-'))).toBeGreaterThan(-50);
	};
	const placeHz = async (marker: Locator) => Number(await marker.getAttribute('aria-valuenow'));
	await a.focus();
	await page.keyboard.press('Home');
	await expect(async () => {
		await page.keyboard.press('.');
		await isStrong(a);
	}).toPass({ intervals: [20] });
	const leftHz = await placeHz(a);
	await b.focus();
	await page.keyboard.press('Home');
	await expect(async () => {
		await page.keyboard.press('.');
		expect(await placeHz(b)).toBeGreaterThan(leftHz + 5000);
		await isStrong(b);
	}).toPass({ intervals: [20] });
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
	await expect(verdict).toBeHidden();
	await page.getByRole('radio', { name: '1 kHz', exact: true }).check({ force: true });
	await expect(page.getByText('now, through 1 kHz')).toBeVisible();
	await markTheTwo(page);
	await answer.fill(`${await distanceKHz(page)} kHz`);
	await page.getByRole('button', { name: 'Hand in' }).click();
	await expect(verdict).toContainText('Right');
	expect(faults).toEqual([]);
});
