import { expect, test } from '@playwright/test';
import { expectSweeping, openBench, readingRow, setUpField, signIn } from './bench-page';
import { tabTo } from './ready';

test.setTimeout(120_000);
test.use({ viewport: { width: 1440, height: 900 } });

test('markers, a count, a table, what is kept, and sweeps over time are had on the keyboard alone', async ({
	page
}) => {
	await signIn(page, 'silas.arkle@tarnvale.example');
	await openBench(page, 'power-behind-a-coupler');
	const { keyboard } = page;
	const choose = async (label: string, option: string) => {
		const field = page.getByLabel(label, { exact: true });
		await tabTo(page, field);
		await keyboard.type(option);
		await expect(field.locator('option:checked')).toHaveText(option);
	};
	// The pad first: the lead brings more than the input bears.
	await choose('Pad', '30 dB');
	await choose('Connected', 'the lead');

	await test.step('a table of losses is typed', async () => {
		await tabTo(page, page.getByRole('button', { name: 'Correction by table' }));
		await keyboard.press('Enter');
		const rows = page.getByLabel('Correction over frequency');
		await tabTo(page, rows);
		await keyboard.type('90, 52');
		await keyboard.press('Enter');
		await keyboard.type('110, 53');
		await keyboard.press('Tab');
		await keyboard.press('Enter');
		await expect(page.getByRole('button', { name: 'Correction, table of 2' })).toBeFocused();
	});

	await test.step('a marker’s sentence moves it, and another is read from it', async () => {
		await tabTo(page, page.getByRole('button', { name: 'Marker', exact: true }));
		await keyboard.press('Enter');
		await keyboard.press('Enter');
		const sentence = page.getByRole('group', { name: 'Marker B', exact: true });
		await tabTo(page, sentence.getByLabel('Marker B is read from'));
		await keyboard.type('A');
		await expect(readingRow(page, /from A|B − A|Δ/)).toBeVisible();
		const at = page.getByRole('slider', { name: 'Marker B' });
		const before = await at.getAttribute('aria-valuenow');
		await tabTo(page, sentence.getByRole('button', { name: 'peak on the left' }));
		await keyboard.press('Enter');
		await expect(at).not.toHaveAttribute('aria-valuenow', before ?? '');
	});

	await test.step('a count is taken at the marker', async () => {
		await tabTo(page, page.getByRole('slider', { name: 'Marker A' }));
		await keyboard.press('p');
		await tabTo(page, page.getByRole('button', { name: 'Reading', exact: true }));
		await keyboard.press('Enter');
		await tabTo(page, page.getByRole('button', { name: /^Frequency count/ }));
		await keyboard.press('Enter');
		await tabTo(page, page.getByLabel('Gate', { exact: true }));
		await keyboard.type('10 ms');
		await keyboard.press('Enter');
		await expect(readingRow(page, 'Frequency count')).toContainText(/MHz|Hz/);
	});

	await test.step('a set-up is kept by name and recalled', async () => {
		await tabTo(page, page.getByRole('button', { name: 'Keep', exact: true }));
		await keyboard.press('Enter');
		await tabTo(page, page.getByLabel('Name for the set-up in force'));
		await keyboard.type('By keys');
		await keyboard.press('Enter');
		await expect(page.getByText('“By keys” kept.')).toBeVisible();
		await keyboard.press('Escape');
		await expect(page.getByRole('button', { name: 'Keep', exact: true })).toBeFocused();
		await tabTo(page, setUpField(page, 'Span'));
		await keyboard.type('2 MHz');
		await keyboard.press('Enter');
		await expect(setUpField(page, 'Span')).toHaveValue('2');
		await tabTo(page, page.getByRole('button', { name: 'Keep', exact: true }));
		await keyboard.press('Enter');
		await tabTo(page, page.getByRole('button', { name: 'By keys', exact: true }));
		await keyboard.press('Enter');
		await expect(page.getByText('“By keys” recalled.')).toBeVisible();
		await keyboard.press('Escape');
		await expect(setUpField(page, 'Span')).toHaveValue('20');
	});

	await test.step('sweeps over time are looked at, and left again', async () => {
		await tabTo(page, page.getByRole('button', { name: 'Over time' }));
		await keyboard.press('Enter');
		const picture = page.getByRole('application', { name: /^Sweeps over time/ });
		await tabTo(page, picture);
		await keyboard.press('ArrowRight');
		await tabTo(page, page.getByRole('button', { name: 'Spectrum' }));
		await keyboard.press('Space');
		await expectSweeping(page);
		await expect(page.getByRole('application', { name: /^Spectrum/ })).toBeVisible();
	});
});
