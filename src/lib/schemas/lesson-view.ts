/** A unit's lesson as a page shows it, with what stands around it. */
import { z } from 'zod';
import { exerciseProgress, lockView } from './course-view';
import { termNote } from './glossary';
import { figureView } from './figure-view';

const unitLine = z.strictObject({ number: z.int(), slug: z.string(), title: z.string() });

export const lessonPartView = z.discriminatedUnion('kind', [
	/** Sanitised when it was imported. */
	z.strictObject({ kind: z.literal('text'), html: z.string() }),
	z.strictObject({ kind: z.literal('figure'), figure: figureView })
]);

export const lessonView = z.strictObject({
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	unit: z.strictObject({ id: z.int(), ...unitLine.shape, summary: z.string() }),
	/** Null when its exercises are open to this person; the lesson always is. */
	lock: lockView.nullable(),
	title: z.string(),
	words: z.int(),
	parts: z.array(lessonPartView),
	/** Those marked in it, in the order of their first use. */
	terms: z.array(termNote),
	/** Of this unit, with what the reader has done. */
	exercises: z.array(exerciseProgress),
	/** The units around it. */
	before: unitLine.nullable(),
	after: unitLine.nullable()
});

export type LessonPartView = z.infer<typeof lessonPartView>;
export type LessonView = z.infer<typeof lessonView>;
