import { expect, test } from '@playwright/test';
import { answerField, expectAccessible, handIn, openBench, signIn } from './bench-page';
import { ready } from './ready';

test.setTimeout(240_000);
test.use({ viewport: { width: 1440, height: 900 } });

test('after a wrong answer the method is played on the same signal, and the report is one page', async ({
	page
}) => {
	const refused: string[] = [];
	page.on('response', (response) => {
		if (response.status() === 409) refused.push(response.url());
	});
	await signIn(page, 'bridget.hale@tarnvale.example');
	await openBench(page, 'power-of-a-spread-sensor');
	await answerField(page, 1).fill('-40');
	await answerField(page, 2).fill('-80');
	await handIn(page);
	await expect(page.getByRole('heading', { level: 1 })).toBeFocused();
	expect(refused).toEqual([]);

	await page.getByRole('link', { name: 'Do it on this signal' }).click();
	await expect(page.getByRole('heading', { name: 'Done right on your own signal' })).toBeVisible();
	await ready(page);
	const steps = page.locator('ol').getByRole('button');
	const on = page.getByRole('button', { name: 'Step on' });
	for (let i = 1; i < 4; i++) {
		await on.click();
		await expect(steps.nth(i)).toHaveAttribute('aria-current', 'step');
	}
	await expect(page.getByText('Sweep 12 of 12')).toBeVisible({ timeout: 20_000 });
	await on.click();
	await expect(page.getByRole('img', { name: /Channel power.*reading/ })).toBeVisible();
	await expect(page.getByRole('region', { name: 'Set-up after this step' })).toContainText('Average of 12');
	await expectAccessible(page);

	await page.goto(page.url().replace('done-right', 'report'));
	await expect(page.getByText('Bridget Hale').last()).toBeVisible();
	await expect(page.getByText(/not an authorisation to work/)).toBeVisible();
	await expectAccessible(page);
	const pdf = (await page.pdf({ preferCSSPageSize: true })).toString('latin1');
	expect(pdf.match(/\/Type\s*\/Page\b(?!s)/g)).toHaveLength(1);
});
