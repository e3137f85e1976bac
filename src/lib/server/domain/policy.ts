import type { Actor, Role } from './role';

/** What may be asked for. Names are `thing.verb`; a name that isn't here is always refused. */
export type Action =
	| 'learn.enter'
	| 'teach.enter'
	| 'office.enter'
	| 'company.enter'
	| 'admin.enter'
	| 'profile.read'
	| 'profile.change'
	| 'lesson.read' // with its live figures
	| 'unit.open-any' // exercises of a unit before what it needs is done
	| 'attempt.start'
	| 'attempt.work' // settings, sweeps, readings, drafts, hints, answers
	| 'attempt.read'
	| 'logbook.keep' // readings, pictures and set-ups across exercises
	| 'saved-set-up.keep' // set-ups put by under a name
	| 'answer-key.read' // truths, scene and seed of an attempt
	| 'progress.read' // names and progress
	| 'sign-off.decide'
	| 'certificate.read'
	| 'course.author'
	| 'booking.read'
	| 'booking.manage' // book, invoice, chase
	| 'user.manage'
	| 'audit.read';

/** How far a permission reaches, decided on the facts of the thing asked for. */
export type Reach =
	| 'any'
	| 'own' // it is the actor's
	| 'own-closed' // it is the actor's and closed
	| 'own-cohort' // the actor teaches the cohort it belongs to
	| 'own-company'; // the actor is a contact of the company it belongs to

/** Facts about a thing, gathered by the service that asks. A fact left out never permits. */
export interface Resource {
	ownerId?: number;
	closed?: boolean;
	cohortInstructorIds?: readonly number[];
	companyContactIds?: readonly number[];
}

/** What each may do with what is theirs, whatever they are. */
const THEIR_OWN: Record<Role, readonly Reach[]> = {
	apprentice: ['own'],
	instructor: ['own'],
	coordinator: ['own'],
	'company-contact': ['own'],
	administrator: ['any']
};

const ANY: readonly Reach[] = ['any'];

/** Who may do what, and how far. No entry, no permission. */
export const PERMISSIONS: Record<Action, Partial<Record<Role, readonly Reach[]>>> = {
	'learn.enter': { apprentice: ANY, instructor: ANY, administrator: ANY },
	'teach.enter': { instructor: ANY, administrator: ANY },
	'office.enter': { coordinator: ANY, administrator: ANY },
	'company.enter': { 'company-contact': ANY, administrator: ANY },
	'admin.enter': { administrator: ANY },
	'profile.read': THEIR_OWN,
	'profile.change': THEIR_OWN,
	'lesson.read': { apprentice: ANY, instructor: ANY, administrator: ANY },
	'unit.open-any': { instructor: ANY, administrator: ANY },
	// Whoever works on an attempt is told the truth at its end, so these go with 'answer-key.read'.
	'attempt.start': { apprentice: ['own'], instructor: ['own'], administrator: ['own'] },
	'attempt.work': { apprentice: ['own'], instructor: ['own'], administrator: ['own'] },
	'logbook.keep': { apprentice: ['own'], instructor: ['own'], administrator: ['own'] },
	'saved-set-up.keep': { apprentice: ['own'], instructor: ['own'], administrator: ['own'] },
	'attempt.read': { ...THEIR_OWN, instructor: ['own', 'own-cohort'] },
	'answer-key.read': { apprentice: ['own-closed'], instructor: ANY, administrator: ANY },
	'progress.read': {
		...THEIR_OWN,
		instructor: ['own', 'own-cohort'],
		coordinator: ANY,
		'company-contact': ['own', 'own-company']
	},
	'sign-off.decide': { instructor: ['own-cohort'], administrator: ANY },
	'certificate.read': { ...THEIR_OWN, 'company-contact': ['own', 'own-company'] },
	'course.author': { instructor: ANY, administrator: ANY },
	'booking.read': { coordinator: ANY, 'company-contact': ['own-company'], administrator: ANY },
	'booking.manage': { coordinator: ANY, 'company-contact': ['own-company'], administrator: ANY },
	'user.manage': { administrator: ANY },
	'audit.read': { administrator: ANY }
};

const REACHES: Record<Reach, (actor: Actor, resource: Resource) => boolean> = {
	any: () => true,
	own: (actor, { ownerId }) => ownerId === actor.id,
	'own-closed': (actor, { ownerId, closed }) => ownerId === actor.id && closed === true,
	'own-cohort': (actor, { cohortInstructorIds }) => cohortInstructorIds?.includes(actor.id) ?? false,
	'own-company': (actor, { companyContactIds }) => companyContactIds?.includes(actor.id) ?? false
};

/** Whether `actor` may do `action` to `resource`. The only place that decides; what it doesn't know it denies. */
export function may(actor: Actor | null, action: Action, resource: Resource = {}): boolean {
	const byRole = Object.hasOwn(PERMISSIONS, action) ? PERMISSIONS[action] : {};
	const reachesOf = (role: Role) => (Object.hasOwn(byRole, role) ? (byRole[role] ?? []) : []);
	return actor !== null && actor.roles.flatMap(reachesOf).some((reach) => REACHES[reach](actor, resource));
}
