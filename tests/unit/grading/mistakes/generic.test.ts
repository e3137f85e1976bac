/** Mistakes that any unit may watch, made on the bench: two carriers side by side, and a width. */
import { numberAnswers } from '$lib/server/bench/exercise/attempt-record';
import { describe, expect, it } from 'vitest';
import type { WatchedMistake } from '$lib/schemas/questions/number';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import {
	numberQuestions,
	type FilledStep,
	type NumberQuestion
} from '$lib/server/bench/exercise/drawn-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { accountFor } from '$lib/server/bench/grading/account-for';
import { judgeQuestion } from '$lib/server/bench/grading/judge-question';
import { ownError } from '$lib/server/bench/grading/own-error';
import { predictMistake } from '$lib/server/bench/grading/predict-mistake';
import { watchedMistakes } from '$lib/server/bench/grading/watched-mistakes';
import { twoCarriers } from '../../../factories/two-carriers';

const drawn = drawExercise(twoCarriers, 5);
const { lowHz, highHz, lowDbm, lessDb } = drawn.parameters as Record<string, number>;
const asked = (id: string, over: Partial<NumberQuestion> = {}): NumberQuestion => ({
	...numberQuestions(drawn).find((one) => one.id === id)!,
	...over
});
const level = asked('where', {
	quantity: { kind: 'marker', atHz: lowHz },
	unit: 'dBm',
	digits: 1,
	truth: lowDbm,
	tolerance: 1
});

/** The level of the lower carrier read with a marker: a filter wider than the points lie apart, peaks picked. */
const byMarker = drawn.method.map((step): FilledStep => {
	if (step.do === 'set')
		return { ...step, settings: { rbwHz: 3000, detector: 'positive-peak', scale: 'log' } };
	if (step.do !== 'read' || step.as !== 'countedHz') return step;
	return { ...step, reading: { kind: 'marker', atHz: lowHz } };
});

/** The mistake made on the bench: what it gives, what theory says, and what the finding names, with and without its reading. */
function made(question: NumberQuestion, watched: WatchedMistake) {
	const own = { ...question, mistakes: [watched] };
	const context = { drawn, question: own };
	const [one] = watchedMistakes(own);
	const method = question.unit === 'dBm' ? byMarker : drawn.method;
	const { record } = runMethod({ ...drawn, method }, one.mistake.make(method, context));
	const { value } = numberAnswers(record)[question.id];
	const judged = (left: typeof record) => judgeQuestion(drawn, own, left);
	const names = (left: typeof record) => judged(left).matched?.watched.map(({ kind }) => kind) ?? [];
	const judgement = judged(record);
	return {
		value: value - ownError(context),
		predicted: predictMistake(one, { drawn: { ...drawn, method }, question: own })!,
		named: names(record),
		namedFromLog: names({ ...record, readings: [], answers: { [question.id]: { value } } }),
		accounts: judgement.matched ? accountFor(judgement, judgement.matched, value) : []
	};
}

describe.each<[string, NumberQuestion, WatchedMistake, number]>([
	['wrong-neighbour, by its frequency', asked('where'), { kind: 'wrong-neighbour', atHz: highHz }, highHz],
	['wrong-neighbour, by its level', level, { kind: 'wrong-neighbour', atHz: highHz }, lowDbm - lessDb],
	[
		'half-or-double of a width',
		asked('occupied'),
		{ kind: 'half-or-double', factor: 0.5, gave: 'the width of one side', wanted: 'the whole width' },
		asked('occupied').truth / 2
	],
	[
		'half-or-double of a power',
		level,
		{ kind: 'half-or-double', factor: 2, gave: 'the peak envelope power', wanted: 'the mean power' },
		// Twice a power: 10 lg 2 = 3.0103 dB.
		lowDbm + 3.0103
	],
	['unit-mixed', level, { kind: 'unit-mixed', gave: 'dBµV', change: 106.99 }, lowDbm + 106.99]
])('%s', (_, question, watched, expected) => {
	const { value, predicted, named, namedFromLog, accounts } = made(question, watched);

	it('gives what it says, on the bench and in theory', () => {
		expect(Math.abs(predicted.value - expected)).toBeLessThan(0.01 * question.tolerance);
		expect(Math.abs(value - predicted.value)).toBeLessThan(question.tolerance / 2);
	});

	it('is named, with its reading and without', () => {
		expect(named).toEqual([watched.kind]);
		expect(namedFromLog).toEqual([watched.kind]);
	});

	it('says where and how, with a sum', () => {
		const [{ explanation }] = accounts;
		expect(explanation!.sum).toMatch(/\d/);
		expect(explanation!.bad.text).toMatch(/^Here: /);
	});
});
