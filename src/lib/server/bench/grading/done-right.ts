import type { DoneRightStep } from '$lib/schemas/finding';
import type { SweepWith } from '../exercise/bench-session';
import { questionOf, type DrawnExercise } from '../exercise/drawn-exercise';
import { runMethod, type PlayedStep } from '../exercise/run-method';
import { describeReading } from './describe-reading';
import { describeSettings } from './describe-settings';

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
