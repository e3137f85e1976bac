import { LineCounter, parseDocument } from 'yaml';
import { exercise as exerciseSchema, type Exercise } from '$lib/schemas/exercise';
import { BenchError } from '../bench-error';
import { checkExercise } from './check-exercise';
import { drawParameters } from './draw-parameters';
import { ExerciseError, type ExerciseIssue } from './exercise-error';
import { fillExercise } from './fill-exercise';
import { lineOf } from './line-of';
import { issuesOf } from './zod-issues';

/** Draws filled in to see that every place comes out valid. */
const TRIAL_DRAWS = 12;

/**
 * An exercise from what a file or a form holds.
 * @throws ExerciseError with every fault by field, unknown keys among them
 */
export function parseExercise(data: unknown): Exercise {
	const parsed = exerciseSchema.safeParse(data);
	if (!parsed.success) throw new ExerciseError(issuesOf(parsed.error));
	const issues = checkExercise(parsed.data);
	if (issues.length > 0) throw new ExerciseError(issues);
	for (let draw = 0; draw < TRIAL_DRAWS; draw++) tryDraw(parsed.data, draw);
	return parsed.data;
}

function tryDraw(exercise: Exercise, draw: number): void {
	try {
		fillExercise(exercise, drawParameters(exercise, 'trial', draw), 'trial', draw);
	} catch (error) {
		if (error instanceof ExerciseError || !(error instanceof BenchError)) throw error;
		throw new ExerciseError([{ field: error.field, message: error.message }]);
	}
}

/**
 * An exercise from the text of its YAML file.
 * @throws ExerciseError whose message starts with file, line and field
 */
export function parseExerciseText(text: string, file: string): Exercise {
	const lines = new LineCounter();
	const document = parseDocument(text, { lineCounter: lines, prettyErrors: false });
	const [fault] = document.errors;
	if (fault) {
		const line = lines.linePos(fault.pos[0]).line;
		throw new ExerciseError([{ field: '(file)', message: fault.message, line }], file);
	}
	try {
		return parseExercise(document.toJS());
	} catch (error) {
		if (!(error instanceof ExerciseError)) throw error;
		const placed = error.issues.map((issue): ExerciseIssue => ({
			...issue,
			line: lineOf(document, lines, issue.field)
		}));
		throw new ExerciseError(placed, file);
	}
}
