/** Ways to put a mistake into a method: change what is set, what is read, or the sum. */
import type { Part } from '$lib/schemas/part';
import type { BenchRequest } from '$lib/schemas/reading';
import type { Settings } from '$lib/schemas/settings';
import type { NumberQuestion, FilledStep } from '../exercise/drawn-exercise';
import type { Scope } from '../exercise/expression';
import { patchSettings } from '../exercise/patch-settings';

/** The method with `changes` typed over every set-up. */
export const withSettings = (steps: readonly FilledStep[], changes: Settings): FilledStep[] =>
	steps.map((step) =>
		step.do === 'set' ? { ...step, settings: patchSettings(step.settings, changes) } : step
	);

/** The method with its trace held, and let run for longer than an average takes, because a hold fills slowly. */
export const heldLonger = (
	steps: readonly FilledStep[],
	mode: 'max-hold' | 'min-hold',
	detector: Settings['detector']
): FilledStep[] =>
	withSettings(steps, { traces: [{ mode }], detector }).map((step) =>
		step.do === 'sweep' ? { ...step, sweeps: 2 * step.sweeps } : step
	);

type AnswerStep = Extract<FilledStep, { do: 'answer'; reading: string }>;
type ReadStep = Extract<FilledStep, { do: 'read' }>;
const isAnswer = (step: FilledStep, questionId: string): step is AnswerStep =>
	step.do === 'answer' && step.question === questionId && 'reading' in step;

/** The step that takes the reading a question is answered from. */
export function readStepOf(steps: readonly FilledStep[], questionId: string): ReadStep {
	const answer = steps.find((step) => isAnswer(step, questionId)) as AnswerStep;
	return steps.find((step) => step.do === 'read' && step.as === answer.reading) as ReadStep;
}

/** The method with another reading taken for a question; its answer is then that reading (its `part`, where one is named), `sum` applied. */
export function withReading(
	steps: readonly FilledStep[],
	questionId: string,
	reading: BenchRequest,
	sum: (value: number) => number = (value) => value,
	otherPart?: Part
): FilledStep[] {
	const taken = readStepOf(steps, questionId);
	return steps.map((step) => {
		// Another kind of reading has other parts, or none.
		const part = otherPart ?? (reading.kind === taken.reading.kind ? taken.part : undefined);
		if (step === taken) return { ...taken, reading, part };
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

/** The method with one answer given as its reading reads, no sum done. */
export function withoutSum(steps: readonly FilledStep[], questionId: string): FilledStep[] {
	const { as } = readStepOf(steps, questionId);
	return steps.map((step) =>
		isAnswer(step, questionId) ? { ...step, value: (scope: Scope) => scope[as] as number } : step
	);
}

/** The method with `changeDb` more added back for what is lost on the way: in the correction, where it is typed on the bench, else in the sum. */
export function withLoss(steps: readonly FilledStep[], questionId: string, changeDb: number): FilledStep[] {
	if (!correctsOnBench(steps)) return withSum(steps, questionId, (value) => value + changeDb);
	return steps.map((step) => {
		if (step.do !== 'set' || step.settings.correctionDb === undefined) return step;
		const { correctionDb } = step.settings;
		const changed =
			typeof correctionDb === 'number'
				? correctionDb + changeDb
				: correctionDb.map((point) => ({ ...point, db: point.db + changeDb }));
		return { ...step, settings: { ...step.settings, correctionDb: changed } };
	});
}

/** Whether the method corrects for the lead on the bench rather than by a sum. */
export const correctsOnBench = (steps: readonly FilledStep[]): boolean =>
	steps.some(
		(step) =>
			step.do === 'set' && step.settings.correctionDb !== undefined && step.settings.correctionDb !== 0
	);

/** The method with every sweep made `count` times. */
export const withSweeps = (steps: readonly FilledStep[], count: number): FilledStep[] =>
	steps.map((step) => (step.do === 'sweep' ? { ...step, sweeps: count } : step));

/** The method with the reading handed in for a question answered as it stands, lead counted, no other sum done. */
export function withRawReading(
	steps: readonly FilledStep[],
	{ id, leadDb }: Pick<NumberQuestion, 'id' | 'leadDb'>
): FilledStep[] {
	const { as } = readStepOf(steps, id);
	const byHandDb = correctsOnBench(steps) ? 0 : leadDb;
	return steps.map((step) =>
		isAnswer(step, id) ? { ...step, value: (scope: Scope) => (scope[as] as number) + byHandDb } : step
	);
}
