import type { WrittenEmissions } from '$lib/schemas/questions/emissions';
import type { EmissionsQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { holds, isTrue } from '$lib/server/bench/exercise/truthful';
import { truth } from '$lib/server/bench/truth/truth';
import type { Draw } from '../question-type';

/** @throws ExerciseError when two rows stand nearer than twice the tolerance */
export function fillEmissions(
	written: WrittenEmissions,
	{ scene, scope, profile }: Draw,
	field: string
): EmissionsQuestion {
	const number = (template: unknown, place: string) =>
		fillTemplate(template, scope, `${field}.${place}`) as number;
	const emissions = written.emissions
		.map((one, i) => ({ one, i }))
		.filter(({ one }) => holds(one.when, scope))
		.map(({ one, i }) => {
			const atHz = number(one.atHz, `emissions[${i}].atHz`);
			return {
				id: one.id,
				name: one.name,
				atHz,
				levelDbm:
					one.levelDbm === undefined
						? truth(scene, { kind: 'marker', atHz }).value
						: number(one.levelDbm, `emissions[${i}].levelDbm`),
				breaks: one.breaks === undefined ? null : isTrue(one.breaks, scope, `${field}.emissions[${i}].breaks`)
			};
		})
		.sort((a, b) => a.atHz - b.atHz);
	const ghosts = written.ghosts
		.filter((ghost) => holds(ghost.when, scope))
		.map(({ id, title, text, atHz }, i) => ({ id, title, text, atHz: number(atHz, `ghosts[${i}].atHz`) }));
	const places = [...emissions, ...ghosts].map(({ atHz }) => atHz).sort((a, b) => a - b);
	if (places.some((hz, i) => i > 0 && hz - places[i - 1] < 2 * written.toleranceHz)) {
		throw new ExerciseError([
			{ field: `${field}.toleranceHz`, message: 'two rows stand nearer than twice the tolerance' }
		]);
	}
	const greatest = Math.max(...places) * profile.referencePpm * 1e-6;
	if (written.toleranceHz < greatest) {
		const message = `must be at least what the receiver’s reference may be off, ${greatest.toFixed(0)} Hz`;
		throw new ExerciseError([{ field: `${field}.toleranceHz`, message }]);
	}
	return {
		type: 'emissions',
		id: written.id,
		text: fillText(written.text, scope, `${field}.text`),
		emissions,
		asksBreaks: written.emissions[0].breaks !== undefined,
		toleranceHz: written.toleranceHz,
		toleranceDb: written.toleranceDb,
		ghosts
	};
}
