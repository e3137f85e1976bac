import { part as partSchema } from '$lib/schemas/part';
import { benchRequest, maskLimits } from '$lib/schemas/reading';
import { scene as sceneSchema, lossTable, type Scene } from '$lib/schemas/scene';
import { settings as settingsSchema, type Settings } from '$lib/schemas/settings';
import type { Exercise, MethodStep } from '$lib/schemas/exercise';
import type { When } from '$lib/schemas/questions/words';
import { fillAnswer, fillQuestion } from '../grading/questions/registry';
import { profileNamed } from '../receiver/profiles';
import type { Seed } from '../receiver/random';
import { drawReceiverError } from '../receiver/receiver-error';
import type { Brief, DrawnExercise, DrawnQuestion, FilledStep } from './drawn-exercise';
import { ExerciseError } from './exercise-error';
import type { Scope } from './expression';
import { fillTemplate } from './fill-template';
import { fillText } from './fill-text';
import { filled } from './filled';
import { DISPLAYED_PER_HZ } from './displayed-per-hz';
import { holds } from './truthful';

/** The scene of one draw: emitters whose `when` holds, numbers in place. */
function fillScene(exercise: Exercise, scope: Scope): Scene {
	const emitters = exercise.scene.emitters.map((template, i) => {
		const { when, ...fields } = template as { when?: When; kind: string };
		return { present: holds(when, scope), fields, field: `scene.emitters[${i}]` };
	});
	const { emitters: _, ...rest } = exercise.scene;
	const present = emitters.filter((emitter) => emitter.present);
	return filled(
		sceneSchema,
		{ ...rest, emitters: present.map(({ fields, field }) => fillTemplate(fields, scope, field)) },
		scope,
		'scene'
	);
}

function fillBrief(exercise: Exercise, scope: Scope): Brief {
	const text = (source: string, field: string) => fillText(source, scope, field);
	return {
		situation: text(exercise.situation, 'situation'),
		plane: text(exercise.plane, 'plane'),
		chain: exercise.chain.map((part, i) => ({ ...part, label: text(part.label, `chain[${i}].label`) })),
		leads: exercise.leads.map(({ label, loss }, i) => ({
			label: text(label, `leads[${i}].label`),
			loss: filled(lossTable, loss, scope, `leads[${i}].loss`)
		})),
		cautions: exercise.cautions.map((caution, i) => text(caution, `cautions[${i}]`)),
		...(exercise.mask && {
			mask: { limits: filled(maskLimits, exercise.mask.limits, scope, 'mask.limits') }
		}),
		hints: exercise.hints.map((hint, i) => text(hint, `hints[${i}]`)),
		start: filled(settingsSchema, exercise.start, scope, 'start')
	};
}

function fillStep(
	step: MethodStep,
	questions: readonly DrawnQuestion[],
	scope: Scope,
	field: string
): FilledStep {
	switch (step.do) {
		case 'set':
			return {
				...step,
				settings: filled<Settings>(settingsSchema, step.settings, scope, `${field}.settings`)
			};
		case 'sweep':
			return step;
		case 'read': {
			const part =
				step.part === undefined ? undefined : filled(partSchema, step.part, scope, `${field}.part`);
			return { ...step, reading: filled(benchRequest, step.reading, scope, `${field}.reading`), part };
		}
		case 'answer': {
			const asked = questions.find(({ id }) => id === step.question);
			if (!asked) {
				const message = `no question is called ${step.question}`;
				throw new ExerciseError([{ field: `${field}.question`, message }]);
			}
			const { question, why } = step;
			return { do: 'answer', question, why, ...fillAnswer(asked, step, scope, field) };
		}
	}
}

/**
 * An exercise with the numbers of one draw in every place.
 * @throws ExerciseError naming the field that doesn't come out valid
 */
export function fillExercise(exercise: Exercise, scope: Scope, seed: Seed, redraws: number): DrawnExercise {
	const scene = fillScene(exercise, scope);
	const profile = typeof exercise.receiver === 'string' ? profileNamed(exercise.receiver) : exercise.receiver;
	const draw = { scene, scope, seed, profile };
	const questions = exercise.questions.map((q, i) => fillQuestion(q, draw, `questions[${i}]`));
	const onScreen = { ...scope, [DISPLAYED_PER_HZ]: 1 + drawReceiverError(profile, seed).frequency };
	return {
		exercise,
		seed,
		redraws,
		profile,
		parameters: scope,
		scene,
		brief: fillBrief(exercise, scope),
		questions,
		method: exercise.method.map((step, i) => fillStep(step, questions, onScreen, `method[${i}]`))
	};
}
