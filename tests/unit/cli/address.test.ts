import { createServer, type Server } from 'node:net';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { chooseAddress } from '../../../src/cli/app/address';

let taken: Server;
let port: number;
beforeEach(async () => {
	taken = createServer();
	await new Promise<void>((resolve) => taken.listen(0, '127.0.0.1', resolve));
	port = (taken.address() as { port: number }).port;
});
afterEach(() => new Promise((resolve) => taken.close(resolve)));

describe('chooseAddress(env, firstPort)', () => {
	it('passes over a port that is taken when none was asked for', async () => {
		const address = await chooseAddress({}, port);
		expect(address.port).toBeGreaterThan(port);
		expect(address.origin).toBe(`http://127.0.0.1:${address.port}`);
	});

	it('refuses a port that was asked for and is taken', async () => {
		await expect(chooseAddress({ PORT: String(port) }, 3000)).rejects.toThrow(/taken/);
	});

	it('refuses a PORT that is no number', async () => {
		await expect(chooseAddress({ PORT: '80a' }, 3000)).rejects.toThrow(/PORT must be/);
	});

	it('keeps the origin it was given, and makes one that can be typed for a server on all interfaces', async () => {
		expect((await chooseAddress({ ORIGIN: 'https://bench.example.org' }, port)).origin).toBe(
			'https://bench.example.org'
		);
		expect((await chooseAddress({ HOST: '0.0.0.0' }, port)).origin).toMatch(/^http:\/\/localhost:/);
	});
});
