import type { Figure } from '$lib/schemas/figure';
import { settings as settingsSchema } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';
import { parseInput } from '../commands/parse-input';
import type { ExerciseIssue } from '../exercise/exercise-error';
import { prepareIncident } from '../receiver/front-end/prepare-incident';
import { profileNamed } from '../receiver/profiles';
import { resolveSettings } from '../receiver/resolve-settings';
import { allValues, settingsAt, startValues, valueOf, type FigureValues } from './choices';

/**
 * What no schema can say of a figure: that its receiver takes the settings at every choice, and the scene too,
 * so that a reader is never refused what the figure offers.
 * @returns the first fault, by field; nothing when there is none
 */
export function checkFigure(figure: Figure): ExerciseIssue[] {
	const { controls, settings, receiver, scene, seed } = figure;
	const stray = controls.findIndex(({ setting, choices }) => {
		const given = valueOf(settings, setting);
		return given !== undefined && !choices.includes(given);
	});
	if (stray >= 0) {
		const given = String(valueOf(settings, controls[stray].setting));
		return [
			{ field: `controls[${stray}].choices`, message: `must hold ${given}, which settings start with` }
		];
	}
	const profile = profileNamed(receiver);
	const start = startValues(figure);
	for (const values of [start, ...allValues(figure)]) {
		try {
			const resolved = resolveSettings(parseInput(settingsSchema, settingsAt(figure, values)), profile);
			if (values === start) prepareIncident(scene, profile, resolved, seed);
		} catch (error) {
			if (!(error instanceof BenchError)) throw error;
			return [placed(figure, values, error)];
		}
	}
	return [];
}

/** Whatever is refused away from the start is the fault of the control that was turned. */
function placed(figure: Figure, values: FigureValues, { field, message }: BenchError): ExerciseIssue {
	const start = startValues(figure);
	const turned = figure.controls
		.map(({ setting, choices }, i) => ({ setting, i, value: values[i], nth: choices.indexOf(values[i]) }))
		.filter(({ i, value }) => value !== start[i]);
	if (turned.length === 0) {
		const isOfScene = /^(emitters|device|path)\b/.test(field);
		return { field: `${isOfScene ? 'scene' : 'settings'}.${field}`, message };
	}
	const [{ i, nth }] = turned;
	const where = turned.map(({ setting, value }) => `${setting} ${String(value)}`).join(' and ');
	return { field: `controls[${i}].choices[${nth}]`, message: `with ${where}, ${field} ${message}` };
}
