import type { TypedAnswer, TypedAs } from '$lib/schemas/answer';
import type { QuestionView } from '$lib/schemas/questions/view';

/** What stands in a question's field before anything is answered. */
export function blankAnswer(question: QuestionView): TypedAnswer {
	switch (question.type) {
		case 'number':
			return { type: 'number', text: '', unit: question.unit };
		case 'choice':
			return { type: 'choice', chosen: [] };
		case 'set-up':
			return { type: 'set-up', setUp: null };
		case 'mark':
			return { type: 'mark', atHz: null, toHz: null };
		case 'order':
			return { type: 'order', order: [] };
		case 'emissions':
			return { type: 'emissions', rows: [blankRow()] };
		case 'uncertainty':
			return { type: 'uncertainty', value: { text: '', unit: question.unit }, expanded: '', k: '' };
	}
}

/** A row of a table before anything is typed into it. */
export const blankRow = (): TypedAs<'emissions'>['rows'][number] => ({
	frequency: { text: '', unit: 'MHz' },
	level: { text: '', unit: 'dBm' },
	breaks: null
});

/** Whether nothing has been answered yet. */
export function isBlank(answer: TypedAnswer): boolean {
	switch (answer.type) {
		case 'number':
			return answer.text.trim() === '';
		case 'choice':
			return answer.chosen.length === 0;
		case 'set-up':
			return answer.setUp === null;
		case 'mark':
			return answer.atHz === null && (answer.toHz ?? null) === null;
		case 'order':
			return answer.order.length === 0;
		case 'emissions':
			return answer.rows.every(({ frequency, level }) => `${frequency.text}${level.text}`.trim() === '');
		case 'uncertainty':
			return `${answer.value.text}${answer.expanded}${answer.k}`.trim() === '';
	}
}

/** What to do about it. */
export const blankWords: Record<TypedAnswer['type'], string> = {
	number: 'Type an answer first.',
	choice: 'Choose first.',
	'set-up': 'Put a set-up in first.',
	mark: 'Mark a place first.',
	order: 'Put them in order first.',
	emissions: 'Fill in a row first.',
	uncertainty: 'State a value first.'
};
