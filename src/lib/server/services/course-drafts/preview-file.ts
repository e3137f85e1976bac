import type { FigureChoice } from '$lib/schemas/figure';
import type { FigureState } from '$lib/schemas/figure-view';
import type { LessonPartView } from '$lib/schemas/lesson-view';
import type { ExercisePreview, LessonPreview } from '$lib/schemas/preview-view';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentFigure } from '$lib/server/present/figure';
import { renderLesson } from '../courses/render-lesson';
import { askBench } from '../desk-threads/desk-threads';
import { linksIn } from './check-links';
import { draftFilesOf } from './draft-tree';
import { getDraft, refuseReaders } from './find-draft';
import { DraftOutline } from './outline/draft-outline';

/** A lesson's text as an apprentice would see it, with its faults and where its links lead. @throws DomainError `not_found` */
export async function previewLesson(actor: Actor, slug: string, text: string): Promise<LessonPreview> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const { faults, figures } = await askBench('figures', { text });
	const lesson = renderLesson(
		text,
		figures.map(({ figure }) => figure.id),
		'Without a title'
	);
	const parts = lesson.parts.flatMap((part): LessonPartView[] => {
		if (part.kind === 'text') return [part];
		const found = figures.find(({ figure }) => figure.id === part.id);
		return found ? [{ kind: 'figure', figure: presentFigure(found.figure, found.start) }] : [];
	});
	const links = linksIn(text, await destinationsOf(draft.id));
	return { faults, title: lesson.title, words: lesson.words, parts, links };
}

async function destinationsOf(draftId: number) {
	const files = await draftFilesOf(draftId);
	const outline = new DraftOutline(Buffer.from(files.get('course.yaml') ?? '').toString('utf8')).units;
	const units = await Unit.findAll({ attributes: ['slug'], group: ['slug'] });
	const exercises = await Exercise.findAll({ attributes: ['slug'], group: ['slug'] });
	return {
		units: new Set([...units, ...outline].map(({ slug }) => slug)),
		exercises: new Set([...exercises.map(({ slug }) => slug), ...outline.flatMap((unit) => unit.exercises)])
	};
}

/** A figure of a lesson's text with its controls turned. @throws DomainError `not_found` for one that it doesn't offer */
export async function turnDraftFigure(
	actor: Actor,
	slug: string,
	asked: { text: string; id: string; values: FigureChoice[] }
): Promise<FigureState> {
	refuseReaders(actor);
	await getDraft(slug);
	const state = await askBench('turn', asked);
	if (!state) throw new DomainError('not_found', 'The lesson has no such figure.');
	return state;
}

/** An exercise's text: its faults, or the signal of one seed with what is true of it. @throws DomainError `not_found` */
export async function previewExerciseText(
	actor: Actor,
	course: string,
	{ text, path, seed }: { text: string; path: string; seed: number }
): Promise<ExercisePreview> {
	refuseReaders(actor);
	await getDraft(course);
	const slug = path.replace(/^.*\//, '').replace(/\.yaml$/, '');
	return askBench('preview', { text, slug, seed });
}
