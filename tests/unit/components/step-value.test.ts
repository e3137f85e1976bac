import { describe, expect, it } from 'vitest';
import { nextInSeries, nextOf, stepProblem, stepValue } from '$lib/components/bench/setup/step-value';
import type { ReceiverView } from '$lib/schemas/exercise-view';
import { resolved } from './resolved-settings';

const receiver = { rbwHz: [1e3, 3e3, 1e4, 3e4, 1e5], attenuatorDb: [0, 5, 10, 15, 20] } as ReceiverView;

describe('nextOf(list, value, up)', () => {
	it('is the neighbour on that side', () =>
		expect([nextOf([1, 3, 10], 3, true), nextOf([1, 3, 10], 3, false)]).toEqual([10, 1]));
	it('takes a value between two steps to the nearer end of its side', () =>
		expect(nextOf([1, 3, 10], 4, true)).toBe(10));
	it('stays at the end of the list', () => expect(nextOf([1, 3, 10], 10, true)).toBe(10));
});

describe('nextInSeries(value, series, up)', () => {
	it('goes on across decades', () => {
		expect(nextInSeries(500e3, [1, 2, 5], true)).toBe(1e6);
		expect(nextInSeries(1e6, [1, 2, 5], false)).toBe(500e3);
	});
	it('keeps figures exact', () => expect(nextInSeries(0.1, [1, 2, 5], true)).toBe(0.2));
});

describe('stepValue(field, resolved, receiver, up, fine)', () => {
	it('moves the centre by a tenth of the span, finely by a hundredth', () => {
		expect(stepValue('centreHz', resolved, receiver, true)).toBe(450.2e6);
		expect(stepValue('centreHz', resolved, receiver, true, true)).toBe(450.02e6);
	});
	it('moves what the receiver has in steps along its own steps', () => {
		expect(stepValue('rbwHz', resolved, receiver, true)).toBe(1e5);
		expect(stepValue('attenuationDb', resolved, receiver, false)).toBe(5);
	});
	it('moves the reference by 10 dB, finely by one', () => {
		expect(stepValue('referenceDbm', resolved, receiver, false)).toBe(-10);
		expect(stepValue('referenceDbm', resolved, receiver, false, true)).toBe(-1);
	});
});

describe('stepProblem(value, steps, write)', () => {
	const say = (value: number) => stepProblem(value, [100, 300, 1000], (step) => `${step} Hz`);
	it('is nothing for a step', () => expect(say(300)).toBeUndefined());
	it('names the two steps a value lies between', () =>
		expect(say(200)).toBe('This receiver has 100 Hz and 300 Hz, nothing between.'));
	it('names the end a value lies beyond', () => {
		expect(say(10)).toBe('The least this receiver has is 100 Hz.');
		expect(say(3000)).toBe('The most this receiver has is 1000 Hz.');
	});
});
