import type { PlayedStepView } from '$lib/schemas/done-right';
import type { DoneRightStep } from '$lib/schemas/finding';
import type { SweepWith } from '../exercise/bench-session';
import { questionOf, type DrawnExercise } from '../exercise/drawn-exercise';
import { methodStates } from '../exercise/method-states';
import { runMethod, type PlayedStep } from '../exercise/run-method';
import { describeReading } from './describe-reading';
import { describeSettings } from './describe-settings';
import { readingMark } from './reading-mark';

const sentence = (text: string): string => text[0].toUpperCase() + text.slice(1);

function described(drawn: DrawnExercise, { step, taken, value }: PlayedStep): DoneRightStep {
	const why = step.why === undefined ? {} : { why: step.why };
	switch (step.do) {
		case 'set':
			return { text: describeSettings(undefined, step.settings), ...why };
		case 'sweep':
			return { text: step.sweeps === 1 ? 'One sweep' : `${step.sweeps} sweeps`, ...why };
		case 'read': {
			const { value: read, unit } = taken!.reading;
			return {
				text: sentence(describeReading(step.reading)),
				value: { value: read, unit, digits: unit === 'Hz' ? 0 : 1 },
				...why
			};
		}
		case 'answer': {
			const { unit, digits, text } = questionOf(drawn, step.question);
			return { text: `Answer: ${text}`, value: { value: value as number, unit, digits }, ...why };
		}
	}
}

/** The taught method on the learner's own seed, step by step, with what it reads there. */
export const doneRight = (drawn: DrawnExercise, sweepWith?: SweepWith): DoneRightStep[] =>
	runMethod(drawn, drawn.method, sweepWith).steps.map((played) => described(drawn, played));

/** The taught method as it is played: each step in words, with the receiver and the rows it leaves behind. */
export interface PlayedExercise {
	steps: PlayedStepView[];
	/** Which rows were swept with which settings: what it takes to sweep them again. */
	log: ReturnType<typeof runMethod>['record']['log'];
}

/** Plays the taught method on the learner's own seed. */
export function playDoneRight(drawn: DrawnExercise): PlayedExercise {
	const { steps, record } = runMethod(drawn);
	const states = methodStates(drawn, drawn.method);
	return {
		steps: steps.map((played, i) => ({
			...described(drawn, played),
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
	mark: readingMark(request, reading.parts)
});
