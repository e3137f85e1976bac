import { may, type Action } from './policy';
import type { Actor, Role } from './role';

export interface Room {
	label: string;
	href: string;
	enter: Action;
}

/** The rooms of the site that people sign in to, in the order of the menu. */
const ROOMS: readonly Room[] = [
	{ label: 'Learn', href: '/learn', enter: 'learn.enter' },
	{ label: 'Teach', href: '/teach', enter: 'teach.enter' },
	{ label: 'Office', href: '/office', enter: 'office.enter' },
	{ label: 'Company', href: '/company', enter: 'company.enter' },
	{ label: 'Administration', href: '/admin', enter: 'admin.enter' }
];

/** Where each role starts; of several roles, the first of these. */
const HOMES: readonly [Role, string][] = [
	['administrator', '/admin'],
	['coordinator', '/office'],
	['instructor', '/teach'],
	['company-contact', '/company'],
	['apprentice', '/learn']
];

/** The rooms this person may enter. */
export const roomsOf = (actor: Actor): Room[] => ROOMS.filter(({ enter }) => may(actor, enter));

/** The page on which this person starts; the front page for one without a role. */
export const homeOf = (actor: Actor): string =>
	HOMES.find(([role]) => actor.roles.includes(role))?.[1] ?? '/';
