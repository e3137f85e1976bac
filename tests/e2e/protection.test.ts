import { expect, test } from '@playwright/test';
import { expectSweeping, openBench, setUp, signIn, startAttempt } from './bench-page';
import { ready } from './ready';

test.use({ viewport: { width: 1440, height: 900 } });

test('direct voltage opens the protection until a block is put in, and an overloaded mixer says what to do', async ({
	page
}) => {
	await signIn(page, 'bridget.hale@tarnvale.example');
	await openBench(page, 'line-that-carries-its-own-supply');
	const state = page.getByRole('status', { name: 'State of the receiver' });
	await page.getByLabel('Connected', { exact: true }).selectOption('the lead');
	await expect(state).toContainText('Input protection has opened: too much power, or DC, at the connector');
	await state.getByRole('button', { name: 'Reset' }).click();
	await expect(state).toContainText('Input protection has opened');

	await page.reload();
	await ready(page);
	await expect(state).toContainText('Input protection has opened');
	const told = page.waitForResponse((response) => response.url().endsWith('/sweeps'));
	await page.getByLabel('DC block', { exact: true }).selectOption('fitted');
	await told;
	await state.getByRole('button', { name: 'Reset' }).click();
	await expect(state).toContainText('Input at the mixer within 3 dB of compression: levels read low');
	await expectSweeping(page);
	await state.getByRole('button', { name: 'Preamplifier off' }).click();
	await expect(state.getByRole('button', { name: 'Preamplifier off' })).toBeHidden();
	await expect(state.getByRole('button', { name: 'Attenuate 10 dB more' })).toBeVisible();
	await setUp(page, 'Attenuation', '30 dB');
	await expect(state).not.toContainText('compression');
});

test('an attempt is given up on the page after a second thought, and its finding shows the signal', async ({
	page
}) => {
	await signIn(page, 'greta.scarth@tarnvale.example');
	await openBench(page, 'strongest-and-its-neighbour');
	await page.getByRole('button', { name: 'End this attempt without answers' }).click();
	await expect(page.getByText('counts as a try')).toBeFocused();
	await page.getByRole('button', { name: 'Keep on' }).click();
	await expect(page.getByRole('button', { name: 'End this attempt without answers' })).toBeFocused();
	await page.keyboard.press('Enter');
	await page.getByRole('button', { name: 'End it without answers' }).click();
	await expect(page).toHaveURL(/\/finding$/, { timeout: 30_000 });
	await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
	const again = await startAttempt(page, 'strongest-and-its-neighbour');
	expect(again.number).toBe(2);
});
