import { describe, expect, it } from 'vitest';
import { benchRequest } from '$lib/schemas/reading';
import { offeredKinds, type ReadingContext } from '$lib/components/bench/readings/reading-kinds';
import { resolved } from './resolved-settings';

const limits = [{ startHz: 449e6, stopHz: 451e6, levelDbm: -36 }];
const kindsOf = (context: ReadingContext) =>
	offeredKinds(context).flatMap(({ kinds }) => kinds.map(({ kind }) => kind));
const overTime = { ...resolved, spanHz: 0, startHz: 450e6, stopHz: 450e6 };

describe('offeredKinds(context)', () => {
	it('offers the mask only where the order sets one', () => {
		expect(kindsOf({ resolved })).not.toContain('mask');
		expect(kindsOf({ resolved, limits })).toContain('mask');
	});
	it('offers times in span 0 alone, and nothing there that needs a span', () => {
		expect(kindsOf({ resolved })).not.toContain('time');
		expect(kindsOf({ resolved: overTime, limits })).toEqual(['count', 'time']);
	});
	it('starts every form from values that the server takes', () => {
		const contexts = [{ resolved, limits, markerHz: 450e6 }, { resolved: overTime }];
		for (const context of contexts) {
			for (const { kinds } of offeredKinds(context)) {
				for (const kind of kinds) {
					const request = kind.request(kind.start(context), context);
					expect(benchRequest.safeParse(request).error, kind.kind).toBeUndefined();
				}
			}
		}
	});
});
