/** The first exercise is sound with the receiver as it is, and not with a fault planted in it: bench.md §6. */
import { describe, expect, it } from 'vitest';
import type { SweepWith } from '$lib/server/bench/exercise/bench-session';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { proveExercise } from '$lib/server/bench/proof/prove-exercise';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import { firstExercise } from '../factories/first-exercise';

const MINUTES = 60_000;
const SOUND_SEEDS = 40;
const FAULT_SEEDS = 10;
const prove = (seeds: number, sweepWith?: SweepWith) =>
	proveExercise(firstExercise, { seeds, fromSeed: 1, sweepWith });

describe('the first exercise', () => {
	it(`is proven over ${SOUND_SEEDS} seeds`, { timeout: 10 * MINUTES }, () => {
		const table = prove(SOUND_SEEDS);
		expect(table.failures).toEqual([]);
		expect(table.passed).toBe(true);
	});

	it('proves the same when asked again', { timeout: 5 * MINUTES }, () => expect(prove(2)).toEqual(prove(2)));
});

/** A receiver that isn't what it says. */
const faults: [string, SweepWith, RegExp][] = [
	[
		'a noise bandwidth 1.41 times what the filter’s width says',
		(scene, profile, resolved, seed) =>
			prepareSweep(scene, profile, { ...resolved, rbwHz: Math.SQRT2 * resolved.rbwHz }, seed),
		/the taught method/
	],
	[
		'a noise bandwidth taken for the filter’s width, 0.27 dB',
		(scene, profile, resolved, seed) =>
			prepareSweep(scene, profile, { ...resolved, rbwHz: resolved.rbwHz / 1.064467 }, seed),
		/the taught method is off by -0\.2/
	],
	[
		'an average detector that picks peaks',
		(scene, profile, resolved, seed) => {
			const detector = resolved.detector === 'average' ? 'positive-peak' : resolved.detector;
			return prepareSweep(scene, profile, { ...resolved, detector }, seed);
		},
		/the taught method/
	],
	[
		'an attenuation taken off the levels instead of added back',
		(scene, profile, resolved, seed) => {
			const sweeper = prepareSweep(scene, profile, resolved, seed);
			return {
				durationS: (n) => sweeper.durationS(n),
				row: (n, clockS) => sweeper.row(n, clockS).map((level) => level - 2 * resolved.attenuationDb)
			};
		},
		/the taught method/
	],
	[
		'a correction that is never added',
		(scene, profile, resolved, seed) => prepareSweep(scene, profile, { ...resolved, correctionDb: 0 }, seed),
		/the taught method/
	],
	[
		'averages of decibels whatever the scale says',
		(scene, profile, resolved, seed) => prepareSweep(scene, profile, { ...resolved, scale: 'log' }, seed),
		/the taught method/
	]
];

describe('a receiver with a fault', () => {
	it.each(faults)('%s fails the proof', { timeout: 5 * MINUTES }, (_, sweepWith, because) => {
		const table = prove(FAULT_SEEDS, sweepWith);
		expect(table.passed).toBe(false);
		expect(table.failures.join('\n')).toMatch(because);
	});
});

describe('sweeps replaced by zeros', () => {
	const zeros: SweepWith = (scene, profile, resolved, seed) => {
		const sweeper = prepareSweep(scene, profile, resolved, seed);
		return { durationS: (n) => sweeper.durationS(n), row: () => new Float32Array(resolved.points) };
	};

	it('change every reading', () => {
		for (const seed of [1, 2, 3]) {
			const drawn = drawExercise(firstExercise, seed);
			const real = runMethod(drawn, drawn.method, prepareSweep).record.readings;
			const blank = runMethod(drawn, drawn.method, zeros).record.readings;
			expect(blank).toHaveLength(real.length);
			blank.forEach(({ reading }, i) => expect(reading.value).not.toBeCloseTo(real[i].reading.value, 1));
		}
	});

	it('fail the proof', { timeout: 5 * MINUTES }, () => {
		const { rows, passed } = prove(4, zeros);
		expect(passed).toBe(false);
		for (const row of rows.filter(({ mistake }) => mistake === null)) expect(row.passShare).toBe(0);
	});
});
