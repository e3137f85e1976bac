import type { GlossaryView } from '$lib/schemas/glossary';
import { Edition } from '$lib/server/db/models/edition';
import { Unit } from '$lib/server/db/models/unit';
import { newestEditions } from '$lib/server/db/queries/newest-editions';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { presentGlossaryTerm } from '$lib/server/present/glossary';

/** The terms of every course as published now, by term. */
export async function listGlossary(actor: Actor): Promise<GlossaryView[]> {
	refuseUnless(actor, 'lesson.read');
	const courses = await newestEditions();
	return Promise.all(
		courses.map(async ({ editionId, slug, title }) => {
			const edition = await Edition.findByPk(editionId, { attributes: ['glossary'], rejectOnEmpty: true });
			const units = await Unit.findAll({ where: { editionId }, attributes: ['number', 'slug', 'title'] });
			const terms = edition.glossary.flatMap((term) => {
				const unit = units.find((candidate) => candidate.slug === term.unit);
				return unit ? [presentGlossaryTerm(term, unit)] : [];
			});
			return { course: { slug, title }, terms };
		})
	);
}
