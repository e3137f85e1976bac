import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { GlossaryTerm } from '$lib/schemas/glossary';
import type { ContentTree } from '$lib/server/content/content-tree';
import type { CourseContent, UnitContent } from '$lib/server/content/course-content';
import { Edition } from '$lib/server/db/models/edition';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { noteEditionFiles } from '../course-files/edition-files';
import { renderLesson } from './render-lesson';
import { renderMarkdownTemplate } from './render-markdown';

export interface NewEdition {
	courseId: number;
	number: number;
	content: CourseContent;
	/** What the content was read from. */
	tree: ContentTree;
	/** Null where it comes from content/. */
	publishedBy: number | null;
	now: Date;
}

/** What tells one edition's content from another's. */
export const hashOfContent = (content: CourseContent): string =>
	createHash('sha256').update(JSON.stringify(content)).digest('hex');

/** Makes an edition with its units, lessons, exercises and files. Whoever calls has locked the course. */
export async function createEdition(
	{ courseId, number, content, tree, publishedBy, now }: NewEdition,
	transaction: Transaction
): Promise<Edition> {
	const { title, summary, glossary } = content;
	const contentHash = hashOfContent(content);
	const edition = await Edition.create(
		{ courseId, number, title, summary, glossary, contentHash, createdAt: now, publishedBy },
		{ transaction }
	);
	for (const unit of content.units) await createUnit(edition.id, unit, glossary, transaction);
	await noteEditionFiles(edition.id, tree, transaction);
	return edition;
}

async function createUnit(
	editionId: number,
	content: UnitContent,
	glossary: readonly GlossaryTerm[],
	transaction: Transaction
): Promise<void> {
	const { number, slug, title, summary, needs, doneWith = null } = content;
	const { lessonMarkdown, figures, exercises } = content;
	const lesson = renderLesson(
		lessonMarkdown,
		figures.map(({ id }) => id),
		title,
		glossary
	);
	const unit = await Unit.create(
		{ editionId, number, slug, title, summary, needs, doneWith, lesson, figures },
		{ transaction }
	);
	const rows = exercises.map((definition, index) => ({
		editionId,
		unitId: unit.id,
		number: index + 1,
		slug: definition.slug,
		title: definition.title,
		definition,
		situationHtml: renderMarkdownTemplate(definition.situation),
		tries: definition.tries
	}));
	await Exercise.bulkCreate(rows, { transaction });
}
