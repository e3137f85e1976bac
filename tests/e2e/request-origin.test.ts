import { expect, test } from '@playwright/test';
import { rawRequest } from './raw-request';

const own = process.env.E2E_ORIGIN ?? '';

/** A form action, endpoints and a path with nothing behind it. */
const paths = ['/sign-in', '/scheme', '/sign-out', '/api/attempts', '/nothing/here'];

const bodies: [string, Record<string, string>, string | undefined][] = [
	['a form', { 'content-type': 'application/x-www-form-urlencoded' }, 'scheme=night&email=a&password=b'],
	['a multipart form', { 'content-type': 'multipart/form-data; boundary=x' }, '--x--\r\n'],
	['text', { 'content-type': 'text/plain' }, 'scheme=night'],
	['JSON', { 'content-type': 'application/json' }, '{}'],
	['a body of no type', {}, 'scheme=night'],
	['no body', {}, undefined]
];

const foreign: [string, Record<string, string>][] = [
	['another site', { origin: 'https://evil.example' }],
	['another port', { origin: own.replace(/:\d+$/, ':1') }],
	['another scheme', { origin: own.replace('http:', 'https:') }],
	['a name that begins alike', { origin: `${own}.evil.example` }],
	['“null”', { origin: 'null' }],
	['nowhere', {}],
	['nowhere, said to be cross-site', { 'sec-fetch-site': 'cross-site' }],
	['nowhere, said to be same-site', { 'sec-fetch-site': 'same-site' }],
	[
		'another site, said to be same-origin',
		{ origin: 'https://evil.example', 'sec-fetch-site': 'same-origin' }
	]
];
const ownPages: [string, Record<string, string>][] = [
	['our own origin', { origin: own }],
	['nowhere, said to be same-origin', { 'sec-fetch-site': 'same-origin' }]
];

for (const path of paths) {
	test(`POST ${path} is refused from elsewhere, whatever it carries`, async () => {
		for (const [where, source] of foreign) {
			for (const [what, type, body] of bodies) {
				const { status, headers } = await rawRequest('POST', path, { ...source, ...type }, body);
				expect({ where, what, status, cookie: headers['set-cookie'] }).toEqual({
					where,
					what,
					status: 403,
					cookie: undefined
				});
			}
		}
	});

	test(`POST ${path} is read from our own pages, and never breaks on what it carries`, async () => {
		for (const [where, source] of ownPages) {
			for (const [what, type, body] of bodies) {
				const { status } = await rawRequest('POST', path, { ...source, ...type }, body);
				expect([where, what, status]).not.toContain(403);
				expect(status, `${where}, ${what}`).toBeLessThan(500);
			}
		}
	});
}

test('other methods that change things are refused from elsewhere too', async () => {
	for (const method of ['PUT', 'PATCH', 'DELETE']) {
		expect((await rawRequest(method, '/scheme', { origin: 'https://evil.example' })).status).toBe(403);
		expect((await rawRequest(method, '/scheme', { origin: own })).status).toBe(405);
	}
});

test('the refusal is a page for people and JSON for programs, with the address to use instead', async () => {
	const source = { origin: 'https://evil.example', 'content-type': 'text/plain' };
	const page = await rawRequest('POST', '/sign-in', { ...source, accept: 'text/html,*/*' }, '');
	expect(page.headers['content-type']).toContain('text/html');
	expect(page.body).toContain(own);
	const data = await rawRequest('POST', '/sign-in', { ...source, accept: 'application/json' }, '');
	expect(JSON.parse(data.body)).toEqual({ message: expect.stringContaining(own) });
});
