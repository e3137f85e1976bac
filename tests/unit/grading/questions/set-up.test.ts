import { describe, expect, it } from 'vitest';
import type { FindingAs } from '$lib/schemas/questions/finding';
import type { Condition } from '$lib/schemas/questions/condition';
import type { Settings } from '$lib/schemas/settings';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { questionOf, type DrawnAs, type DrawnCondition } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { judge, readAnswer } from '$lib/server/bench/grading/questions/registry';
import { heldBy } from '$lib/server/bench/grading/questions/set-up/held-by';
import { profileNamed } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { TYPED_QUESTIONS, typedExercise } from '../../../factories/typed-questions';

const exercise = typedExercise();
const drawn = drawExercise(exercise, 4);
const taught = runMethod(drawn).record;
const question = questionOf(drawn, 'settled') as DrawnAs<'set-up'>;
const handingIn = (settings: Settings, sweeps = 2, entry = 0) =>
	judge(drawn, question, {
		log: [{ settings: { ...taught.log[0].settings, ...settings }, firstRow: 0, sweeps, clockS: 0 }],
		readings: [],
		answers: { settled: { entry } }
	});

describe('a question that asks for a set-up', () => {
	it('is right when every condition holds, and says what was asked and found', () => {
		const finding = handingIn({}).finding as FindingAs<'set-up'>;
		expect(finding.verdict).toBe('right');
		expect(finding.conditions.every(({ met }) => met)).toBe(true);
		expect(finding.conditions[2]).toEqual({
			asked: 'resolution bandwidth at most 30\u00a0kHz',
			found: '30\u00a0kHz',
			met: true
		});
	});

	it.each([
		['detector-is', { detector: 'sample' }],
		['scale-is', { scale: 'log' }],
		['rbwHz', { rbwHz: 100e3 }],
		['unhurried', { sweepTimeS: 0.001 }],
		['own-noise-below', { attenuationDb: 50, rbwHz: 30e3, sweepTimeS: 'auto', input: { padDb: 30 } }]
	] as [string, Settings][])('misses %s alone with %j', (kind, settings) => {
		const { finding, blames } = handingIn(settings);
		expect(finding.verdict).toBe('wrong');
		expect(finding.mistakes.map((mistake) => mistake.kind)).toEqual([kind]);
		expect(blames).toMatchObject([{ entry: 0 }]);
	});

	it('judges the set-up that was handed in, not the last one', () => {
		const log = [{}, { detector: 'sample' as const }].map((change, i) => ({
			settings: { ...taught.log[0].settings, ...change },
			firstRow: 2 * i,
			sweeps: 2,
			clockS: i
		}));
		const verdict = (entry: number) =>
			judge(drawn, question, { log, readings: [], answers: { settled: { entry } } }).finding.verdict;
		expect([verdict(0), verdict(1)]).toEqual(['right', 'wrong']);
	});

	it('is no answer with a set-up that nothing was swept with, or that is not in the log', () => {
		expect(handingIn({}, 0).finding.verdict).toBe('unanswered');
		expect(handingIn({}, 2, 7).finding.verdict).toBe('unanswered');
	});

	it('stands in the log of what was done, with the blame at the set-up', () => {
		const { log } = gradeAnswer({
			drawn,
			log: [{ settings: { ...taught.log[0].settings, scale: 'log' }, firstRow: 0, sweeps: 2, clockS: 0 }],
			readings: [],
			answers: { settled: { entry: 0 } }
		});
		expect(log[0].bad).toBe('Here: decibels; asked was averages on power');
		expect(log[1].text).toBe('Answer 3: set-up 1');
	});

	it('reads a number of the log, and null as no answer', () => {
		const asked = exercise.questions[2];
		expect(readAnswer(asked, { type: 'set-up', setUp: 3 })).toEqual({ given: { entry: 3 } });
		expect(readAnswer(asked, { type: 'set-up', setUp: null })).toBeNull();
	});

	it('lists mistakes that break conditions of its own', () => {
		const draft = structuredClone(TYPED_QUESTIONS);
		draft.questions[2].mistakes![0].breaks = ['haste'];
		expect(() => typedExercise(draft)).toThrow(ExerciseError);
	});
});

describe('conditions, on the receiver of the field', () => {
	const profile = profileNamed('field');
	const scene = { emitters: [{ kind: 'cw' as const, frequencyHz: 100e6, levelDbm: -20 }] };
	const held = (condition: Condition, settings: Settings, sweeps = 1) => {
		const resolved = resolveSettings({ centreHz: 100e6, spanHz: 1e6, ...settings }, profile);
		const [only] = heldBy([{ ...condition, id: 'it' } as DrawnCondition], {
			drawn: { scene, profile },
			resolved,
			sweeps
		});
		return only;
	};

	it('counts what went into a trace: as many sweeps as were made, and no more than its average takes', () => {
		const asks = { kind: 'trace-is', is: 'average', sweeps: 10 } as Condition;
		const traces: Settings['traces'] = [{ mode: 'live' }, { mode: 'average', count: 16 }];
		expect(held(asks, { traces }, 9).met).toBe(false);
		expect(held(asks, { traces }, 10).met).toBe(true);
		expect(held(asks, { traces: [{ mode: 'average', count: 4 }] }, 40).met).toBe(false);
		expect(held(asks, {}, 40).met).toBe(false);
	});

	it('asks for room beside what must be in view', () => {
		const asks = { kind: 'in-view', fromHz: 99.9e6, toHz: 100.1e6, freeShare: 0.1 } as Condition;
		expect(held(asks, {}).met).toBe(true);
		expect(held(asks, { spanHz: 200e3 }).met).toBe(false);
		expect(held(asks, { centreHz: 100.35e6 }).met).toBe(false);
	});

	it('knows the receiver’s own third-order products: 2·(TOI − P) below two tones of P at the mixer', () => {
		const asks = { kind: 'own-products-below', atHz: 100e6, toneDbm: -20, db: 70 } as Condition;
		// With 10 dB of attenuation each tone is −30 dBm at the mixer.
		const below = 2 * (profile.toiDbm! + 30);
		expect(held(asks, { attenuationDb: 10 })).toMatchObject({ met: below >= 70 });
		expect(held({ ...asks, db: below - 0.1 } as Condition, { attenuationDb: 10 }).met).toBe(true);
		expect(held({ ...asks, db: below + 0.1 } as Condition, { attenuationDb: 10 }).met).toBe(false);
		expect(held({ ...asks, db: below + 19 } as Condition, { attenuationDb: 20 }).met).toBe(true);
	});

	it('lets own noise rise with the filter and with attenuation', () => {
		const asks = (db: number) => ({ kind: 'own-noise-below', atHz: 100e6, levelDbm: -20, db }) as Condition;
		const limit = (settings: Settings) => {
			let db = 0;
			while (held(asks(db + 1), settings).met) db += 1;
			return db;
		};
		const narrow = limit({ rbwHz: 1000, attenuationDb: 0 });
		expect(narrow - limit({ rbwHz: 10e3, attenuationDb: 0 })).toBe(10);
		expect(narrow - limit({ rbwHz: 1000, attenuationDb: 10 })).toBe(10);
	});

	it('knows overload, the correction at a place, pads, the preamplifier and the block', () => {
		expect(held({ kind: 'no-overload' }, { attenuationDb: 0 }).met).toBe(true);
		expect(held({ kind: 'no-overload' }, { attenuationDb: 0, preamp: true, referenceDbm: 0 }).met).toBe(
			-20 + profile.preamp!.gainDb < profile.toiDbm! - 12.6
		);
		const at = { kind: 'correction-within', atHz: 100e6, atLeast: 3, atMost: 3 } as Condition;
		const table = [
			{ frequencyHz: 50e6, db: 2 },
			{ frequencyHz: 150e6, db: 4 }
		];
		expect(held(at, { correctionDb: table }).met).toBe(true);
		expect(held(at, { correctionDb: 2 }).met).toBe(false);
		const pad = { kind: 'setting-within', setting: 'padDb', atLeast: 10, atMost: 10 } as Condition;
		expect([held(pad, { input: { padDb: 10 } }).met, held(pad, {}).met]).toEqual([true, false]);
		expect(held({ kind: 'preamp-is', on: true }, { preamp: true }).met).toBe(true);
		expect(held({ kind: 'dc-block-is', in: true }, { input: { dcBlock: false } }).met).toBe(false);
	});
});
