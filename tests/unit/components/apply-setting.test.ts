import { describe, expect, it } from 'vitest';
import { applySetting, expectedSettings, setAuto } from '$lib/components/bench/setup/apply-setting';
import { resolved } from './resolved-settings';

describe('applySetting(settings, resolved, field, value)', () => {
	it('keeps the span when the centre is typed over a start and a stop', () =>
		expect(applySetting({ startHz: 449e6, stopHz: 451e6 }, resolved, 'centreHz', 450.5e6)).toEqual({
			centreHz: 450.5e6,
			spanHz: resolved.spanHz
		}));

	it('keeps the stop when the start is typed over a centre and a span', () =>
		expect(applySetting({ centreHz: 450e6, spanHz: 2e6 }, resolved, 'startHz', 449.5e6)).toEqual({
			startHz: 449.5e6,
			stopHz: resolved.stopHz
		}));

	it('never leaves both pairs standing', () => {
		const changed = applySetting({ centreHz: 450e6, spanHz: 2e6, rbwHz: 300 }, resolved, 'stopHz', 451e6);
		expect(Object.keys(changed).sort()).toEqual(['rbwHz', 'startHz', 'stopHz']);
	});

	it('changes any other field alone', () =>
		expect(applySetting({ centreHz: 450e6, spanHz: 2e6 }, resolved, 'rbwHz', 300)).toEqual({
			centreHz: 450e6,
			spanHz: 2e6,
			rbwHz: 300
		}));
});

describe('setAuto(settings, resolved, field, auto)', () => {
	it('takes a field back by hand at the value that coupling had chosen', () =>
		expect(setAuto({ rbwHz: 'auto' }, resolved, 'rbwHz', false)).toEqual({ rbwHz: resolved.rbwHz }));
	it('hands a field to coupling', () =>
		expect(setAuto({ rbwHz: 300 }, resolved, 'rbwHz', true)).toEqual({ rbwHz: 'auto' }));
});

describe('expectedSettings(resolved, wanted)', () => {
	it('is what stands when nothing is on its way', () =>
		expect(expectedSettings(resolved, undefined)).toBe(resolved));
	it('moves start and stop with a typed centre', () => {
		const expected = expectedSettings(resolved, { centreHz: 500e6, spanHz: 1e6 });
		expect([expected.startHz, expected.stopHz]).toEqual([499.5e6, 500.5e6]);
	});
	it('leaves couplings as they are', () =>
		expect(expectedSettings(resolved, { spanHz: 1e6, rbwHz: 'auto' }).rbwHz).toBe(resolved.rbwHz));
});
