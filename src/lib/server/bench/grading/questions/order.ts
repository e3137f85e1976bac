/** Asks to put items in order. */
import type { TypedAs } from '$lib/schemas/answer';
import type { WrittenOrder } from '$lib/schemas/questions/order';
import type { OrderAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { FilledStep, OrderQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { parseExpression } from '$lib/server/bench/exercise/expression';
import { optionKey } from './option-keys';
import { checkBy, checkOrder } from './order/check';
import { fillOrder, sortedKeys } from './order/fill';
import { inverted, judgeOrder } from './order/judge';
import type { QuestionType, Read, WrongWay } from './question-type';

export const order: QuestionType<'order'> = {
	check: checkOrder,
	checkAnswer: checkBy,
	fill: fillOrder,
	fillAnswer(step, question, scope, field) {
		const by = question.items.map(({ id }) => parseExpression(step.by?.[id] ?? '', `${field}.by.${id}`));
		return {
			gives: ({ values }) => ({
				order: sortedKeys(
					question.items.map(({ key }, i) => ({ key, by: by[i].evaluate({ ...scope, ...values }) })),
					question.first
				)
			})
		};
	},
	read: readOrder,
	words: ({ items }, given) =>
		(given as OrderAnswer).order.map((key) => items.find((item) => item.key === key)?.text ?? key).join(', '),
	judge: judgeOrder,
	wrongWays: (_, question) => wrongOrders(question)
};

function readOrder({ items }: WrittenOrder, typed: TypedAs<'order'>): Read {
	if (typed.order.length === 0) return null;
	const keys = items.map((_, i) => optionKey(i));
	const isWhole = typed.order.length === keys.length && keys.every((key) => typed.order.includes(key));
	if (!isWhole) return { issues: [{ field: 'order', message: 'Every item stands in the order once.' }] };
	return { given: { order: typed.order } };
}

/** The two of each mistake the other way about, and everything the other way about. */
function wrongOrders(question: OrderQuestion): WrongWay[] {
	const { id, truth, items, mistakes } = question;
	const way = (name: string, made: string[], isNamed: WrongWay['isNamed']): WrongWay => ({
		id: name,
		make: (steps) =>
			steps.map((step): FilledStep =>
				step.do === 'answer' && step.question === id
					? { do: 'answer', question: id, gives: () => ({ order: made }) }
					: step
			),
		isNamed
	});
	const keyOf = (item: string) => items.find((one) => one.id === item)?.key ?? '';
	const swaps = mistakes.map((mistake) => {
		const [a, b] = mistake.items.map(keyOf);
		const made = truth.map((key) => (key === a ? b : key === b ? a : key));
		const named = inverted(question, made).map((one) => one.id);
		return way(mistake.id, made, (finding) => {
			const kinds = finding.mistakes.map(({ kind }) => kind);
			return kinds.includes(mistake.id) && kinds.every((kind) => named.includes(kind));
		});
	});
	return [...swaps, way('reversed', [...truth].reverse(), ({ verdict }) => verdict === 'wrong')];
}
