import type { Exercise } from '$lib/schemas/exercise';
import type { WrittenNumber } from '$lib/schemas/questions/number';
import { refusalsOf, type ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import { fillTemplate } from '$lib/server/bench/exercise/fill-template';
import { isAbsoluteLevel } from '$lib/server/bench/grading/asked';
import { bindMistake } from '$lib/server/bench/grading/watched-mistakes';
import { profileNamed } from '$lib/server/bench/receiver/profiles';

/** A tolerance that the receiver can keep, in a unit that it suits; mistakes that exist, each once. */
export function checkNumber(question: WrittenNumber, field: string, { receiver }: Exercise): ExerciseIssue[] {
	const profile = typeof receiver === 'string' ? profileNamed(receiver) : receiver;
	const issues: ExerciseIssue[] = [];
	const { tolerance } = question;
	if (
		isAbsoluteLevel(question.unit) &&
		'absolute' in tolerance &&
		tolerance.absolute < profile.levelErrorDb
	) {
		const message = `must be at least the receiver’s level error, ${profile.levelErrorDb} dB, plus three spreads; given ${tolerance.absolute}`;
		issues.push({ field: `${field}.tolerance.absolute`, message });
	}
	if (isAbsoluteLevel(question.unit) && 'relative' in tolerance) {
		issues.push({ field: `${field}.tolerance`, message: 'a level’s tolerance is absolute, in dB' });
	}
	if (question.noiseTakenOff && !isAbsoluteLevel(question.unit) && question.unit !== 'dBc/Hz') {
		const message = `noise is taken off levels and densities, in dBm, dBm/Hz or dBc/Hz; this is in ${question.unit}`;
		issues.push({ field: `${field}.noiseTakenOff`, message });
	}
	const seen = new Set<string>();
	question.mistakes.forEach((mistake, j) => {
		const place = `${field}.mistakes[${j}]`;
		// Parameters given as expressions are checked when a draw fills them in; 1 stands for any of them here.
		issues.push(...refusalsOf(() => void bindMistake(plain(mistake, place) as typeof mistake, place)));
		const key = JSON.stringify(mistake);
		if (seen.has(key)) issues.push({ field: place, message: 'is watched twice' });
		seen.add(key);
	});
	return issues;
}

/** A template with 1 in the place of every expression. */
const plain = (template: unknown, field: string): unknown =>
	fillTemplate(
		JSON.parse(JSON.stringify(template), (_, value) =>
			typeof value === 'string' && value.startsWith('=') ? 1 : (value as unknown)
		),
		{},
		field
	);
