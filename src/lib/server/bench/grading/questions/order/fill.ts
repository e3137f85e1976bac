import type { WrittenOrder } from '$lib/schemas/questions/order';
import type { OrderQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { withTruths } from '../fill-truths';
import { optionKey, shuffled } from '../option-keys';
import type { Draw } from '../question-type';

/** Keys from the first to the last. */
export const sortedKeys = (
	items: readonly { key: string; by: number }[],
	first: 'least' | 'greatest'
): string[] =>
	[...items].sort((a, b) => (first === 'least' ? a.by - b.by : b.by - a.by)).map(({ key }) => key);

/** @throws ExerciseError when two neighbours lie nearer than `apart` */
export function fillOrder(written: WrittenOrder, draw: Draw, field: string): OrderQuestion {
	const { id, first, apart, mistakes } = written;
	const known = withTruths(written.truths, draw, field);
	const items = shuffled(
		written.items.map((item, i) => ({
			id: item.id,
			text: fillText(item.text, draw.scope, `${field}.items[${i}].text`),
			by: fillTemplate(item.by, known, `${field}.items[${i}].by`) as number
		})),
		draw.seed,
		id
	).map((item, i) => ({ ...item, key: optionKey(i) }));
	const values = items.map(({ by }) => by).sort((a, b) => a - b);
	const nearest = Math.min(...values.slice(1).map((value, i) => value - values[i]));
	if (nearest < apart) {
		const message = `two lie ${nearest.toPrecision(3)} apart, at least ${apart} asked on every draw`;
		throw new ExerciseError([{ field: `${field}.items`, message }]);
	}
	return {
		type: 'order',
		id,
		text: fillText(written.text, draw.scope, `${field}.text`),
		items,
		first,
		truth: sortedKeys(items, first),
		mistakes
	};
}
