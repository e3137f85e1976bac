import { expect, test, type Page } from '@playwright/test';
import { createConnection } from 'mariadb';
import { answerField, handIn, openBench, order, setUp, signIn } from './bench-page';
import { ready } from './ready';

interface Recorded {
	url: string;
	type: string;
	text: string;
}

/**
 * Every response body from here on, as text; bytes that are no text stay findable one by one. A stream that the page
 * leaves has no body to ask for afterwards, so what fetch reads is noted as it is read.
 */
async function record(page: Page): Promise<{ bodies: Recorded[]; settled: () => Promise<unknown> }> {
	const bodies: Recorded[] = [];
	const pending: Promise<void>[] = [];
	await page.exposeFunction('noteBytes', (url: string, text: string) =>
		bodies.push({ url, type: 'stream', text })
	);
	await page.addInitScript(() => {
		const { noteBytes } = window as unknown as { noteBytes(url: string, text: string): void };
		const plainFetch = window.fetch;
		window.fetch = async (...request) => {
			const response = await plainFetch(...request);
			void (async () => {
				const reader = response.clone().body?.getReader();
				let text = '';
				for (let part = await reader?.read(); part?.value; part = await reader?.read()) {
					for (const byte of part.value) text += String.fromCharCode(byte);
					noteBytes(response.url, text);
					text = text.slice(-64);
				}
			})().catch(() => undefined);
			return response;
		};
	});
	page.on('response', (response) => {
		const type = response.headers()['content-type'] ?? '';
		const note = async () => {
			bodies.push({ url: response.url(), type, text: (await response.body()).toString('latin1') });
		};
		// A redirect has no body, and a stream that was left has none any more.
		pending.push(note().catch(() => undefined));
	});
	const settled = () =>
		Promise.race([Promise.all(pending), new Promise((resolve) => setTimeout(resolve, 3000))]);
	return { bodies, settled };
}

async function seedOf(attemptId: string): Promise<string> {
	const url = new URL(process.env.DATABASE_URL ?? '');
	const connection = await createConnection({
		host: url.hostname,
		port: Number(url.port),
		user: decodeURIComponent(url.username),
		password: decodeURIComponent(url.password),
		database: url.pathname.slice(1)
	});
	try {
		const [row] = await connection.query<{ seed: string }[]>('SELECT seed FROM attempts WHERE id = ?', [
			attemptId
		]);
		return row.seed;
	} finally {
		await connection.end();
	}
}

test('neither seed nor scene nor truths reach the browser before the attempt closes', async ({ page }) => {
	test.setTimeout(300_000);
	const { bodies, settled } = await record(page);
	await signIn(page, 'bridget.hale@tarnvale.example');
	await openBench(page);
	const { channel } = await order(page);
	await setUp(page, 'Centre', channel);
	await setUp(page, 'Span', '100 kHz');
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	await page.getByRole('button', { name: /^Hints/ }).click();
	await answerField(page, 1).fill('-20');
	await answerField(page, 2).fill('-60');
	await expect(page.getByText(/^Kept \d\d:\d\d/)).toBeVisible();
	const attemptId = /attempts\/(\d+)/.exec(page.url())![1];
	await page.reload();
	await ready(page);
	await expect(answerField(page, 2)).toHaveValue('-60');
	await page.getByRole('button', { name: 'Stop' }).click();
	await settled();
	const before = [...bodies];
	const seed = await seedOf(attemptId);

	await handIn(page);
	const { finding } = await (await page.request.get(`/api/attempts/${attemptId}/finding`)).json();
	const truths: string[] = finding.questions.map((question: { true: { value: number } }) =>
		String(question.true.value).slice(0, 9)
	);

	expect(before.length).toBeGreaterThan(20);
	expect(before.some(({ url }) => url.includes('/sweeps'))).toBe(true);
	for (const { url, text } of before) {
		for (const secret of [seed, ...truths])
			expect(text.includes(secret), `${url} holds ${secret}`).toBe(false);
	}
	const data = before.filter(({ type }) => !/javascript|css|font|image/.test(type));
	for (const { url, text } of data) {
		for (const name of [
			'emitters',
			'symbolRateHz',
			'rollOff',
			'carrierDbm',
			'carrierOffsetHz',
			'neighbourHz',
			'"seed"',
			'mistakes'
		]) {
			expect(text.includes(name), `${url} speaks of ${name}`).toBe(false);
		}
	}
});
