/** How a person goes about the bench page: signing in, starting an exercise, setting up, reading, answering. */
import AxeBuilder from '@axe-core/playwright';
import { expect, type Locator, type Page } from '@playwright/test';
import type { AttemptResponse, AttemptView } from '$lib/schemas/attempt';
import { ready } from './ready';

const PASSWORD = 'nine-quiet-carriers';
const origin = process.env.E2E_ORIGIN ?? '';

/** What the policy stopped, and what the page threw, on any page from here on. */
export async function collectFaults(page: Page): Promise<string[]> {
	const faults: string[] = [];
	await page.exposeFunction('noteFault', (fault: string) => faults.push(fault));
	await page.addInitScript(() => {
		document.addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI }) =>
			(window as unknown as { noteFault(fault: string): void }).noteFault(
				`${violatedDirective} ${blockedURI}`
			)
		);
	});
	page.on('pageerror', (error) => faults.push(error.message));
	return faults;
}

export async function expectAccessible(page: Page): Promise<void> {
	// No page here has frames: without the pass that gathers from them it needs no second page.
	const axe = new AxeBuilder({ page }).setLegacyMode().options({ resultTypes: ['violations'] });
	const { violations } = await axe.analyze();
	expect(violations.map(({ id, nodes }) => [id, nodes.map(({ html }) => html)])).toEqual([]);
}

/** Signs in without the form, which has tests of its own. */
export async function signIn(page: Page, email: string): Promise<void> {
	const { request } = page.context();
	const signedIn = await request.post('/sign-in', {
		form: { email, password: PASSWORD },
		headers: { origin, accept: 'text/html' },
		maxRedirects: 0
	});
	expect(signedIn.status()).toBe(303);
}

/** What the page's own script would ask of the server; throws unless it was done. */
export async function ask<T>(page: Page, path: string, data: unknown = {}, method = 'POST'): Promise<T> {
	const answer = await page.context().request.fetch(path, { method, data, headers: { origin } });
	expect(answer.ok(), `${path} ${answer.status()}`).toBe(true);
	return (await answer.json()) as T;
}

export const TAUGHT = 'channel-power-behind-a-lead';

/** Starts the exercise, or finds the attempt at it that is open. */
export const startAttempt = async (page: Page, exercise = TAUGHT): Promise<AttemptView> =>
	(await ask<AttemptResponse>(page, '/api/attempts', { exercise })).attempt;

/** What was drawn on a bench with the set-up that the lesson teaches, in averages of 16, without drawing it here. */
export async function sweepAsTaught(page: Page, attemptId: number, channelHz: number): Promise<void> {
	const settings = {
		centreHz: channelHz,
		spanHz: 80e3,
		rbwHz: 300,
		sweepTimeS: 1,
		detector: 'average',
		scale: 'power',
		traces: [{ mode: 'average', count: 16 }]
	};
	const answer = await page.context().request.post(`/api/attempts/${attemptId}/sweeps`, {
		data: { settings, from: 0, sweeps: 16 },
		headers: { origin },
		timeout: 60_000
	});
	expect(answer.ok()).toBe(true);
	await answer.body();
	await ask(page, `/api/attempts/${attemptId}/acknowledgements`, { row: 15 });
}

/** Opens the exercise's bench and waits until sweeps come. */
export async function openBench(page: Page, exercise = TAUGHT): Promise<void> {
	await page.goto(`/learn/attempts/${(await startAttempt(page, exercise)).id}`);
	await expectSweeping(page);
}

export async function expectSweeping(page: Page): Promise<void> {
	await ready(page);
	await expect(page.getByText(/^Sweep \d+/)).toBeVisible({ timeout: 20_000 });
}

/** What the work order says of channel and lead. */
export async function order(page: Page): Promise<{ channel: string; leadDb: number }> {
	const text = await page.locator('.situation').innerText();
	const channel = /channel at ([\d.]+) MHz/.exec(text)?.[1];
	const lead = /loses ([\d.]+) dB/.exec(text)?.[1];
	if (!channel || !lead) throw new Error(`No channel or lead in: ${text}`);
	return { channel: `${channel} MHz`, leadDb: Number(lead) };
}

export const setUpField = (page: Page, name: string): Locator =>
	page.getByRole('group', { name: 'Set-up' }).getByRole('textbox', { name: new RegExp(`^${name}(,|$)`) });

/** Types a value into a blank of the set-up and sets it. */
export async function setUp(page: Page, name: string, text: string): Promise<void> {
	const field = setUpField(page, name);
	await field.fill(text);
	await field.press('Enter');
	await expect(field).not.toHaveAttribute('aria-invalid', 'true');
}

export async function averageTraceOne(page: Page, count: number): Promise<void> {
	await page.getByRole('button', { name: /Trace 1/ }).click();
	await page.getByLabel('Shows').selectOption('average');
	await page.getByLabel('Sweeps averaged').fill(String(count));
	await page.getByLabel('Sweeps averaged').press('Enter');
	await page.keyboard.press('Escape');
}

/** The set-up the lesson teaches, quick enough for a test: 300 Hz is narrow against 25 kHz, and 16 averages settle it. */
export async function setUpAsTaught(page: Page): Promise<void> {
	const { channel } = await order(page);
	await setUp(page, 'Centre', channel);
	await setUp(page, 'Span', '80 kHz');
	await setUp(page, 'Resolution bandwidth', '300 Hz');
	await setUp(page, 'Sweep time', '1 s');
	await averageTraceOne(page, 16);
}

export async function startReading(
	page: Page,
	kind: string,
	fields: Record<string, string>,
	act = 'Start the reading'
): Promise<void> {
	await page.getByRole('button', { name: 'Reading', exact: true }).click();
	await page
		.getByRole('group', { name: 'Start a reading' })
		.getByRole('button', { name: new RegExp(`^${kind}`) })
		.click();
	const form = page.getByRole('group', { name: 'Start a reading' });
	for (const [label, text] of Object.entries(fields))
		await form.getByLabel(label, { exact: true }).fill(text);
	await form.getByRole('button', { name: act, exact: true }).click();
}

export const readingRow = (page: Page, words: string | RegExp): Locator =>
	page.getByRole('region', { name: 'Readings' }).getByRole('row').filter({ hasText: words }).first();

/** Waits until every average holds all its sweeps. */
export const expectAveraged = (page: Page, count: number): Promise<void> =>
	expect(page.getByText(`${count} of ${count}`)).toBeVisible({ timeout: 90_000 });

/** Attaches a row to an answer and gives the value that the server took. */
export async function attach(page: Page, row: Locator, question: number): Promise<number> {
	await row.getByRole('button', { name: /^Attach/ }).click();
	await page
		.getByRole('group', { name: 'Attach to which answer?' })
		.getByRole('button')
		.nth(question - 1)
		.click();
	const taken = page
		.getByRole('region', { name: 'Readings' })
		.getByRole('row')
		.filter({ hasText: `attached to ${question}` });
	await expect(taken).toBeVisible();
	return valueOf(taken);
}

export async function valueOf(row: Locator): Promise<number> {
	const figure = await row.locator('td.value').innerText();
	return Number(figure.replace('−', '-'));
}

/** A number as the answer field takes it, with the true minus. */
export const figure = (value: number): string => value.toFixed(1).replace('-', '−');

export const answerField = (page: Page, question: number): Locator =>
	page
		.getByRole('region', { name: 'Work order' })
		.locator('.question')
		.nth(question - 1)
		.getByRole('textbox');

export async function handIn(page: Page): Promise<void> {
	await page.getByRole('button', { name: 'Hand in', exact: true }).click();
	// By key: a click right after the first counts as its double click and does nothing.
	await page.getByRole('button', { name: 'Hand in now' }).press('Enter');
	await expect(page).toHaveURL(/\/finding$/, { timeout: 45_000 });
}
