import { longestQuery, type FindView } from '$lib/schemas/find-view';
import { newestEditions } from '$lib/server/db/queries/newest-editions';
import { findIn } from '$lib/server/domain/find/find-in';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { courseDocuments } from './course-documents';

const MOST_SHOWN = 40;

/** What the courses published now say of a query: terms, exercises and places in lessons. Of a long query, its beginning. */
export async function findInCourses(actor: Actor, query: string): Promise<FindView> {
	refuseUnless(actor, 'lesson.read');
	const asked = query.slice(0, longestQuery).trim();
	const editions = await newestEditions();
	const documents = await Promise.all(editions.map(({ editionId }) => courseDocuments(editionId)));
	const found = findIn(documents.flat(), asked);
	return {
		query: asked,
		total: found.length,
		results: found.slice(0, MOST_SHOWN).map(({ document: { kind, place, href }, title, excerpt }) => ({
			...{ kind, title, place, href, excerpt }
		}))
	};
}
