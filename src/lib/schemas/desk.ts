/** What crosses the wire at the authoring desk. */
import { z } from 'zod';
import { exercisePreview, lessonPreview } from './preview-view';
import { proofState } from './proof-view';

/** Characters a file of a course may have. */
export const MOST_CHARACTERS = 120_000;

const filePath = z
	.string()
	.max(200)
	.regex(/^\d\d-[a-z0-9-]+\/[a-z0-9.-]+$/, 'must be a file of a unit');
const revision = z.int().min(1);
const text = z.string().max(MOST_CHARACTERS, `at most ${MOST_CHARACTERS} characters`);

/** `PUT …/files`: what was typed, and the revision it was typed over. */
export const saveFileRequest = z.strictObject({ path: filePath, text, revision });
/** `POST …/restorations`: an earlier version brought back over the present revision. */
export const restoreRequest = z.strictObject({ path: filePath, versionId: z.int().min(1), revision });
/** `POST …/presence`: this file is open here. */
export const presenceRequest = z.strictObject({ path: filePath });
export const fileQuery = z.strictObject({ path: filePath });

/** A draft's file as its editor gets it. */
export const draftFileView = z.strictObject({
	path: z.string(),
	text: z.string(),
	revision: z.int(),
	changedBy: z.string(),
	changedAt: z.iso.datetime()
});

/** What came of a save; with a refusal for somebody else's save in between, theirs as a `draftFileView` under `theirs`. */
export const savedFile = z.strictObject({
	revision: z.int(),
	changedBy: z.string(),
	changedAt: z.iso.datetime()
});
export const saveConflict = z.object({ message: z.string(), theirs: draftFileView });

export const fileVersionView = z.strictObject({
	id: z.int(),
	origin: z.enum(['begun', 'typed', 'restored', 'zip', 'outline']),
	note: z.string().nullable(),
	changedBy: z.string(),
	begunAt: z.iso.datetime(),
	changedAt: z.iso.datetime()
});
export const fileVersions = z.strictObject({ versions: z.array(fileVersionView) });
export const fileVersionText = z.strictObject({ ...fileVersionView.shape, text: z.string() });

/** Who else has the file open, and how it stands now. */
export const presenceView = z.strictObject({
	others: z.array(z.strictObject({ name: z.string(), openedAt: z.iso.datetime() })),
	...savedFile.shape
});

export type SaveFileRequest = z.infer<typeof saveFileRequest>;
export type RestoreRequest = z.infer<typeof restoreRequest>;
export type DraftFileView = z.infer<typeof draftFileView>;
export type SavedFile = z.infer<typeof savedFile>;
export type FileVersionView = z.infer<typeof fileVersionView>;
export type FileVersionText = z.infer<typeof fileVersionText>;
export type PresenceView = z.infer<typeof presenceView>;

const slug = z
	.string()
	.max(80)
	.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'lower-case words joined by hyphens');
const line = z.string().trim().min(1, 'is needed').max(300, 'at most 300 characters');
const place = z.coerce.number().int().min(0).max(99);

/** One change of what a course is made of. Units and exercises are named by their slugs, places count from 0. */
export const outlineChange = z.discriminatedUnion('do', [
	z.strictObject({ do: z.literal('rename-course'), title: line, summary: line }),
	z.strictObject({ do: z.literal('add-unit'), title: line, summary: line }),
	z.strictObject({ do: z.literal('rename-unit'), unit: slug, title: line, summary: line }),
	z.strictObject({ do: z.literal('move-unit'), unit: slug, to: place }),
	z.strictObject({ do: z.literal('duplicate-unit'), unit: slug }),
	z.strictObject({ do: z.literal('archive-unit'), unit: slug }),
	z.strictObject({ do: z.literal('restore-unit'), folder: z.string().max(90) }),
	z.strictObject({ do: z.literal('add-exercise'), unit: slug, title: line }),
	z.strictObject({ do: z.literal('move-exercise'), exercise: slug, unit: slug, to: place }),
	z.strictObject({ do: z.literal('duplicate-exercise'), exercise: slug }),
	z.strictObject({ do: z.literal('archive-exercise'), exercise: slug }),
	z.strictObject({ do: z.literal('restore-exercise'), path: z.string().max(200), unit: slug })
]);
export type OutlineChange = z.infer<typeof outlineChange>;

export const newCourse = z.strictObject({ title: line, summary: line, unit: line });
export type NewCourse = z.infer<typeof newCourse>;

/** How an exercise of a draft stands: its text as it is kept now. */
export const exerciseStates = ['published', 'proven', 'failed', 'proving', 'draft'] as const;

const changed = { changedBy: z.string(), changedAt: z.iso.datetime() };
export const draftView = z.strictObject({
	slug: z.string(),
	title: z.string(),
	summary: z.string(),
	/** The newest edition; null before the first. */
	newest: z.strictObject({ number: z.int(), publishedAt: z.iso.datetime() }).nullable(),
	units: z.array(
		z.strictObject({
			number: z.int(),
			slug: z.string(),
			title: z.string(),
			summary: z.string(),
			lesson: z.strictObject({ path: z.string(), published: z.boolean(), ...changed }),
			exercises: z.array(
				z.strictObject({
					slug: z.string(),
					title: z.string(),
					path: z.string(),
					state: z.enum(exerciseStates),
					...changed
				})
			)
		})
	),
	archive: z.strictObject({
		units: z.array(z.strictObject({ folder: z.string(), title: z.string() })),
		exercises: z.array(z.strictObject({ path: z.string(), title: z.string() }))
	}),
	/** Against the newest edition. */
	changes: z.array(
		z.strictObject({ path: z.string(), what: z.enum(['added', 'changed', 'moved', 'taken out']) })
	),
	/** What must be proven before an edition can be published. */
	unproven: z.array(z.strictObject({ path: z.string(), title: z.string() }))
});

export const authoredCourse = z.strictObject({
	slug: z.string(),
	title: z.string(),
	edition: z.int().nullable(),
	publishedAt: z.iso.datetime().nullable(),
	draft: z.strictObject(changed).nullable()
});

export type ExerciseState = (typeof exerciseStates)[number];
export type DraftView = z.infer<typeof draftView>;
export type AuthoredCourse = z.infer<typeof authoredCourse>;

const filePlace = {
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	unit: z.strictObject({ number: z.int(), title: z.string() }),
	file: draftFileView
};
/** What the desk of one file shows at first. */
export const fileDesk = z.discriminatedUnion('kind', [
	z.strictObject({ kind: z.literal('lesson'), ...filePlace, preview: lessonPreview }),
	z.strictObject({
		kind: z.literal('exercise'),
		...filePlace,
		/** Within its unit, from 1. */
		number: z.int(),
		preview: exercisePreview,
		proof: proofState
	})
]);
export type FileDesk = z.infer<typeof fileDesk>;
export type LessonDesk = Extract<FileDesk, { kind: 'lesson' }>;
export type ExerciseDesk = Extract<FileDesk, { kind: 'exercise' }>;
