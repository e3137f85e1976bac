import { expect, test } from '@playwright/test';
import { rawRequest } from './raw-request';

const own = process.env.E2E_ORIGIN ?? '';

const responses: [string, string, string, Record<string, string>][] = [
	['the front page', 'GET', '/', {}],
	['a form', 'GET', '/sign-in', {}],
	['a redirection', 'GET', '/admin', {}],
	['a page that is not there', 'GET', '/nothing/here', {}],
	['data of a page', 'GET', '/sign-in/__data.json', {}],
	['a refused request', 'POST', '/sign-in', { origin: 'https://evil.example' }],
	['a body that can’t be read', 'POST', '/scheme', { origin: own, 'content-type': 'application/json' }]
];

for (const [what, method, path, headers] of responses) {
	test(`${what} has every security header`, async () => {
		const response = await rawRequest(method, path, headers);
		const policy = String(response.headers['content-security-policy']);
		expect(policy).toContain("frame-ancestors 'none'");
		expect(policy).toContain("base-uri 'none'");
		expect(policy).not.toContain("'unsafe-eval'");
		expect(policy.replace("style-src-attr 'unsafe-inline'", '')).not.toContain("'unsafe-inline'");
		expect(response.headers).toMatchObject({
			'x-content-type-options': 'nosniff',
			'referrer-policy': 'same-origin',
			'cross-origin-opener-policy': 'same-origin',
			'cache-control': expect.stringContaining('no-store')
		});
	});
}

test('each page has a nonce of its own', async () => {
	const nonces = [];
	for (let i = 0; i < 3; i += 1) {
		const { headers, body } = await rawRequest('GET', '/sign-in');
		const nonce = /script-src 'self' 'nonce-([^']+)'/.exec(String(headers['content-security-policy']))?.[1];
		expect(body).toContain(`nonce="${nonce}"`);
		nonces.push(nonce);
	}
	expect(new Set(nonces).size).toBe(3);
});
