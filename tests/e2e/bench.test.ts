import { expect, test } from '@playwright/test';
import {
	answerField,
	collectFaults,
	expectSweeping,
	openBench,
	order,
	readingRow,
	setUp,
	setUpField,
	signIn,
	startReading
} from './bench-page';

test.setTimeout(240_000);
test.use({ viewport: { width: 1440, height: 900 } });

test.beforeEach(async ({ page }) => {
	await signIn(page, 'silas.arkle@tarnvale.example');
	await openBench(page);
});

test('a blank takes what people type, steps with the arrow keys, and shows what auto chose', async ({
	page
}) => {
	const faults = await collectFaults(page);
	await setUp(page, 'Span', '0.1M');
	await expect(setUpField(page, 'Span')).toHaveValue('100');
	await setUpField(page, 'Span').press('ArrowUp');
	await expect(setUpField(page, 'Span')).toHaveValue('200');
	await setUp(page, 'Resolution bandwidth', '300 Hz');
	await expect(page.getByLabel('Resolution bandwidth: automatic')).not.toBeChecked();
	await page.getByLabel('Resolution bandwidth: automatic').check({ force: true });
	await expect(setUpField(page, 'Resolution bandwidth')).toHaveValue('3');
	expect(faults).toEqual([]);
});

test('a figure that coupling changes under the cursor is replaced by what is typed next', async ({
	page
}) => {
	await setUp(page, 'Span', '100 kHz');
	await page.getByLabel('Resolution bandwidth: automatic').check({ force: true });
	await expect(setUpField(page, 'Resolution bandwidth')).toHaveValue('1');
	await page.route('**/sweeps', async (route) => {
		await expect(setUpField(page, 'Resolution bandwidth')).toBeFocused();
		await route.continue();
	});
	await setUpField(page, 'Span').press('ArrowUp');
	await setUpField(page, 'Resolution bandwidth').focus();
	await expect(setUpField(page, 'Resolution bandwidth')).toHaveValue('3');
	await page.keyboard.type('300 Hz');
	await page.keyboard.press('Enter');
	await expect(setUpField(page, 'Resolution bandwidth')).toHaveValue('300');
});

test('a refused value stays as it was typed, says why, and goes away on Escape', async ({ page }) => {
	const field = setUpField(page, 'Resolution bandwidth');
	const before = await field.inputValue();
	await field.fill('200 Hz');
	await field.press('Enter');
	const refused = page.getByRole('textbox', { name: /^Resolution bandwidth/ });
	await expect(refused).toHaveValue('200 Hz');
	await expect(page.getByRole('alert').filter({ hasText: '100 Hz and 300 Hz' })).toBeVisible();
	await refused.press('Escape');
	await expect(setUpField(page, 'Resolution bandwidth')).toHaveValue(before);
	await setUpField(page, 'Centre').fill('20 GHz');
	await setUpField(page, 'Centre').press('Enter');
	await expect(page.getByRole('textbox', { name: /^Centre/ })).toHaveValue('20 GHz');
	await expect(page.getByRole('textbox', { name: /^Centre/ })).toHaveAttribute('aria-invalid', 'true');
	await expectSweeping(page);
});

test('a sweep too fast is said in numbers, with the remedy beside it', async ({ page }) => {
	await setUp(page, 'Span', '100 kHz');
	await setUp(page, 'Resolution bandwidth', '300 Hz');
	await setUp(page, 'Sweep time', '500 ms');
	const state = page.getByRole('status', { name: 'State of the receiver' });
	await expect(state).toContainText(/Sweep too fast .* read low by about \d\.\d dB/);
	await state.getByRole('button', { name: /Use auto/ }).click();
	await expect(state).not.toContainText('too fast');
	await expect(page.getByLabel('Sweep time: automatic')).toBeChecked();
});

test('starting a power reading sets detector and averages where it can be seen', async ({ page }) => {
	const { channel } = await order(page);
	await setUp(page, 'Centre', channel);
	await setUp(page, 'Span', '100 kHz');
	await page.getByLabel('Detector', { exact: true }).selectOption('positive-peak');
	await startReading(page, 'Channel power', { Centre: channel, Width: '25k' });
	await expect(page.getByLabel('Detector', { exact: true })).toHaveValue('average');
	await expect(page.getByLabel('Averages taken of')).toHaveValue('power');
	await expect(page.getByText(/Detector set to average/)).toBeVisible();
	await expect(readingRow(page, 'Channel power, 25').locator('td.value')).toHaveText(/−\d+\.\d/);
});

test('an answer in the wrong unit is refused and what was typed stays', async ({ page }) => {
	await answerField(page, 1).fill('12 MHz');
	await answerField(page, 2).fill('-60');
	await page.getByRole('button', { name: 'Hand in', exact: true }).click();
	await expect(page.getByRole('alert').filter({ hasText: /MHz is a frequency/ })).toBeVisible();
	await expect(answerField(page, 1)).toHaveValue('12 MHz');
	await expect(page).toHaveURL(/attempts\/\d+$/);
	await expect(page.getByText(/^Kept \d\d:\d\d/)).toBeVisible();
	await page.reload();
	await expect(answerField(page, 1)).toHaveValue('12 MHz');
	await expect(answerField(page, 2)).toHaveValue('-60');
});

test('markers stay over a reload, and a count that finds no line says so at its marker', async ({ page }) => {
	const { channel } = await order(page);
	await setUp(page, 'Centre', channel);
	await setUp(page, 'Span', '100 kHz');
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	const kept = page.waitForResponse((response) => response.url().endsWith('/markings') && response.ok());
	await page.getByLabel('Frequency of marker A').fill(channel);
	await page.getByLabel('Frequency of marker A').press('Enter');
	await kept;
	await startReading(page, 'Frequency count', { Gate: '10 ms' }, 'Count');
	await expect(readingRow(page, 'Frequency count')).toContainText(
		/Nothing to count: no single line stands 20 dB/
	);
	await page.reload();
	await expectSweeping(page);
	const at = page.getByRole('slider', { name: 'Marker A' });
	expect(Number(await at.getAttribute('aria-valuenow'))).toBeCloseTo(Number.parseFloat(channel) * 1e6, 0);
});

test('a bench left and opened again goes on at the next sweep', async ({ page }) => {
	const sweep = async () => Number(/Sweep (\d+)/.exec(await page.getByText(/^Sweep \d+/).innerText())![1]);
	await expect.poll(sweep).toBeGreaterThan(3);
	const before = await sweep();
	await page.reload();
	await expectSweeping(page);
	await expect.poll(sweep).toBeGreaterThanOrEqual(before);
});

test('a second tab takes the receiver over, and the first says so', async ({ page, context }) => {
	const second = await context.newPage();
	await second.goto(page.url());
	await expectSweeping(second);
	await expect(page.getByRole('status', { name: 'State of the receiver' })).toContainText(
		'The receiver has stopped'
	);
	await second.close();
});
