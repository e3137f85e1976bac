import { describe, expect, it } from 'vitest';
import { LeastRecentlyUsed } from '$lib/server/services/process/least-recently-used';
import { Pace } from '$lib/server/services/attempts/pace';

const never = new AbortController().signal;

describe('Pace', () => {
	it('lets bench time pass as fast as stated', async () => {
		const began = performance.now();
		const pace = new Pace(100, 10);
		for (let step = 1; step <= 5; step++) await pace.until(100 + step * 0.2, never);
		const tookMs = performance.now() - began;
		expect(tookMs).toBeGreaterThan(95);
		expect(tookMs).toBeLessThan(250);
	});

	it('does not make up for a reader that kept it waiting', async () => {
		const pace = new Pace(0, 1);
		await new Promise((resume) => setTimeout(resume, 400));
		await pace.until(0.01, never);
		const began = performance.now();
		await pace.until(0.31, never);
		expect(performance.now() - began).toBeGreaterThan(150);
	});

	it('wakes at once when it is called off', async () => {
		const controller = new AbortController();
		setTimeout(() => controller.abort(), 20);
		const began = performance.now();
		await expect(new Pace(0, 1).until(60, controller.signal)).rejects.toThrow();
		expect(performance.now() - began).toBeLessThan(1000);
	});
});

describe('LeastRecentlyUsed', () => {
	it('forgets the entry unused for longest, and makes it again when asked', () => {
		const made: string[] = [];
		const cache = new LeastRecentlyUsed<string, string>(2);
		const get = (key: string) => cache.get(key, () => (made.push(key), key.toUpperCase()));
		expect(['a', 'b', 'a', 'c', 'a', 'b'].map(get)).toEqual(['A', 'B', 'A', 'C', 'A', 'B']);
		expect(made).toEqual(['a', 'b', 'c', 'b']);
	});
});
