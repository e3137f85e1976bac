import { part as partSchema, partOf } from '$lib/schemas/part';
import { quantity as quantitySchema, type Quantity } from '$lib/schemas/quantity';
import type { WrittenMark } from '$lib/schemas/questions/mark';
import type { MarkQuestion, Places } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { filled } from '$lib/server/bench/exercise/filled';
import { quantityFrequencyHz } from '$lib/server/bench/exercise/quantity-frequency';
import { truth } from '$lib/server/bench/truth/truth';
import { widthHzOf } from '$lib/server/bench/grading/read-width';
import type { Draw } from '../question-type';

/** @throws ExerciseError when the quantity has no such place, or the receiver's own error doesn't fit into the tolerance */
export function fillMark(written: WrittenMark, draw: Draw, field: string): MarkQuestion {
	const { scope } = draw;
	const quantity = filled(quantitySchema, written.quantity, scope, `${field}.quantity`);
	const where =
		written.shape === 'band' ? bandOf(quantity, draw, field) : flagOf(quantity, written, draw, field);
	const width = where.toHz === undefined ? 0 : where.toHz - where.atHz;
	const { tolerance } = written;
	return {
		type: 'mark',
		id: written.id,
		text: fillText(written.text, scope, `${field}.text`),
		shape: written.shape,
		truth: where,
		toleranceHz: 'absolute' in tolerance ? tolerance.absolute : tolerance.relative * width,
		mistakes: written.mistakes.map((mistake, i) =>
			fillTemplate(mistake, scope, `${field}.mistakes[${i}]`)
		) as MarkQuestion['mistakes']
	};
}

function flagOf(quantity: Quantity, written: WrittenMark, { scene, scope }: Draw, field: string): Places {
	const { value, unit, parts } = truth(scene, quantity);
	if (written.part === undefined && quantity.kind === 'count') return { atHz: value };
	const part = filled(partSchema, written.part ?? 'frequencyHz', scope, `${field}.part`);
	const atHz =
		partOf(parts, part) ?? (written.part === undefined && unit !== 'Hz' ? quantityFrequencyHz(quantity) : 0);
	if (!(atHz > 0))
		throw new ExerciseError([{ field: `${field}.quantity`, message: `${quantity.kind} has no such place` }]);
	return { atHz };
}

/** Edges that the quantity finds, else those it is asked over. */
function bandOf(quantity: Quantity, { scene }: Draw, field: string): Places {
	const { parts } = truth(scene, quantity);
	const [low, high] = [partOf(parts, 'lowerHz'), partOf(parts, 'upperHz')];
	if (low !== undefined && high !== undefined) return { atHz: low, toHz: high };
	const [middle, width] = [quantityFrequencyHz(quantity), widthHzOf(quantity)];
	if (width === undefined || !(middle > 0)) {
		throw new ExerciseError([{ field: `${field}.quantity`, message: `${quantity.kind} has no edges` }]);
	}
	return { atHz: middle - width / 2, toHz: middle + width / 2 };
}
