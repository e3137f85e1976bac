import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { drawParameters } from '$lib/server/bench/exercise/draw-parameters';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { patchSettings } from '$lib/server/bench/exercise/patch-settings';
import { mistakesApart } from '$lib/server/bench/grading/mistakes-apart';
import { changedExercise, firstExercise } from '../../factories/first-exercise';

const seeds = Array.from({ length: 40 }, (_, i) => i);

describe('drawParameters(exercise, seed, redraw)', () => {
	it('draws the same from the same seed, and other values from another', () => {
		expect(drawParameters(firstExercise, 'a7', 0)).toEqual(drawParameters(firstExercise, 'a7', 0));
		expect(drawParameters(firstExercise, 'a7', 0)).not.toEqual(drawParameters(firstExercise, 'a8', 0));
		expect(drawParameters(firstExercise, 'a7', 0)).not.toEqual(drawParameters(firstExercise, 'a7', 1));
	});

	it('moves no other parameter when one is added', () => {
		const more = changedExercise((d) => {
			d.parameters = { aNew: { draw: 'integer', from: 1, to: 9 }, ...d.parameters };
		});
		const { aNew, ...others } = drawParameters(more, 5, 0);
		expect(aNew).toBeGreaterThanOrEqual(1);
		expect(others).toEqual(drawParameters(firstExercise, 5, 0));
	});

	it('keeps to each parameter’s range, grid and choices', () => {
		for (const seed of seeds) {
			const drawn = drawParameters(firstExercise, seed, 0) as Record<string, number>;
			expect(drawn.channel % 1).toBe(0);
			expect(drawn.carrierDbm).toBeGreaterThanOrEqual(-20);
			expect(drawn.carrierDbm).toBeLessThanOrEqual(-11);
			expect(Math.abs(drawn.carrierDbm * 10 - Math.round(drawn.carrierDbm * 10))).toBeLessThan(1e-9);
			expect([4, 16]).toContain(drawn.order);
			expect(['unmodulated', 'telemetry']).toContain(drawn.neighbour);
			expect(drawn.channelHz).toBe(450.0125e6 + 25e3 * drawn.channel);
		}
	});

	it('reaches both ends of a grid', () => {
		const two = changedExercise(
			(d) => (d.parameters.leadLossDb = { draw: 'step', from: 3, to: 3.1, step: 0.1 })
		);
		const values = new Set(seeds.map((seed) => drawParameters(two, seed, 0).leadLossDb));
		expect(values).toEqual(new Set([3, 3.1]));
	});
});

describe('drawExercise(exercise, seed)', () => {
	it('is the same for the same seed, whole', () =>
		expect(JSON.stringify(drawExercise(firstExercise, 'f00d'))).toBe(
			JSON.stringify(drawExercise(firstExercise, 'f00d'))
		));

	it('puts only the neighbour that was chosen into the scene, and no `when`', () => {
		const kinds = new Set(
			seeds.map((seed) => {
				const { scene, parameters } = drawExercise(firstExercise, seed);
				expect(scene.emitters).toHaveLength(2);
				expect(scene.emitters[1].kind).toBe(parameters.neighbour === 'telemetry' ? 'digital' : 'cw');
				expect(Object.keys(scene.emitters[1])).not.toContain('when');
				return scene.emitters[1].kind;
			})
		);
		expect(kinds.size).toBe(2);
	});

	it('has the carrier’s own level as the true channel power, at the plane and not at the receiver', () => {
		for (const seed of seeds) {
			const drawn = drawExercise(firstExercise, seed);
			const [questions, { parameters }] = [numberQuestions(drawn), drawn];
			// All of a root-raised-cosine carrier lies within (1 + roll-off) × symbol rate, here under 25 kHz.
			expect(questions[0].truth).toBeCloseTo(parameters.carrierDbm as number, 4);
			expect(questions[0].leadDb).toBe(parameters.leadLossDb);
		}
	});

	it('has power over symbol rate as the true density in the middle', () => {
		const drawn = drawExercise(firstExercise, 3);
		const [questions, { parameters }] = [numberQuestions(drawn), drawn];
		const { carrierDbm, symbolRateHz } = parameters as Record<string, number>;
		expect(questions[1].truth).toBeCloseTo(carrierDbm - 10 * Math.log10(symbolRateHz), 1);
	});

	it('turns down every draw on which two mistakes come too near each other', () => {
		const drawn = seeds.map((seed) => drawExercise(firstExercise, seed));
		expect(drawn.every(mistakesApart)).toBe(true);
		expect(drawn.some(({ redraws }) => redraws > 0)).toBe(true);
	});

	it('says so when no draw keeps the mistakes apart', () => {
		// A lead of 2.5 dB left out gives what averaging decibels gives.
		const muddled = changedExercise(
			(d) => (d.parameters.leadLossDb = { draw: 'step', from: 2.4, to: 2.6, step: 0.1 })
		);
		expect(() => drawExercise(muddled, 1)).toThrow(/none keeps the mistakes watched apart/);
	});
});

describe('fillText(text, scope, field)', () => {
	it('sets figures as asked, with a true minus', () => {
		expect(fillText('{a} dB, {a | 1} dB, {b/1000 | 0} kHz', { a: -3.25, b: 25000 }, 'place')).toBe(
			'−3.25 dB, −3.3 dB, 25 kHz'
		);
	});
	it('leaves a text without placeholders as it is', () =>
		expect(fillText('as it is', {}, 'x')).toBe('as it is'));
});

describe('patchSettings(current, changes)', () => {
	it('lets go of start and stop when centre or span is typed, and the other way about', () => {
		expect(
			patchSettings({ startHz: 1e6, stopHz: 2e6, points: 501 }, { centreHz: 1.5e6, spanHz: 1e6 })
		).toEqual({
			centreHz: 1.5e6,
			spanHz: 1e6,
			points: 501
		});
		expect(patchSettings({ centreHz: 1.5e6, spanHz: 1e6 }, { startHz: 1e6, stopHz: 2e6 })).toEqual({
			startHz: 1e6,
			stopHz: 2e6
		});
	});
});
