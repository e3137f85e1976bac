import { marked, type Token, type Tokens } from 'marked';
import type { Figure } from '$lib/schemas/figure';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { parseFigureText } from '$lib/server/bench/figure/parse-figure';
import { ContentError } from './content-error';
import { addressIn, textIn, type ContentTree } from './content-tree';
import type { UnitContent } from './course-content';

/** Whether a piece of Markdown is the block of a figure. */
export const isFigureBlock = (token: Token): token is Tokens.Code =>
	token.type === 'code' && (token as Tokens.Code).lang?.trim() === 'figure';

/** A lesson with its figures checked. @throws ContentError at the first fault */
export function readLesson(tree: ContentTree, path: string): Pick<UnitContent, 'lessonMarkdown' | 'figures'> {
	const lessonMarkdown = textIn(tree, path);
	return { lessonMarkdown, figures: figuresIn(lessonMarkdown, addressIn(tree, path)) };
}

/**
 * The figures of a lesson's text, in their order.
 * @param address of the file, for faults
 * @throws ContentError at the first fault
 */
export function figuresIn(markdown: string, address: string): Figure[] {
	const figures: Figure[] = [];
	let line = 1;
	for (const token of marked.lexer(markdown)) {
		if (isFigureBlock(token)) {
			const figure = readFigure(token.text, address, line + 1);
			if (figures.some(({ id }) => id === figure.id))
				throw new ContentError(address, line + 1, 'id', `two figures of this lesson are called ${figure.id}`);
			figures.push(figure);
		} else {
			marked.walkTokens([token], (inner) => {
				if (isFigureBlock(inner))
					throw new ContentError(address, line, '', 'a figure stands by itself, in no list and no quotation');
			});
		}
		line += token.raw.split('\n').length - 1;
	}
	return figures;
}

/** @param firstLine of the figure's text in the file */
function readFigure(text: string, address: string, firstLine: number): Figure {
	try {
		return parseFigureText(text);
	} catch (cause) {
		if (!(cause instanceof ExerciseError)) throw cause;
		const [{ field, message, line = 1 }] = cause.issues;
		throw new ContentError(address, firstLine + line - 1, field, message);
	}
}
