/**
 * What the authoring desk asks of the bench, in a thread of its own: checking an exercise draws scenes, and proving one
 * sweeps thousands of rows.
 */
import type { Exercise } from '$lib/schemas/exercise';
import type { ExercisePreview, SignalPreview, TextFault } from '$lib/schemas/preview-view';
import type { ProofResult } from '$lib/schemas/proof-view';
import { BenchError } from '$lib/server/bench/bench-error';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { previewExercise } from '$lib/server/bench/exercise/preview-exercise';
import { proofResult } from '$lib/server/bench/proof/proof-result';
import { proveSeeds } from '$lib/server/bench/proof/prove-exercise';
import type { SeedProof } from '$lib/server/bench/proof/prove-seed';
import { computeFigure } from '$lib/server/bench/figure/compute-figure';
import { startValues } from '$lib/server/bench/figure/choices';
import type { Figure, FigureChoice } from '$lib/schemas/figure';
import type { FigureState } from '$lib/schemas/figure-view';
import type { ContentError } from '$lib/server/content/content-error';
import { treeOfFiles } from '$lib/server/content/content-tree';
import type { CourseContent } from '$lib/server/content/course-content';
import { figuresIn } from '$lib/server/content/read-lesson';
import { ContentError as Fault } from '$lib/server/content/content-error';
import { readCourse } from '$lib/server/content/read-course';
import { answerInThread } from '../process/answer-in-thread';

export type CourseFault = Pick<ContentError, 'file' | 'line' | 'field' | 'reason'>;

/** What can be asked, by name, and what is answered. */
export interface DeskWork {
	/** An exercise's text: its faults, or the signal of one seed. */
	preview: { asked: { text: string; slug: string; seed: number }; answer: ExercisePreview };
	/** A lesson's text: its figures as they start, or its first fault. */
	figures: {
		asked: { text: string };
		answer: { faults: TextFault[]; figures: { figure: Figure; start: FigureState }[] };
	};
	turn: { asked: { text: string; id: string; values: FigureChoice[] }; answer: FigureState | null };
	/** A whole course: what it holds, or every fault; and the exercises that were checked anew. */
	course: {
		asked: { name: string; files: Map<string, Uint8Array>; checked: Map<string, Exercise> };
		answer: { content: CourseContent | null; faults: CourseFault[]; checked: Map<string, Exercise> };
	};
	parse: { asked: { text: string }; answer: Exercise };
	prove: { asked: { exercise: Exercise; fromSeed: number; seeds: number }; answer: SeedProof[] };
	result: { asked: { exercise: Exercise; fromSeed: number; proofs: SeedProof[] }; answer: ProofResult };
}
export type DeskTask = { [K in keyof DeskWork]: { do: K } & DeskWork[K]['asked'] }[keyof DeskWork];

/** Where this module is: in a build, its chunk. */
export const workerUrl = import.meta.url;

export function work(task: DeskTask): DeskWork[keyof DeskWork]['answer'] {
	switch (task.do) {
		case 'preview':
			return preview(task);
		case 'figures':
			return figures(task.text);
		case 'turn': {
			const figure = figuresIn(task.text, 'lesson.md').find(({ id }) => id === task.id);
			const offered = figure?.controls.every(({ choices }, i) => choices.includes(task.values[i]));
			return figure && offered ? computeFigure(figure, task.values) : null;
		}
		case 'course':
			return course(task);
		case 'parse':
			return parseExerciseText(task.text, 'exercise');
		case 'prove':
			return proveSeeds(task.exercise, { seeds: task.seeds, fromSeed: task.fromSeed });
		case 'result':
			return proofResult(task.exercise, task.fromSeed, task.proofs);
	}
}

function preview({ text, slug, seed }: DeskWork['preview']['asked']): ExercisePreview {
	const refused = (field: string, message: string, line: number | null = null): ExercisePreview => ({
		faults: [{ field, message, line }],
		signal: null
	});
	try {
		const exercise = parseExerciseText(text, '');
		if (exercise.slug !== slug) return refused('slug', `must be the file’s name, ${slug}`, 1);
		return { faults: [], signal: swept(exercise, seed) };
	} catch (cause) {
		if (cause instanceof ExerciseError) {
			const faults = cause.issues.map(({ field, message, line = null }) => ({ field, message, line }));
			return { faults, signal: null };
		}
		if (cause instanceof BenchError) return refused(cause.field, cause.message);
		throw cause;
	}
}

function swept(exercise: Exercise, seed: number): SignalPreview {
	try {
		return previewExercise(exercise, seed);
	} catch (cause) {
		if (cause instanceof ExerciseError || !(cause instanceof BenchError)) throw cause;
		throw new BenchError(cause.field, `With seed ${seed}: ${cause.message}`);
	}
}

function figures(text: string): DeskWork['figures']['answer'] {
	try {
		const found = figuresIn(text, 'lesson.md');
		return {
			faults: [],
			figures: found.map((figure) => ({ figure, start: computeFigure(figure, startValues(figure)) }))
		};
	} catch (cause) {
		if (!(cause instanceof Fault)) throw cause;
		return { faults: [{ field: cause.field, message: cause.reason, line: cause.line }], figures: [] };
	}
}

function course({ name, files, checked }: DeskWork['course']['asked']): DeskWork['course']['answer'] {
	const faults: CourseFault[] = [];
	const known = new Set(checked.keys());
	const content = readCourse(treeOfFiles(name, files), checked, ({ file, line, field, reason }) =>
		faults.push({ file, line, field, reason })
	);
	return { content, faults, checked: new Map([...checked].filter(([hash]) => !known.has(hash))) };
}

answerInThread('desk', work);
