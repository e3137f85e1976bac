import { settings as settingsSchema, type Settings } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { ExerciseError } from '../exercise/exercise-error';
import { fillTemplate } from '../exercise/fill-template';
import { patchSettings } from '../exercise/patch-settings';
import { issuesOf } from '../exercise/zod-issues';

/**
 * The exercise's start settings as its trial changes them, looked through one of the resolutions offered.
 * @param choice index into the trial's resolutions
 * @throws BenchError for an exercise that is not open to trial, or a choice it doesn't offer
 */
export function trialSetUp({ exercise, parameters, brief }: DrawnExercise, choice: number): Settings {
	const { trial } = exercise;
	if (!trial) throw new BenchError('trial', `${exercise.slug} is not open to trial`);
	const rbwHz = trial.resolutionsHz[choice];
	if (rbwHz === undefined) {
		throw new BenchError('choice', `${trial.resolutionsHz.length} are offered, from 0; given ${choice}`);
	}
	const parsed = settingsSchema.safeParse(fillTemplate(trial.settings, parameters, 'trial.settings'));
	if (!parsed.success) throw new ExerciseError(issuesOf(parsed.error, 'trial.settings'));
	return patchSettings(brief.start, { ...parsed.data, rbwHz });
}
