import { expect, test } from '@playwright/test';
import type { ReadingResponse } from '$lib/schemas/attempt';
import {
	answerField,
	ask,
	attach,
	expectAveraged,
	expectSweeping,
	figure,
	handIn,
	openBench,
	order,
	readingRow,
	setUp,
	setUpAsTaught,
	signIn,
	startAttempt,
	sweepAsTaught,
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
	// What the readings rest on is done beforehand; what is marked and said of it, on the page.
	const { id: attemptId, exercise } = await startAttempt(page);
	const centreHz = Math.round(Number(/channel at ([\d.]+) MHz/.exec(exercise.situationHtml)?.[1]) * 1e6);
	await sweepAsTaught(page, attemptId, centreHz);
	const answers: Record<string, { text: string; unit: string; readingId: number }> = {};
	const requests = [
		{ kind: 'channel-power', centreHz, widthHz: 25e3 },
		{ kind: 'power-density', centreHz, widthHz: 4e3 }
	];
	for (const [i, request] of requests.entries()) {
		const rows = { from: 0, to: 15 };
		const taken = { rows, trace: 1, request };
		const { reading } = await ask<ReadingResponse>(page, `/api/attempts/${attemptId}/readings`, taken);
		const { id } = exercise.questions[i];
		answers[id] = { text: reading.value.toFixed(1), unit: reading.unit, readingId: reading.id };
	}
	await ask(page, `/api/attempts/${attemptId}/drafts`, { answers }, 'PUT');
	await page.goto(`/learn/attempts/${attemptId}`);
	await expectSweeping(page);
	await expect(page.getByText('attached to 2')).toBeVisible();
	await handIn(page);
	await expect(page.getByRole('heading', { level: 1 })).toContainText(/lead/i);
	await page.getByRole('button', { name: /attempt, fresh signal$/ }).click();
	await expect(page).toHaveURL(/\/learn\/attempts\/\d+$/);
	await expect(page.getByText(/^Work order 6\.1, (second|third) attempt/)).toBeVisible();
});
