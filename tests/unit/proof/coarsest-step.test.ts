import type { FilledStep, NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { coarsestStepHz } from '$lib/server/bench/proof/misdiagnosis/coarsest-step';
import { describe, expect, it } from 'vitest';

const reading = (request: object) => [{ do: 'read', reading: request, as: 'x' }] as unknown as FilledStep[];
const markers = reading({ kind: 'delta', fromHz: 1e6, toHz: 1.01e6 });
const band = reading({ kind: 'channel-power', centreHz: 1e6, widthHz: 1e5 });
const asked = (question: object) =>
	({ quantity: { kind: 'delta' }, ...question }) as unknown as NumberQuestion;
const level = asked({ unit: 'dB', tolerance: 0.8 });

describe('coarsestStepHz(rbwHz, …)', () => {
	it('leaves a third of the tolerance to rounding, where points give the frequency that is asked', () => {
		for (const sound of [true, false])
			expect(
				coarsestStepHz(300, { steps: markers, question: asked({ unit: 'Hz', tolerance: 24 }), sound })
			).toBeCloseTo(16);
	});

	it('asks no more of the points than the filter does, where the tolerance is wide', () => {
		const question = asked({ unit: 'Hz', tolerance: 1e4 });
		expect(coarsestStepHz(300, { steps: markers, question, sound: false })).toBeCloseTo(180);
	});

	it('asks nothing for a count, which no point limits', () => {
		const question = asked({ unit: 'Hz', tolerance: 1, quantity: { kind: 'count' } });
		expect(coarsestStepHz(300, { steps: reading({ kind: 'count' }), question, sound: false })).toBeCloseTo(
			180
		);
	});

	it('is a quarter of the filter for a careful reading of a line, and of nothing else', () => {
		expect(coarsestStepHz(300, { steps: markers, question: level, sound: true })).toBe(75);
		expect(coarsestStepHz(300, { steps: markers, question: level, sound: false })).toBeCloseTo(180);
		expect(coarsestStepHz(300, { steps: band, question: level, sound: true })).toBeCloseTo(180);
	});
});
