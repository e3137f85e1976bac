import { QueryTypes } from 'sequelize';
import type { AuthoredCourse } from '$lib/schemas/desk';
import { sequelize } from '$lib/server/db/connection';
import { draftFileContents } from '$lib/server/db/queries/draft-files';
import type { Actor } from '$lib/server/domain/role';
import { refuseReaders } from './find-draft';
import { DraftOutline } from './outline/draft-outline';

interface Line {
	slug: string;
	title: string | null;
	edition: number | null;
	publishedAt: Date | null;
	draftId: number | null;
	changedBy: string | null;
	changedAt: Date | null;
}

/** Every course, published or not, with its draft. */
export async function listAuthoredCourses(actor: Actor): Promise<AuthoredCourse[]> {
	refuseReaders(actor);
	const lines = await sequelize.query<Line>(
		`SELECT c.slug, e.title, e.number AS edition, e.created_at AS publishedAt, d.id AS draftId,
			u.display_name AS changedBy, f.changed_at AS changedAt
		FROM courses c
		LEFT JOIN editions e ON e.course_id = c.id
			AND e.number = (SELECT MAX(n.number) FROM editions n WHERE n.course_id = c.id)
		LEFT JOIN course_drafts d ON d.course_id = c.id
		LEFT JOIN draft_files f ON f.id = (SELECT l.id FROM draft_files l WHERE l.draft_id = d.id
			ORDER BY l.changed_at DESC, l.id DESC LIMIT 1)
		LEFT JOIN users u ON u.id = f.changed_by
		WHERE e.id IS NOT NULL OR d.id IS NOT NULL
		ORDER BY COALESCE(e.title, c.slug)`,
		{ type: QueryTypes.SELECT }
	);
	return Promise.all(
		lines.map(async ({ slug, title, edition, publishedAt, draftId, changedBy, changedAt }) => ({
			...{ slug, edition },
			title: title ?? (await titleOfDraft(draftId as number)),
			publishedAt: publishedAt?.toISOString() ?? null,
			draft: changedBy && changedAt ? { changedBy, changedAt: changedAt.toISOString() } : null
		}))
	);
}

/** Of a course that has no edition yet. */
async function titleOfDraft(draftId: number): Promise<string> {
	const files = await draftFileContents(draftId);
	const text = files.find(({ path }) => path === 'course.yaml')?.bytes.toString('utf8') ?? '';
	return new DraftOutline(text).title;
}
