import { describe, expect, expectTypeOf, it } from 'vitest';
import type { ReadingRequest as MeasureRequest } from '$lib/measure/reading-request';
import { readers } from '$lib/measure/readers';
import type { Trace } from '$lib/measure/trace';
import { benchRequest, readingRequest, type ReadingRequest } from '$lib/schemas/reading';
import { trace as traceSchema, type TraceInput } from '$lib/schemas/trace';

const issueOf = (input: unknown): string => {
	const parsed = readingRequest.safeParse(input);
	if (parsed.success) return 'accepted';
	const { path, message } = parsed.error.issues[0];
	return `${path.join('.')}: ${message}`;
};

describe('readingRequest', () => {
	it('has the shapes that measure reads, in both directions', () => {
		expectTypeOf<ReadingRequest>().toExtend<MeasureRequest>();
		expectTypeOf<MeasureRequest>().toExtend<ReadingRequest>();
		expectTypeOf<TraceInput>().toExtend<Trace>();
		const kinds = readingRequest.options.map((option) => option.shape.kind.value);
		expect(new Set(kinds)).toEqual(new Set(Object.keys(readers)));
	});
	it.each<[unknown, string]>([
		[{ kind: 'marker', atHz: 1e6, colour: 'red' }, 'colour'],
		[{ kind: 'marker' }, 'atHz'],
		[{ kind: 'marker', atHz: 1e6, atS: 1 }, 'atHz'],
		[{ kind: 'delta', fromHz: 1e6, toS: 1 }, 'fromHz'],
		[{ kind: 'channel-power', centreHz: 1e6, widthHz: 0 }, 'widthHz'],
		[{ kind: 'band-power', startHz: 2e6, stopHz: 1e6 }, 'stopHz'],
		[{ kind: 'occupied-bandwidth', percent: 100 }, 'percent'],
		[{ kind: 'occupied-bandwidth', percent: 99, widthHz: 1e6 }, 'centreHz'],
		[{ kind: 'next-peak', fromHz: 1e6, side: 'left' }, 'side'],
		[{ kind: 'phase-noise', carrierHz: 1e6, offsetHz: 0 }, 'offsetHz'],
		[{ kind: 'intercept', lowerHz: 2e6, upperHz: 1e6 }, 'upperHz'],
		[{ kind: 'mask', limits: [{ startHz: 2e6, stopHz: 1e6, levelDbm: 0 }] }, 'limits.0.stopHz'],
		[{ kind: 'bandwidth' }, 'kind']
	])('refuses %j by the name of the field', (input, field) => expect(issueOf(input)).toContain(field));
	it('leaves the frequency count to the bench: no trace can give it', () => {
		const count = { kind: 'count', atHz: 1e6, gateS: 0.1 };
		expect(issueOf(count)).toContain('kind');
		expect(benchRequest.safeParse(count).success).toBe(true);
	});
});

describe('trace', () => {
	const trace = {
		startHz: 0,
		stopHz: 1e6,
		rbwHz: 1e3,
		detector: 'sample',
		scale: 'log',
		levelsDbm: [-50, -51]
	};
	it('takes a trace with what it must have', () => expect(traceSchema.safeParse(trace).success).toBe(true));
	it.each<[Record<string, unknown>, string]>([
		[{ levelsDbm: [-50] }, 'levelsDbm'],
		[{ levelsDbm: [-50, null] }, 'levelsDbm'],
		[{ stopHz: -1 }, 'stopHz'],
		[{ startHz: 2e6 }, 'stopHz'],
		[{ detector: 'quasi-peak' }, 'detector'],
		[{ rbw: 1 }, 'rbw']
	])('refuses a trace with %j by the name of the field', (change, field) => {
		const { path, message } = traceSchema.safeParse({ ...trace, ...change }).error!.issues[0];
		expect(`${path.join('.')}: ${message}`).toContain(field);
	});
});
