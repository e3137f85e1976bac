import { resolveSettings } from '../receiver/resolve-settings';
import { patchSettings } from '../exercise/patch-settings';
import type { DrawnExercise, FilledStep } from '../exercise/drawn-exercise';
import type { SetUp } from './mistake';
import { readStepOf } from './spoil';

/** How the receiver stands when a method takes the reading for a question. */
export function setUpOf(drawn: DrawnExercise, steps: readonly FilledStep[], questionId: string): SetUp {
	const read = readStepOf(steps, questionId);
	let settings = drawn.brief.start;
	let sweeps = 0;
	for (const step of steps.slice(0, steps.indexOf(read))) {
		if (step.do === 'set') {
			settings = patchSettings(settings, step.settings);
			sweeps = 0;
		}
		if (step.do === 'sweep') sweeps += step.sweeps;
	}
	const resolved = resolveSettings(settings, drawn.profile);
	return { resolved, trace: resolved.traces[read.trace - 1], sweeps };
}
