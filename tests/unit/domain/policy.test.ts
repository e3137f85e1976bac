import { describe, expect, it } from 'vitest';
import { may, PERMISSIONS, type Action, type Resource } from '$lib/server/domain/policy';
import { roles, type Actor, type Role } from '$lib/server/domain/role';

const ME = 7;
const OTHER = 8;

const cases: Record<string, Resource> = {
	nothing: {},
	mine: { ownerId: ME, closed: false },
	'mine, closed': { ownerId: ME, closed: true },
	"another's, closed": { ownerId: OTHER, closed: true },
	'in my cohort': { ownerId: OTHER, closed: true, cohortInstructorIds: [5, ME] },
	"in another's cohort": { ownerId: OTHER, closed: true, cohortInstructorIds: [OTHER] },
	"of my company's": { ownerId: OTHER, closed: true, companyContactIds: [ME] },
	"of another company's": { ownerId: OTHER, closed: true, companyContactIds: [OTHER] }
};

const any = Object.keys(cases);
const mine = ['mine', 'mine, closed'];
const cohort = ['in my cohort'];
const company = ["of my company's"];

/**
 * The table “Who may do what” of the house, written out by hand and apart from policy.ts: for each action and role,
 * the cases that are allowed. Order: apprentice, instructor, coordinator, company contact, administrator.
 */
const table: Record<Action, [string[], string[], string[], string[], string[]]> = {
	'learn.enter': [any, any, [], [], any],
	'teach.enter': [[], any, [], [], any],
	'office.enter': [[], [], any, [], any],
	'company.enter': [[], [], [], any, any],
	'admin.enter': [[], [], [], [], any],
	'profile.read': [mine, mine, mine, mine, any],
	'profile.change': [mine, mine, mine, mine, any],
	'lesson.read': [any, any, [], [], any],
	'unit.open-any': [[], any, [], [], any],
	'attempt.start': [mine, mine, [], [], mine],
	'attempt.work': [mine, mine, [], [], mine],
	'logbook.keep': [mine, mine, [], [], mine],
	'saved-set-up.keep': [mine, mine, [], [], mine],
	'attempt.read': [mine, [...mine, ...cohort], mine, mine, any],
	'answer-key.read': [['mine, closed'], any, [], [], any],
	'progress.read': [mine, [...mine, ...cohort], any, [...mine, ...company], any],
	'sign-off.decide': [[], cohort, [], [], any],
	'certificate.read': [mine, mine, mine, [...mine, ...company], any],
	'course.author': [[], any, [], [], any],
	'booking.read': [[], [], any, company, any],
	'booking.manage': [[], [], any, company, any],
	'user.manage': [[], [], [], [], any],
	'audit.read': [[], [], [], [], any]
};

const rows = (Object.keys(table) as Action[]).flatMap((action) =>
	roles.map((role, i) => ({ action, role, allowed: table[action][i] }))
);
const actor = (...held: Role[]): Actor => ({ id: ME, roles: held });

describe('may(actor, action, resource)', () => {
	it.each(rows)('$action by $role: $allowed', ({ action, role, allowed }) => {
		const granted = Object.keys(cases).filter((name) => may(actor(role), action, cases[name]));
		expect(granted).toEqual(any.filter((name) => allowed.includes(name)));
	});

	it('knows every action of the table and no other', () => {
		expect(Object.keys(PERMISSIONS).sort()).toEqual(Object.keys(table).sort());
	});

	it('lets a person do what any of their roles may', () => {
		const both = actor('apprentice', 'coordinator');
		expect(may(both, 'attempt.start', { ownerId: ME })).toBe(true);
		expect(may(both, 'booking.manage')).toBe(true);
		expect(may(both, 'course.author')).toBe(false);
	});

	it('denies whoever is not signed in, or has no role', () => {
		for (const action of Object.keys(PERMISSIONS) as Action[]) {
			expect(may(null, action, { ownerId: ME, closed: true })).toBe(false);
			expect(may(actor(), action, { ownerId: ME, closed: true })).toBe(false);
		}
	});

	it.each(['attempt.delete', 'toString', '__proto__', 'constructor', ''])(
		'denies the unknown action “%s”',
		(name) => {
			expect(may(actor('administrator'), name as Action)).toBe(false);
		}
	);

	it.each(['superuser', 'toString', '__proto__', 'constructor'])('denies the unknown role “%s”', (name) => {
		expect(may(actor(name as Role), 'learn.enter')).toBe(false);
	});
});
