import { part as partSchema, partOf, unitOfPart } from '$lib/schemas/part';
import { quantity as quantitySchema } from '$lib/schemas/quantity';
import type { WrittenUncertainty } from '$lib/schemas/questions/uncertainty';
import type { UncertaintyQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { filled } from '$lib/server/bench/exercise/filled';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { quantityFrequencyHz } from '$lib/server/bench/exercise/quantity-frequency';
import { isAbsoluteLevel } from '$lib/server/bench/grading/asked';
import { truth } from '$lib/server/bench/truth/truth';
import type { Draw } from '../question-type';
import { standardOf } from './standard';

/** @throws ExerciseError when the quantity isn't in the question's unit, or has no such part */
export function fillUncertainty(
	written: WrittenUncertainty,
	{ scene, scope }: Draw,
	field: string
): UncertaintyQuestion {
	const quantity = filled(quantitySchema, written.quantity, scope, `${field}.quantity`);
	const whole = truth(scene, quantity);
	const part =
		written.part === undefined ? undefined : filled(partSchema, written.part, scope, `${field}.part`);
	const value = part === undefined ? whole.value : partOf(whole.parts, part);
	const unit = part === undefined ? whole.unit : unitOfPart(part);
	if (value === undefined || unit !== written.unit) {
		throw new ExerciseError([
			{ field: `${field}.unit`, message: `${quantity.kind} is in ${unit}, not ${written.unit}` }
		]);
	}
	const number = (template: unknown, place: string) =>
		fillTemplate(template, scope, `${field}.${place}`) as number;
	const lost = scene.path && isAbsoluteLevel(unit) ? lossDbAt(scene.path, quantityFrequencyHz(quantity)) : 0;
	return {
		type: 'uncertainty',
		id: written.id,
		text: fillText(written.text, scope, `${field}.text`),
		unit: written.unit,
		digits: written.digits,
		truth: value,
		toleranceDb: written.toleranceDb,
		leadDb: lost,
		budget: written.budget.map(({ id, text, db, law, k }, i) => {
			const stated = number(db, `budget[${i}].db`);
			return { id, text, db: stated, standardDb: standardOf(stated, law, k) };
		}),
		spreadDb: number(written.spreadDb, 'spreadDb'),
		within: written.within
	};
}
