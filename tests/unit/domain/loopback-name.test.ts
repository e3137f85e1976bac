import { describe, expect, it } from 'vitest';
import { properOrigin } from '$lib/server/domain/loopback-name';

const origin = 'http://127.0.0.1:3000';

describe('properOrigin(host, origin)', () => {
	it('is ours for another name of this machine', () => {
		expect(properOrigin('localhost:3000', origin)).toBe(origin);
		expect(properOrigin('127.0.0.1:8080', 'http://localhost:8080')).toBe('http://localhost:8080');
	});
	it.each([
		null,
		'127.0.0.1:3000',
		'localhost:3001',
		'localhost',
		'evil.example:3000',
		'localhost.evil.example:3000'
	])('leaves %s alone', (host) => expect(properOrigin(host, origin)).toBeNull());
	it('never sends anybody to an address that is no loopback', () =>
		expect(properOrigin('localhost:3000', 'https://bench.example.org')).toBeNull());
});
