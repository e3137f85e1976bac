import { LineCounter, parseDocument } from 'yaml';
import { figure as figureSchema, type Figure } from '$lib/schemas/figure';
import { ExerciseError, type ExerciseIssue } from '../exercise/exercise-error';
import { lineOf } from '../exercise/line-of';
import { issuesOf } from '../exercise/zod-issues';
import { checkFigure } from './check-figure';

/**
 * A figure from the YAML of its block.
 * @throws ExerciseError with every fault by field, and the line of each, counted from the first of `text`
 */
export function parseFigureText(text: string): Figure {
	const lines = new LineCounter();
	const document = parseDocument(text, { lineCounter: lines, prettyErrors: false, uniqueKeys: true });
	const [fault] = document.errors;
	if (fault) {
		const line = lines.linePos(fault.pos[0]).line;
		throw new ExerciseError([{ field: '', message: fault.message, line }]);
	}
	const parsed = figureSchema.safeParse(document.toJS());
	const issues = parsed.success ? checkFigure(parsed.data) : issuesOf(parsed.error);
	if (!parsed.success || issues.length > 0) {
		throw new ExerciseError(
			issues.map((issue): ExerciseIssue => ({ ...issue, line: lineOf(document, lines, issue.field) ?? 1 }))
		);
	}
	return parsed.data;
}
