import { describe, expect, it } from 'vitest';
import type { BenchRequest } from '$lib/schemas/reading';
import { describeReading } from '$lib/server/bench/grading/describe-reading';
import { describeSettings } from '$lib/server/bench/grading/describe-settings';

const plain = (text: string) => text.replace(/[\u00a0\u202f]/g, ' ');

describe('describeSettings(before, after)', () => {
	it('says what is not ordinary in a first set-up', () =>
		expect(
			plain(describeSettings(undefined, { centreHz: 450e6, spanHz: 1e6, detector: 'positive-peak' }))
		).toBe('Centre 450 MHz, span 1 MHz, detector positive peak'));

	it('says only what changed', () =>
		expect(
			plain(
				describeSettings(
					{ centreHz: 450e6, spanHz: 1e6 },
					{
						centreHz: 450e6,
						spanHz: 1e5,
						rbwHz: 300,
						correctionDb: 3.2,
						scale: 'power',
						traces: [{ mode: 'average', count: 64 }]
					}
				)
			)
		).toBe('Span 100 kHz, resolution 300 Hz, correction 3.2 dB, averages on power, trace 1 average of 64'));

	it('says what went back to automatic', () =>
		expect(plain(describeSettings({ rbwHz: 300, sweepTimeS: 2 }, {}))).toBe(
			'Resolution auto, sweep time auto'
		));

	it('says when nothing changed', () => expect(describeSettings({}, {})).toBe('Swept again'));
});

describe('describeReading(request)', () => {
	it.each<[BenchRequest, string]>([
		[{ kind: 'channel-power', centreHz: 450e6, widthHz: 25e3 }, 'channel power, 25 kHz'],
		[{ kind: 'peak' }, 'highest point'],
		[{ kind: 'count', atHz: 450.025e6, gateS: 0.5 }, 'frequency count, at 450.025 MHz, gate 500 ms'],
		[{ kind: 'delta', fromHz: 1e6, toHz: 1.5e6 }, 'difference of two markers, from 1 MHz to 1.5 MHz'],
		[{ kind: 'occupied-bandwidth', percent: 99 }, 'occupied bandwidth, 99 %'],
		[{ kind: 'x-db-bandwidth', db: 26 }, 'bandwidth, 26 dB down'],
		[{ kind: 'marker', atHz: 450.025e6 }, 'marker, at 450.025 MHz']
	])('%o', (request, words) => expect(plain(describeReading(request))).toBe(words));
});
