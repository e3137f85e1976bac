import { BenchError } from '../bench-error';

export interface ExerciseIssue {
	/** "scene.emitters[0].levelDbm" */
	field: string;
	message: string;
	/** Line in the file, from 1, when it came from one. */
	line?: number;
}

/** An exercise that can't be used: every fault found, by field. The error's own field and message are the first one's. */
export class ExerciseError extends BenchError {
	readonly issues: readonly ExerciseIssue[];

	constructor(issues: readonly ExerciseIssue[], file?: string) {
		const [{ field, message, line }] = issues;
		const place = file ? `${file}${line ? `:${line}` : ''}: ` : '';
		super(field, `${place}${field}: ${message}`);
		this.name = 'ExerciseError';
		this.issues = issues;
	}
}

/** Runs `check`, turning a refusal into issues. */
export function refusalsOf(check: () => void): ExerciseIssue[] {
	try {
		check();
		return [];
	} catch (error) {
		if (error instanceof ExerciseError) return [...error.issues];
		if (error instanceof BenchError) return [{ field: error.field, message: error.message }];
		throw error;
	}
}
