import type { CourseLine, PeopleOverview } from '$lib/schemas/overview';
import { listPeople } from '$lib/server/db/queries/people-overview';
import { publishedEditions } from '$lib/server/db/queries/published-outline';
import { may } from '$lib/server/domain/policy';
import { roleName, roles, type Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

const refuse = (): never => {
	throw new DomainError('forbidden', 'This part of the site is not for your role.');
};

/** Everybody whose progress this person may see, by name, and what is published. */
export async function getPeopleOverview(actor: Actor): Promise<PeopleOverview> {
	if (!may(actor, 'office.enter') && !may(actor, 'admin.enter')) refuse();
	const [people, courses] = await Promise.all([listPeople(), listPublished()]);
	return {
		people: people
			.filter(({ id }) => may(actor, 'progress.read', { ownerId: id }))
			.map((person) => ({
				id: person.id,
				name: person.displayName,
				email: person.email,
				roles: roles.filter((role) => person.roles?.split(',').includes(role)).map(roleName),
				disabled: person.disabledAt !== null,
				lastSignInAt: person.lastSignInAt?.toISOString() ?? null,
				attempts: person.attempts,
				passed: person.passed
			})),
		courses
	};
}

/** What a company's contact may know today: which courses there are. */
export async function getCompanyOverview(actor: Actor): Promise<{ courses: CourseLine[] }> {
	if (!may(actor, 'company.enter')) refuse();
	return { courses: await listPublished() };
}

async function listPublished(): Promise<CourseLine[]> {
	const editions = await publishedEditions();
	return editions.map((edition) => ({ ...edition, publishedAt: edition.publishedAt.toISOString() }));
}
