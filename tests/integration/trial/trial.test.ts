import type { RequestEvent } from '@sveltejs/kit';
import { QueryTypes } from 'sequelize';
import { beforeAll, describe, expect, it } from 'vitest';
import { problemResponse } from '$lib/schemas/attempt';
import { trialFinding, trialSweep, trialView, type TrialView } from '$lib/schemas/trial';
import { seal, unseal } from '$lib/server/auth/seal';
import { sequelize } from '$lib/server/db/connection';
import { offerTrial } from '$lib/server/services/trial/offer-trial';
import { startTrial } from '$lib/server/services/trial/start-trial';
import { createCourse } from '../../factories/course';
import { POST as start } from '../../../src/routes/api/trial/+server';
import { POST as answers } from '../../../src/routes/api/trial/answers/+server';
import { POST as rows } from '../../../src/routes/api/trial/rows/+server';

type Handler = (event: RequestEvent) => Promise<Response>;
const now = new Date('2026-03-02T10:00:00Z');
const later = new Date('2026-03-02T12:30:00Z');
let address = 0;
/** Each test asks from an address of its own, so that none uses up another's share. */
const newAddress = () => `198.51.${100 + (address >> 8)}.${address++ & 255}`;

function ask(handler: unknown, body: unknown, from = newAddress()): Promise<Response> {
	const request = new Request('http://bench.example/api/trial', {
		method: 'POST',
		body: typeof body === 'string' ? body : JSON.stringify(body),
		headers: { 'content-type': 'application/json' }
	});
	return (handler as Handler)({ request, getClientAddress: () => from } as unknown as RequestEvent);
}
const started = async (): Promise<TrialView> => trialView.parse(await (await ask(start, {})).json());
const answerTo = (view: TrialView, over: Record<string, unknown> = {}) => ({
	token: view.token,
	text: '-23',
	unit: view.unit,
	looks: [{ choice: 0, sweeps: 1 }],
	row: 0,
	fromHz: view.startHz + 10e3,
	toHz: view.stopHz - 10e3,
	...over
});

it('offers nothing while no exercise is open to trial, and the front page goes without', async () => {
	expect(await offerTrial(newAddress(), now)).toBeNull();
	const refused = await ask(start, {});
	expect(refused.status).toBe(404);
});

describe('with an exercise open to trial', () => {
	beforeAll(async () => {
		await createCourse({
			trial: {
				question: 'power',
				text: 'How strong is this carrier?',
				resolutionsHz: [30e3, 3e3],
				settings: { spanHz: 400e3, points: 201 }
			}
		});
	});

	it('gives everyone a signal of their own, and stores nothing of it', async () => {
		await started();
		const tables = await sequelize.query<{ name: string }>(
			'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE()',
			{ type: QueryTypes.SELECT }
		);
		const names = tables.map(({ name }) => `\`${name}\``).join(', ');
		const sums = () => sequelize.query(`CHECKSUM TABLE ${names}`, { type: QueryTypes.SELECT });
		const before = await sums();
		const [one, other] = [await started(), await started()];
		await ask(rows, { token: one.token, choice: 1, row: 4 });
		await ask(answers, answerTo(one));
		expect(one.first.levelsDbm).not.toEqual(other.first.levelsDbm);
		expect(await sums()).toEqual(before);
	});

	it('sweeps the same signal again and again, the same row always the same', async () => {
		const { token, first } = await started();
		const row = async (choice: number, n: number) =>
			trialSweep.parse(await (await ask(rows, { token, choice, row: n })).json());
		expect(await row(0, 0)).toEqual(first);
		expect((await row(0, 1)).levelsDbm).not.toEqual(first.levelsDbm);
		expect(await row(1, 7)).toEqual(await row(1, 7));
	});

	it('grades an answer as everybody’s are graded', async () => {
		const response = await ask(answers, answerTo(await started()));
		expect(response.status).toBe(200);
		const finding = trialFinding.parse(await response.json());
		expect(finding.yours).toMatchObject({ value: -23, unit: 'dBm' });
		expect(finding.difference).toBeCloseTo(-23 - finding.true.value, 9);
	});

	it('tells neither seed nor truth before an answer', async () => {
		const view = await started();
		const { difference: _, true: truth } = trialFinding.parse(
			await (await ask(answers, answerTo(view))).json()
		);
		const words = JSON.stringify({ ...view, token: '', first: { ...view.first, levelsDbm: [] } });
		expect(words).not.toContain(String(truth.value));
		expect(words).not.toMatch(/seed|scene|emitters/);
	});

	it('refuses what it can’t do, and names it', async () => {
		const view = await started();
		const cases: [unknown, unknown, number, RegExp][] = [
			[rows, { token: view.token, choice: 2, row: 0 }, 422, /choice/],
			[rows, { token: view.token, choice: -1, row: 0 }, 422, /choice/],
			[rows, { token: view.token, choice: 0, row: 1e9 }, 422, /row/],
			[rows, { token: 'AAAA', choice: 0, row: 0 }, 409, /put away/],
			[rows, { token: view.token.slice(0, -2), choice: 0, row: 0 }, 409, /put away/],
			[rows, '{', 400, /./],
			[answers, answerTo(view, { text: 'loud' }), 422, /text/],
			[answers, answerTo(view, { text: ' ' }), 422, /text/],
			[answers, answerTo(view, { unit: 'MHz' }), 422, /unit/],
			[answers, answerTo(view, { looks: [] }), 422, /looks/],
			[answers, answerTo(view, { fromHz: 'left' }), 422, /fromHz/]
		];
		for (const [handler, body, status, words] of cases) {
			const response = await ask(handler, body);
			const text = await response.text();
			expect(response.status, text).toBe(status);
			expect(problemResponse.safeParse(JSON.parse(text)).success, text).toBe(true);
			expect(text).toMatch(words);
		}
	});

	it('puts a bench away after two hours', async () => {
		const { token } = await startTrial(newAddress(), now);
		const response = await ask(rows, { token, choice: 0, row: 0 });
		expect(response.status).toBe(409);
	});

	it('lets no address have the receiver to itself', async () => {
		const { token } = await started();
		const from = newAddress();
		const asked = await Promise.all(
			Array.from({ length: 200 }, (_, row) => ask(rows, { token, choice: 0, row }, from))
		);
		const refused = asked.filter(({ status }) => status === 429);
		expect(refused.length).toBeGreaterThan(40);
		expect(refused[0].headers.get('retry-after')).toMatch(/^\d+$/);
		expect((await ask(rows, { token, choice: 0, row: 1 })).status).toBe(200);
	});
});

describe('seal(purpose, {text, expiresAt})', () => {
	it('is opened by its own purpose alone, unchanged, and in time', async () => {
		const token = await seal('trial', { text: 'a seed', expiresAt: later });
		expect(token).not.toContain('seed');
		expect(await unseal('trial', token, now)).toBe('a seed');
		expect(await unseal('other', token, now)).toBeNull();
		expect(await unseal('trial', token, later)).toBeNull();
		for (let i = 0; i < token.length; i += 7) {
			const swapped = token[i] === 'A' ? 'B' : 'A';
			expect(await unseal('trial', token.slice(0, i) + swapped + token.slice(i + 1), now)).toBeNull();
		}
		for (const nonsense of ['', 'x', '!!!!', 'é', token.slice(0, 20)]) {
			expect(await unseal('trial', nonsense, now)).toBeNull();
		}
	});

	it('never seals twice alike', async () => {
		const [one, other] = await Promise.all(
			[1, 2].map(() => seal('trial', { text: 'same', expiresAt: later }))
		);
		expect(one).not.toBe(other);
	});
});
