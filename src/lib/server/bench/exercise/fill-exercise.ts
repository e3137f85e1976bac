import { lossDbAt } from './loss-db-at';
import { part as partSchema, partOf, unitOfPart, type Part } from '$lib/schemas/part';
import { benchRequest, maskLimits } from '$lib/schemas/reading';
import { scene as sceneSchema, lossTable, type Scene } from '$lib/schemas/scene';
import { settings as settingsSchema, type Settings } from '$lib/schemas/settings';
import type { Exercise, ExerciseQuestion, MethodStep, WatchedMistake } from '$lib/schemas/exercise';
import { quantity as quantitySchema, type Quantity } from '$lib/schemas/quantity';
import type { Unit } from '$lib/units/unit';
import type { z } from 'zod';
import { profileNamed } from '../receiver/profiles';
import type { Seed } from '../receiver/random';
import { drawReceiverError } from '../receiver/receiver-error';
import { mistakeId } from '../grading/watched-mistakes';
import { truth } from '../truth/truth';
import type { Brief, DrawnExercise, DrawnQuestion, FilledStep } from './drawn-exercise';
import { ExerciseError } from './exercise-error';
import { parseExpression, type Scope } from './expression';
import { fillTemplate } from './fill-template';
import { fillText } from './fill-text';
import { DISPLAYED_PER_HZ } from './displayed-per-hz';
import { quantityFrequencyHz } from './quantity-frequency';
import { issuesOf } from './zod-issues';

/** A template filled in and checked against the schema it stands for. @throws ExerciseError by field */
function filled<T>(schema: z.ZodType<T>, template: unknown, scope: Scope, field: string): T {
	const parsed = schema.safeParse(fillTemplate(template, scope, field));
	if (!parsed.success) throw new ExerciseError(issuesOf(parsed.error, field));
	return parsed.data;
}

type When = Record<string, string | number | (string | number)[]>;
const holds = (when: When | undefined, scope: Scope): boolean =>
	Object.entries(when ?? {}).every(([name, wanted]) => [wanted].flat().includes(scope[name]));

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

/** What a question asks of the scene: the value of its quantity or a part of it, and where that stands. */
function asked(
	scene: Scene,
	quantity: Quantity,
	question: ExerciseQuestion,
	scope: Scope,
	field: string
): { part?: Part; value: number; unit: Unit; placeHz: number } {
	const whole = truth(scene, quantity);
	const [low, high] = [partOf(whole.parts, 'lowerHz'), partOf(whole.parts, 'upperHz')];
	const middleHz = low !== undefined && high !== undefined ? (low + high) / 2 : undefined;
	const placeHz = partOf(whole.parts, 'frequencyHz') ?? middleHz ?? 0;
	if (question.part === undefined) return { value: whole.value, unit: whole.unit, placeHz };
	const part = filled(partSchema, question.part, scope, `${field}.part`);
	const value = partOf(whole.parts, part);
	if (value === undefined) {
		throw new ExerciseError([{ field: `${field}.part`, message: `${quantity.kind} has no such part here` }]);
	}
	return { part, value, unit: unitOfPart(part), placeHz };
}

function fillQuestion(question: ExerciseQuestion, scene: Scene, scope: Scope, field: string): DrawnQuestion {
	const quantity = filled(quantitySchema, question.quantity, scope, `${field}.quantity`);
	const { part, value, unit, placeHz } = asked(scene, quantity, question, scope, field);
	if (unit !== question.unit) {
		const what = part === undefined ? quantity.kind : `this part of ${quantity.kind}`;
		throw new ExerciseError([
			{ field: `${field}.unit`, message: `${what} is in ${unit}, not ${question.unit}` }
		]);
	}
	const { tolerance } = question;
	const frequencyHz = quantityFrequencyHz(quantity) || placeHz;
	return {
		id: question.id,
		text: fillText(question.text, scope, `${field}.text`),
		quantity,
		...(part !== undefined && { part }),
		noiseTakenOff: question.noiseTakenOff,
		unit,
		digits: question.digits,
		truth: value,
		tolerance: 'absolute' in tolerance ? tolerance.absolute : Math.abs(value) * tolerance.relative,
		frequencyHz,
		leadDb: scene.path ? lossDbAt(scene.path, frequencyHz) : 0,
		mistakes: question.mistakes.map((mistake, i) => ({
			...(fillTemplate(mistake, scope, `${field}.mistakes[${i}]`) as WatchedMistake),
			id: mistakeId(mistake)
		}))
	};
}

function fillStep(step: MethodStep, scope: Scope, field: string): FilledStep {
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
			const value = parseExpression(step.value, `${field}.value`);
			return { ...step, value: (readings) => value.evaluate({ ...scope, ...readings }) };
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
	const onScreen = { ...scope, [DISPLAYED_PER_HZ]: 1 + drawReceiverError(profile, seed).frequency };
	return {
		exercise,
		seed,
		redraws,
		profile,
		parameters: scope,
		scene,
		brief: fillBrief(exercise, scope),
		questions: exercise.questions.map((q, i) => fillQuestion(q, scene, scope, `questions[${i}]`)),
		method: exercise.method.map((step, i) => fillStep(step, onScreen, `method[${i}]`))
	};
}
