/** Ways to put a mistake into a method: change what is set, what is read, or the sum. */
import type { ReadingRequest } from '$lib/measure/reading-request';
import type { Settings } from '$lib/schemas/settings';
import type { FilledStep } from '../exercise/drawn-exercise';
import type { Scope } from '../exercise/expression';
import { patchSettings } from '../exercise/patch-settings';

/** The method with `changes` typed over every set-up. */
export const withSettings = (steps: readonly FilledStep[], changes: Settings): FilledStep[] =>
	steps.map((step) =>
		step.do === 'set' ? { ...step, settings: patchSettings(step.settings, changes) } : step
	);

type AnswerStep = Extract<FilledStep, { do: 'answer' }>;
type ReadStep = Extract<FilledStep, { do: 'read' }>;
const isAnswer = (step: FilledStep, questionId: string): step is AnswerStep =>
	step.do === 'answer' && step.question === questionId;

/** The step that takes the reading a question is answered from. */
export function readStepOf(steps: readonly FilledStep[], questionId: string): ReadStep {
	const answer = steps.find((step) => isAnswer(step, questionId)) as AnswerStep;
	return steps.find((step) => step.do === 'read' && step.as === answer.reading) as ReadStep;
}

/** The method with another reading taken for a question; its answer is then that reading, `sum` applied. */
export function withReading(
	steps: readonly FilledStep[],
	questionId: string,
	reading: ReadingRequest,
	sum: (value: number) => number = (value) => value
): FilledStep[] {
	const taken = readStepOf(steps, questionId);
	return steps.map((step) => {
		if (step === taken) return { ...taken, reading };
		if (!isAnswer(step, questionId)) return step;
		return { ...step, value: (scope: Scope) => sum(step.value(scope)) };
	});
}

/** The method with the sum of one answer changed. */
export const withSum = (
	steps: readonly FilledStep[],
	questionId: string,
	sum: (value: number) => number
): FilledStep[] =>
	steps.map((step) =>
		isAnswer(step, questionId) ? { ...step, value: (scope: Scope) => sum(step.value(scope)) } : step
	);

/** Whether the method corrects for the lead on the bench rather than by a sum. */
export const correctsOnBench = (steps: readonly FilledStep[]): boolean =>
	steps.some(
		(step) =>
			step.do === 'set' && step.settings.correctionDb !== undefined && step.settings.correctionDb !== 0
	);
