import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { DomainError, type DomainErrorCode } from '$lib/server/errors';
import { reportError } from '$lib/server/hooks/report-error';
import { readForm } from '$lib/server/read-form';
import { parseWith, readJson } from '$lib/server/read-json';
import { refusalOf, respond, respondJson, respondWith } from '$lib/server/respond';

const refuse = (error: unknown) => () => {
	throw error;
};
const statuses: [DomainErrorCode, number][] = [
	['malformed', 400],
	['unauthenticated', 401],
	['forbidden', 403],
	['not_found', 404],
	['conflict', 409],
	['invalid', 422],
	['too_many', 429]
];
const bug = new Error('password=secret at db.example');

describe('respond', () => {
	it.each(statuses)('turns %s into %i, for loads, endpoints and forms alike', async (code, status) => {
		const issues = [{ field: 'spanHz', message: 'must be positive' }];
		const refused = new DomainError(code, 'Because.', { issues });
		await expect(respond(refuse(refused))).rejects.toMatchObject({
			status,
			body: { message: 'Because.', issues }
		});
		const response = await respondJson(refuse(refused));
		expect([response.status, await response.json()]).toEqual([status, { message: 'Because.', issues }]);
		expect(refusalOf(refused)).toMatchObject({ status, message: 'Because.', issues });
	});

	it('says when to come back, and what the state is', async () => {
		const refused = new DomainError('conflict', 'Not that row.', {
			retryAfterS: 7,
			details: { nextRow: 12 }
		});
		const response = await respondWith(refuse(refused));
		expect(response.headers.get('retry-after')).toBe('7');
		expect(await response.json()).toEqual({ message: 'Not that row.', nextRow: 12 });
	});

	it('passes results on', async () => {
		expect(await respond(() => 7)).toBe(7);
		const response = await respondJson(() => ({ id: 7 }), 201);
		expect([response.status, await response.json()]).toEqual([201, { id: 7 }]);
	});

	it('lets bugs through as they are', async () => {
		await expect(respond(refuse(bug))).rejects.toBe(bug);
		await expect(respondJson(refuse(bug))).rejects.toBe(bug);
		expect(() => refusalOf(bug)).toThrow(bug);
	});
});

describe('readJson(request, schema)', () => {
	const schema = z.object({ settings: z.object({ spanHz: z.number().positive('must be positive') }) });
	const send = (body: string, type = 'application/json') =>
		readJson(
			new Request('http://a.example', { method: 'POST', body, headers: { 'content-type': type } }),
			schema
		);

	it('gives what fits', async () => {
		expect(await send('{"settings":{"spanHz":5},"more":1}')).toEqual({ settings: { spanHz: 5 } });
	});

	it.each(['', '{', 'undefined', '{"a":1}}', '<p>'])('refuses %j as malformed', async (body) => {
		await expect(send(body)).rejects.toMatchObject({ code: 'malformed' });
	});

	it('takes only what is called JSON', async () => {
		const body = '{"settings":{"spanHz":5}}';
		await expect(send(body, 'application/json; charset=utf-8')).resolves.toBeDefined();
		for (const type of ['text/plain', 'application/jsonp', '']) {
			await expect(send(body, type)).rejects.toMatchObject({ code: 'malformed' });
		}
	});

	it('names a field that nothing asks for', async () => {
		const strict = z.strictObject({ input: z.strictObject({ padDb: z.number() }) });
		expect(() => parseWith(strict, { input: { padDb: 1, pads: 2 }, more: 1 })).toThrow(
			expect.objectContaining({
				issues: [expect.objectContaining({ field: 'input.pads' }), expect.objectContaining({ field: 'more' })]
			})
		);
	});

	it('names the field that is wrong', async () => {
		const issues = [{ field: 'settings.spanHz', message: 'must be positive' }];
		await expect(send('{"settings":{"spanHz":-5}}')).rejects.toMatchObject({ code: 'invalid', issues });
	});

	it.each(['null', '[]', '7', '"a"', '{"settings":null}', '{"__proto__":{"settings":{"spanHz":5}}}'])(
		'refuses %s as invalid',
		async (body) => {
			await expect(send(body)).rejects.toMatchObject({ code: 'invalid' });
		}
	);
});

describe('readForm(request)', () => {
	it('gives the fields of a form', async () => {
		const body = new URLSearchParams({ a: '1', b: '2' });
		expect(await readForm(new Request('http://a.example', { method: 'POST', body }))).toEqual({
			a: '1',
			b: '2'
		});
	});

	it.each(['text/plain', 'application/json', 'multipart/form-data', 'multipart/form-data; boundary=x'])(
		'refuses a body that is no form, sent as %s',
		async (type) => {
			const request = new Request('http://a.example', {
				method: 'POST',
				body: '--x\r\n',
				headers: { 'content-type': type }
			});
			await expect(readForm(request)).rejects.toMatchObject({ code: 'malformed' });
		}
	);
});

describe('reportError', () => {
	const event = {
		request: new Request('http://a.example/learn?token=secret', { method: 'GET' }),
		url: new URL('http://a.example/learn?token=secret'),
		route: { id: '/learn' },
		locals: { actor: { id: 7 } }
	} as unknown as Parameters<typeof reportError>[0]['event'];

	it('shows an id and none of the cause, and logs the cause under that id in one line', () => {
		const log = vi.spyOn(console, 'error').mockImplementation(() => {});
		const shown = reportError({ error: bug, event, status: 500, message: 'Internal Error' });
		const [line] = log.mock.calls[0] as [string];
		log.mockRestore();
		expect(JSON.stringify(shown)).not.toContain('secret');
		expect(line).not.toContain('\n');
		expect(line).not.toContain('token');
		expect(JSON.parse(line)).toMatchObject({
			id: (shown as { id: string }).id,
			actorId: 7,
			cause: expect.stringContaining('db.example')
		});
	});

	it('gives no id to a page that is not there, and logs nothing', () => {
		const log = vi.spyOn(console, 'error').mockImplementation(() => {});
		const shown = reportError({ error: new Error('Not found'), event, status: 404, message: 'Not Found' });
		expect(shown).toEqual({ message: 'There is no such page.' });
		expect(log).not.toHaveBeenCalled();
		log.mockRestore();
	});
});
