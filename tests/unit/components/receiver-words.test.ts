import { describe, expect, it } from 'vitest';
import { foremostWarning, warningOf, widerBy } from '$lib/components/bench/state/receiver-words';

describe('warnings of the receiver', () => {
	// Loss and widening of a swept Gaussian filter are both √(1 + k²): 1.2 dB low is 1.318 times too wide.
	it('says how low and how wide a too fast sweep reads', () => {
		expect(widerBy(1.2)).toBeCloseTo(1.318, 3);
		expect(warningOf({ kind: 'too-fast', db: 1.2 }).consequence).toBe(
			'single lines read low by about 1.2 dB and 1.3 times too wide.'
		);
	});

	it('puts what stops the sweep before what bends it', () =>
		expect(foremostWarning([{ kind: 'too-fast', db: 1 }, { kind: 'input-protection' }])?.kind).toBe(
			'input-protection'
		));

	it('says nothing when nothing is wrong', () => expect(foremostWarning([])).toBeUndefined());
});
