import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '$lib/server/domain/role';

import { checksums, createSweptAttempt, post, posts, refused } from './attempt-endpoints';

let actor: Actor;
let id: string;
beforeAll(async () => {
	({ actor, id } = await createSweptAttempt());
});

/** Any JSON, or a body it likes with one part of it bent. */
const bent = (good: unknown) =>
	fc.oneof(
		fc.jsonValue(),
		fc.tuple(fc.nat(), hostile).map(([place, value]) => withPart(structuredClone(good), place, value))
	);
const hostile = fc.oneof(
	fc.jsonValue({ maxDepth: 2 }),
	fc.constantFrom<unknown>(
		-1,
		1e308,
		-0,
		2 ** 53,
		0.5,
		null,
		true,
		[],
		{},
		'',
		'\u0000',
		'a'.repeat(5000),
		'=1+1',
		'__proto__',
		{ $ne: null },
		[1, 2],
		"'; DROP TABLE attempts; --"
	)
);

/** `value` put in the place of the n-th part of a structure (or beside it, under a strange name). */
function withPart(whole: unknown, n: number, value: unknown): unknown {
	const places: [Record<string, unknown>, string][] = [];
	const visit = (part: unknown): void => {
		if (typeof part !== 'object' || part === null) return;
		for (const key of Object.keys(part)) {
			places.push([part as Record<string, unknown>, key]);
			visit((part as Record<string, unknown>)[key]);
		}
		places.push([part as Record<string, unknown>, 'constructor']);
	};
	visit(whole);
	const [holder, key] = places[n % places.length];
	holder[key] = value;
	return whole;
}

describe('endpoints of attempts', () => {
	it.each(Object.keys(posts))(
		'%s: bad input is refused with a reason, changes nothing and never gives 500',
		async (name) => {
			const own = await createSweptAttempt();
			let before = await checksums();
			let refusals = 0;
			await fc.assert(
				fc.asyncProperty(bent(posts[name].good()), async (body) => {
					const response = await post(name, own.actor, own.id, body);
					expect(response.status).toBeLessThan(500);
					if (response.ok) {
						// Bent, and yet what it asks for: a lower row, a draft in other words.
						await response.body?.cancel();
						before = await checksums();
						return;
					}
					refusals += 1;
					await refused(response);
					expect(await checksums()).toEqual(before);
				}),
				{ numRuns: 200 }
			);
			expect(refusals).toBeGreaterThan(120);
		},
		180_000
	);

	it.each(Object.keys(posts))('%s: what is no JSON, or too long, is refused', async (name) => {
		for (const body of ['', '{', 'null', '[]', '"x"', 'ÿþ', `{"a":"${'x'.repeat(70_000)}"}`]) {
			const response = await post(name, actor, id, body);
			expect([400, 422]).toContain(response.status);
			await refused(response);
		}
	});
});
