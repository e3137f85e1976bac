import { describe, expect, it } from 'vitest';
import { levelLines } from '$lib/components/bench/levels/level-lines';
import { levelWindow } from '$lib/components/bench/plot/level-axis';

describe('levelLines(referenceDbm, topDbm, bottomDbm)', () => {
	it('draws one line every 20 dB from the reference down, with a true minus', () => {
		const { topDbm, bottomDbm } = levelWindow(0);
		expect(levelLines(0, topDbm, bottomDbm).map(({ figure }) => figure)).toEqual([
			'0',
			'−20',
			'−40',
			'−60',
			'−80',
			'−100'
		]);
	});

	it('keeps the reference a line when it is no round figure', () => {
		const { topDbm, bottomDbm } = levelWindow(-12.5);
		expect(levelLines(-12.5, topDbm, bottomDbm)[0]).toEqual({ levelDbm: -12.5, figure: '−12.5' });
	});
});
