import type { TypedAnswer } from '$lib/schemas/answer';
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
	}
}

/** Whether nothing has been answered yet. */
export function isBlank(answer: TypedAnswer): boolean {
	switch (answer.type) {
		case 'number':
			return answer.text.trim() === '';
		case 'choice':
			return answer.chosen.length === 0;
		case 'set-up':
			return answer.setUp === null;
	}
}

/** What to do about it. */
export const blankWords: Record<TypedAnswer['type'], string> = {
	number: 'Type an answer first.',
	choice: 'Choose first.',
	'set-up': 'Put a set-up in first.'
};
