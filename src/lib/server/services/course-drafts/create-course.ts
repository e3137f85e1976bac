import { stringify } from 'yaml';
import type { NewCourse } from '$lib/schemas/desk';
import { folderOf } from '$lib/server/content/read-course';
import { Course } from '$lib/server/db/models/course';
import { CourseDraft } from '$lib/server/db/models/course-draft';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { refuseReaders } from './find-draft';
import { lessonStart } from './outline/exercise-start';
import { freeSlug, slugOf } from './outline/slug-of';
import { slugsElsewhere } from './taken-slugs';
import { createDraftFile } from './write-draft-file';

/** A course of one unit without exercises, as a draft; apprentices see it when its first edition is published. @returns its slug */
export function createCourse(actor: Actor, asked: NewCourse, now: Date): Promise<string> {
	refuseReaders(actor);
	return inTransaction(async (transaction) => {
		const taken = new Set(
			(await Course.findAll({ attributes: ['slug'], transaction })).map((course) => course.slug)
		);
		const slug = freeSlug(slugOf(asked.title), (name) => taken.has(name));
		const course = await Course.create({ slug, createdAt: now }, { transaction });
		const draft = await CourseDraft.create(
			{ courseId: course.id, editionId: null, createdBy: actor.id, createdAt: now },
			{ transaction }
		);
		const { units } = await slugsElsewhere(course.id, transaction);
		const unit = { number: 1, slug: freeSlug(slugOf(asked.unit), (name) => units.has(name)) };
		const { title, summary } = asked;
		const entry = { ...unit, title: asked.unit, summary: asked.unit, exercises: [] };
		const files = {
			'course.yaml': stringify({ slug, title, summary, units: [entry] }, { lineWidth: 0 }),
			[`${folderOf(unit)}/lesson.md`]: lessonStart(asked.unit)
		};
		for (const [path, text] of Object.entries(files)) {
			const bytes = Buffer.from(text, 'utf8');
			await createDraftFile(draft.id, path, { bytes, origin: 'begun', by: actor.id, now }, transaction);
		}
		return slug;
	});
}
