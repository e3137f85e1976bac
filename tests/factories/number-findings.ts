import type { Finding } from '$lib/schemas/finding';
import type { NumberFinding } from '$lib/schemas/questions/finding';

/** What a finding says of the questions that ask for numbers. */
export const numberFindings = ({ questions }: Pick<Finding, 'questions'>): NumberFinding[] =>
	questions.filter((question) => question.type === 'number');
