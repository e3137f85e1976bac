import { part as partSchema, partOf, unitOfPart, type Part } from '$lib/schemas/part';
import { quantity as quantitySchema, type Quantity } from '$lib/schemas/quantity';
import type { WatchedMistake, WrittenNumber } from '$lib/schemas/questions/number';
import type { Scene } from '$lib/schemas/scene';
import type { Unit } from '$lib/units/unit';
import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import type { Scope } from '$lib/server/bench/exercise/expression';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { filled } from '$lib/server/bench/exercise/filled';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { quantityFrequencyHz } from '$lib/server/bench/exercise/quantity-frequency';
import { mistakeId } from '$lib/server/bench/grading/watched-mistakes';
import { truth } from '$lib/server/bench/truth/truth';
import type { Draw } from '../question-type';

/** What a question asks of the scene: the value of its quantity or a part of it, and where that stands. */
function asked(
	scene: Scene,
	quantity: Quantity,
	question: WrittenNumber,
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

/** @throws ExerciseError by field */
export function fillNumber(question: WrittenNumber, { scene, scope }: Draw, field: string): NumberQuestion {
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
		type: 'number',
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
