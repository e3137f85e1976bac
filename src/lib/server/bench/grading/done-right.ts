import type { PlayedStepView } from '$lib/schemas/done-right';
import type { DoneRightStep } from '$lib/schemas/finding';
import { unitOfPart } from '$lib/schemas/part';
import type { Unit } from '$lib/units/unit';
import type { ResolvedSettings } from '$lib/schemas/settings';
import type { AttemptRecord } from '../exercise/attempt-record';
import type { SweepWith } from '../exercise/bench-session';
import { questionOf, type DrawnExercise } from '../exercise/drawn-exercise';
import { methodStates, type MethodState } from '../exercise/method-states';
import { runMethod, type PlayedStep } from '../exercise/run-method';
import { partsOf } from './asked';
import { resolveSettings } from '../receiver/resolve-settings';
import { answerWords } from './questions/registry';
import { describeReading } from './describe-reading';
import { describeSettings } from './describe-settings';
import { readingMark } from './reading-mark';
import { shownDigits } from './spreads';

const sentence = (text: string): string => text[0].toUpperCase() + text.slice(1);

function described(drawn: DrawnExercise, record: AttemptRecord, played: PlayedStep): DoneRightStep {
	const { step, taken, value } = played;
	const why = step.why === undefined ? {} : { why: step.why };
	switch (step.do) {
		case 'set':
			return { text: describeSettings(undefined, step.settings), ...why };
		case 'sweep':
			return { text: step.sweeps === 1 ? 'One sweep' : `${step.sweeps} sweeps`, ...why };
		case 'read': {
			const { reading } = taken!;
			const unit = step.part === undefined ? reading.unit : unitOfPart(step.part);
			return {
				text: sentence(describeReading(step.reading)),
				value: { value: value as number, unit, digits: digitsOf(unit, reading.spread) },
				...why
			};
		}
		case 'answer': {
			const question = questionOf(drawn, step.question);
			const text = `Answer: ${question.text}`;
			if (question.type !== 'number') {
				return { text, answer: answerWords(question, record.answers[question.id]), ...why };
			}
			const measured = { value: value as number, unit: question.unit, digits: shownDigits(question) };
			return { text, value: measured, ...why };
		}
	}
}

/** Decimals worth showing: one of a level; of hertz and seconds down to a tenth of the spread. */
function digitsOf(unit: Unit, spread: number): number {
	if (unit !== 'Hz' && unit !== 's') return 1;
	const least = unit === 'Hz' ? 2 : 9;
	return spread > 0 ? Math.min(least, 1 - Math.floor(Math.log10(spread))) : least;
}

/** The taught method on the learner's own seed, step by step, with what it reads there. */
export function doneRight(drawn: DrawnExercise, sweepWith?: SweepWith): DoneRightStep[] {
	const { steps, record } = runMethod(drawn, drawn.method, sweepWith);
	return steps.map((played) => described(drawn, record, played));
}

/** The taught method as it is played: each step in words, with the receiver and the rows it leaves behind. */
export interface PlayedExercise {
	start: ResolvedSettings;
	steps: PlayedStepView[];
	/** Where the bench stands after each step. */
	states: MethodState[];
	/** Which rows were swept with which settings: what it takes to sweep them again. */
	log: ReturnType<typeof runMethod>['record']['log'];
}

/** Plays the taught method on the learner's own seed. */
export function playDoneRight(drawn: DrawnExercise): PlayedExercise {
	const { steps, record } = runMethod(drawn);
	const states = methodStates(drawn, drawn.method);
	return {
		start: resolveSettings(drawn.brief.start, drawn.profile),
		states,
		steps: steps.map((played, i) => ({
			...described(drawn, record, played),
			do: played.step.do,
			resolved: states[i].resolved,
			rows: states[i].rows,
			...(played.taken && { reading: shownReading(played.taken) })
		})),
		log: record.log
	};
}

const shownReading = ({ request, reading, trace }: NonNullable<PlayedStep['taken']>) => ({
	trace,
	spread: reading.spread,
	remarks: reading.remarks.map(({ code, text }) => ({ code, text })),
	mark: readingMark(request, partsOf(reading))
});
