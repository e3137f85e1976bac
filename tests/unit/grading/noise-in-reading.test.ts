import { numberAnswers } from '$lib/server/bench/exercise/attempt-record';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { judgeQuestion } from '$lib/server/bench/grading/judge-question';
import { isDeaf, noiseMw, ownDensityMwPerHz, withNoiseDbm } from '$lib/server/bench/grading/noise-in-reading';
import { setUpOf } from '$lib/server/bench/grading/set-up-of';
import { withRawReading, withReading, withSettings } from '$lib/server/bench/grading/spoil';
import { powerRatioToDb } from '$lib/units/decibel';
import { contentExercise } from '../../factories/content-exercise';

const contextOf = (slug: string, seed = 1) => {
	const drawn = drawExercise(contentExercise(slug), seed);
	const [question] = numberQuestions(drawn);
	return { drawn, question, setUp: setUpOf(drawn, drawn.method, question.id) };
};

describe('noise in a reading', () => {
	const antenna = contextOf('noise-at-a-harbour-antenna');

	it('of a density is the receiver’s own, 10 dB more for 10 dB of attenuation', () => {
		const { drawn, question, setUp } = antenna;
		const deafer = { ...setUp, resolved: { ...setUp.resolved, attenuationDb: 10 } };
		const own = (at: typeof setUp) => powerRatioToDb(noiseMw({ drawn, question }, at));
		// Field receiver at 160 MHz with its preamplifier: −165.9 dBm/Hz (lesson of unit 4).
		expect(own(setUp)).toBeCloseTo(-165.9, 1);
		expect(own(deafer) - own(setUp)).toBeCloseTo(10, 6);
		expect(noiseMw(antenna, setUp)).toBe(ownDensityMwPerHz(antenna, setUp));
	});

	it('of a line is all noise in its filter, the site’s too, brought through the lead', () => {
		const { drawn, question, setUp } = contextOf('weak-carrier-from-an-outstation');
		const site = 10 ** ((drawn.parameters.siteNoiseDbmPerHz as number) / 10);
		const own = ownDensityMwPerHz({ drawn, question }, setUp);
		expect(noiseMw({ drawn, question }, setUp)).toBeCloseTo(319.3401 * (site + own), 16);
		const padded = {
			...setUp,
			resolved: { ...setUp.resolved, input: { ...setUp.resolved.input, padDb: 20 } }
		};
		expect(powerRatioToDb(ownDensityMwPerHz({ drawn, question }, padded) / own)).toBeCloseTo(20, 6);
	});

	it('of a channel fills its width and adds to the signal as power', () => {
		const { drawn, question, setUp } = contextOf('faded-hop');
		const own = powerRatioToDb(noiseMw({ drawn, question }, setUp));
		expect(own).toBeCloseTo(-88.1 + question.leadDb, 0);
		const sum = 10 * Math.log10(10 ** (own / 10) + 10 ** (question.truth / 10));
		expect(withNoiseDbm({ drawn, question }, setUp)).toBeCloseTo(sum, 9);
	});

	it('makes a set-up deaf only where it is more than the signal, and more than the taught one has', () => {
		const { setUp } = antenna;
		const off = { ...setUp, resolved: { ...setUp.resolved, preamp: false } };
		expect(isDeaf(antenna, setUp)).toBe(false);
		expect(isDeaf(antenna, off)).toBe(true);
	});
});

describe('a weak carrier', () => {
	const { drawn, question } = contextOf('weak-carrier-from-an-outstation');

	it.each([100, 300, 1000])(
		'comes out right through a filter of %d Hz, whose own noise is taken off',
		(rbwHz) => {
			const { record } = runMethod(drawn, withSettings(drawn.method, { rbwHz }));
			expect(Math.abs(numberAnswers(record)[question.id].value - question.truth)).toBeLessThan(0.75);
		}
	);

	it.each(['peak', 'marker'] as const)(
		'looked for with a deaf receiver by a %s, is the floor and no lead left out, even when no reading was kept',
		(kind) => {
			const deaf = withRawReading(withSettings(drawn.method, { attenuationDb: 30, points: 1501 }), question);
			const request = kind === 'peak' ? { kind } : { kind, atHz: question.frequencyHz };
			const { record } = runMethod(drawn, withReading(deaf, question.id, request));
			const { value } = numberAnswers(record)[question.id];
			const { verdict, matched } = judgeQuestion(drawn, question, {
				...record,
				readings: [],
				answers: { [question.id]: { value } }
			});
			expect(verdict).toBe('wrong');
			expect(matched!.watched.map(({ id }) => id)).toEqual(['floor-as-signal attenuator 30']);
		}
	);
});

describe('an answer with the noise taken off', () => {
	const { drawn, question } = contextOf('noise-at-a-harbour-antenna');
	const taught = runMethod(drawn);
	const judge = (record: typeof taught.record) => judgeQuestion(drawn, question, record);

	it('is right from the reading that it was taken off', () => {
		const { verdict, source, remarks } = judge(taught.record);
		expect(verdict).toBe('right');
		expect(remarks).toEqual([]);
		expect(Math.abs(source!.cleanValue - numberAnswers(taught.record)[question.id].value)).toBeLessThan(0.5);
		expect(source!.planeValue - source!.cleanValue).toBeGreaterThan(1.5);
	});

	it('rests on nothing when the reading attached is that of the matched load', () => {
		const [, load] = taught.record.readings;
		const { value } = numberAnswers(taught.record)[question.id];
		const swapped = { ...taught.record, answers: { [question.id]: { value, readingId: load.id } } };
		expect(judge(swapped).verdict).toBe('right-but-method');
	});

	it('names the floor as the cause, and not noise left in, when the receiver is deaf', () => {
		const steps = withRawReading(withSettings(drawn.method, { preamp: false }), question);
		const { verdict, matched } = judge(runMethod(drawn, steps).record);
		expect(verdict).toBe('wrong');
		expect(matched!.watched.map(({ id }) => id)).toEqual(['floor-as-signal preamplifier']);
	});
});
