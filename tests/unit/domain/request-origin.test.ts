import { describe, expect, it } from 'vitest';
import { refusedOrigin } from '$lib/server/domain/request-origin';

const OWN = 'https://bench.example';

describe('refusedOrigin(source, ownOrigin)', () => {
	it.each(['GET', 'HEAD', 'OPTIONS'])('lets %s through from anywhere', (method) => {
		expect(
			refusedOrigin({ method, origin: 'https://evil.example', fetchSite: 'cross-site' }, OWN)
		).toBeNull();
	});

	it.each(['POST', 'PUT', 'PATCH', 'DELETE', 'post', 'PROPFIND'])('asks %s for its origin', (method) => {
		expect(refusedOrigin({ method, origin: OWN, fetchSite: null }, OWN)).toBeNull();
		expect(refusedOrigin({ method, origin: 'https://evil.example', fetchSite: null }, OWN)).toContain(OWN);
	});

	it.each([
		['null', null],
		['', null],
		['http://bench.example', null],
		['https://bench.example:444', null],
		['https://bench.example.evil.example', null],
		['https://evil.example', 'same-origin'],
		[null, null],
		[null, 'cross-site'],
		[null, 'same-site'],
		[null, 'none']
	])('refuses Origin %j with Sec-Fetch-Site %j', (origin, fetchSite) => {
		expect(refusedOrigin({ method: 'POST', origin, fetchSite }, OWN)).toContain(OWN);
	});

	it('takes a browser at its word that sends no Origin but says same-origin', () => {
		expect(refusedOrigin({ method: 'POST', origin: null, fetchSite: 'same-origin' }, OWN)).toBeNull();
	});
});
