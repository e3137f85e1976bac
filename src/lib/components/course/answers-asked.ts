import type { QuestionTypeName } from '$lib/schemas/questions/question';

const WORDS: Record<QuestionTypeName, [one: string, several: string]> = {
	number: ['number with its unit', 'numbers with their units'],
	choice: ['choice', 'choices'],
	'set-up': ['set-up', 'set-ups'],
	mark: ['mark on the plot', 'marks on the plot'],
	order: ['order', 'orders'],
	emissions: ['table of emissions', 'tables of emissions'],
	uncertainty: ['value with its uncertainty', 'values with their uncertainties']
};

/** What an exercise asks for, in words: "3: 2 numbers with their units, 1 choice". */
export function answersAsked(types: readonly QuestionTypeName[]): string {
	const kinds = [...new Set(types)];
	const counted = kinds.map((kind) => {
		const count = types.filter((type) => type === kind).length;
		return { kind, count, words: `${count} ${WORDS[kind][count === 1 ? 0 : 1]}` };
	});
	if (kinds.length === 1) return counted[0].words;
	return `${types.length}: ${counted.map(({ words }) => words).join(', ')}`;
}
