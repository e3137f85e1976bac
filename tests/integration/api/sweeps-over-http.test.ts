import { getRequest, setResponse } from '@sveltejs/kit/node';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RequestEvent } from '@sveltejs/kit';
import { Attempt } from '$lib/server/db/models/attempt';
import type { Actor } from '$lib/server/domain/role';
import { countStreams } from '$lib/server/services/attempts/open-streams';
import { createAttempt, readStream } from '../../factories/attempt';
import { POST } from '../../../src/routes/api/attempts/[id]/sweeps/+server';

const settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };
const clockOf = async (id: number) => (await Attempt.findByPk(id, { rejectOnEmpty: true })).clockS;
const pause = (ms: number) => new Promise((resume) => setTimeout(resume, ms));

let server: Server;
let base: string;
let actor: Actor;

/** The endpoint behind a real socket, as the production server puts it there. */
beforeAll(async () => {
	server = createServer((incoming, outgoing) => {
		void (async () => {
			const request = await getRequest({ request: incoming, base });
			const id = new URL(request.url).pathname.slice(1);
			const event = { locals: { actor }, params: { id }, request, url: new URL(request.url) };
			const handler = POST as unknown as (event: RequestEvent) => Promise<Response>;
			await setResponse(outgoing, await handler(event as unknown as RequestEvent));
		})();
	});
	await new Promise<void>((resume) => server.listen(0, '127.0.0.1', resume));
	base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(() => server.close());

const ask = (id: number, body: unknown, signal?: AbortSignal) =>
	fetch(`${base}/${id}`, {
		method: 'POST',
		headers: { 'content-type': 'application/json' },
		body: JSON.stringify(body),
		signal
	});

describe('POST …/sweeps over a socket', () => {
	it('brings the rows one by one, as they are swept', async () => {
		const made = await createAttempt();
		actor = made.actor;
		const response = await ask(made.attempt.id, { settings, from: 0, sweeps: 60 });
		const began = performance.now();
		let firstMs = Infinity;
		const { rows, end } = await readStream(response.body!, (pieces) => {
			if (pieces.length > 0) firstMs = Math.min(firstMs, performance.now() - began);
			return false;
		});
		expect(rows.size).toBe(60);
		expect(end?.reason).toBe('done');
		expect(firstMs).toBeLessThan((performance.now() - began) / 2);
	});

	it('stops the receiver when the page is closed', async () => {
		const made = await createAttempt();
		actor = made.actor;
		const leaving = new AbortController();
		const response = await ask(made.attempt.id, { settings, from: 0 }, leaving.signal);
		const reader = response.body!.getReader();
		await reader.read();
		leaving.abort();
		await pause(600);
		expect(countStreams()).toBe(0);
		const clockS = await clockOf(made.attempt.id);
		await pause(400);
		expect(await clockOf(made.attempt.id)).toBe(clockS);
	});

	it('makes the bench wait for a page that has stopped reading', async () => {
		const made = await createAttempt();
		actor = made.actor;
		const leaving = new AbortController();
		// Rows so long that what the sockets hold back is soon full.
		const wide = { ...settings, points: 10_001 };
		const response = await ask(made.attempt.id, { settings: wide, from: 0 }, leaving.signal);
		await response.body!.getReader().read();
		let before = -1;
		let now = await clockOf(made.attempt.id);
		for (let second = 0; second < 15 && now !== before; second++) {
			before = now;
			await pause(1000);
			now = await clockOf(made.attempt.id);
		}
		expect(now).toBe(before);
		leaving.abort();
	});
});
