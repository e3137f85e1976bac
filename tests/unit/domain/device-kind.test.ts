import fc from 'fast-check';
import { expect, it } from 'vitest';
import { deviceKinds } from '$lib/schemas/device-kind';
import { asDeviceKind, deviceKind } from '$lib/server/domain/device-kind';

// From memory, the usual shapes of these headers; versions are of no account.
it.each([
	[
		'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/1 Safari/537.36',
		'computer'
	],
	['Mozilla/5.0 (Windows NT 10.0; Win64; x64; rv:1.0) Gecko/20100101 Firefox/1.0', 'computer'],
	['Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 Safari/605.1.15', 'computer'],
	['Mozilla/5.0 (iPhone; CPU iPhone OS 1_0 like Mac OS X) AppleWebKit/605 Mobile/15E148 Safari/604', 'phone'],
	['Mozilla/5.0 (Linux; Android 1; K) AppleWebKit/537.36 Chrome/1 Mobile Safari/537.36', 'phone'],
	['Mozilla/5.0 (Linux; Android 1; K) AppleWebKit/537.36 Chrome/1 Safari/537.36', 'tablet'],
	['Mozilla/5.0 (iPad; CPU OS 1_0 like Mac OS X) AppleWebKit/605 Mobile/15E148', 'tablet'],
	['curl/1.0', 'unknown'],
	['', 'unknown'],
	[undefined, 'unknown']
])('takes %j for a %s', (userAgent, kind) => {
	expect(deviceKind(userAgent)).toBe(kind);
});

it('makes one of its kinds of whatever a browser says, or a record holds', () => {
	fc.assert(
		fc.property(fc.string(), (text) => {
			expect(deviceKinds).toContain(deviceKind(text));
			expect(deviceKinds).toContain(asDeviceKind(text));
		})
	);
	for (const kind of deviceKinds) expect(asDeviceKind(kind)).toBe(kind);
});
