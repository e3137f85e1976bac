/**
 * Every load, action and endpoint, asked by every role and by nobody, against one table. A route that the table
 * doesn't name fails it: say there who may use it.
 */
import { beforeAll, describe, expect, it } from 'vitest';
import { roles, type Actor, type Role } from '$lib/server/domain/role';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { createCourse } from '../../factories/course';
import { createUser } from '../../factories/user';
import { askAt, doors } from './doors';
import { REACH, type Reach } from './permissions';

type Outcome = 'in' | 'sign in' | 'not for you' | 'no such thing';

/** What became of it. Refused input is no refusal of the person. */
async function ask(door: string, actor: Actor | null, params: Record<string, string>): Promise<Outcome> {
	const isAction = door.startsWith('action');
	const { body = {}, query } = REACH[door];
	const { status, location } = await askAt(door, actor, {
		params,
		query,
		body: isAction ? new URLSearchParams() : JSON.stringify(body),
		headers: isAction ? {} : { 'content-type': 'application/json' }
	});
	expect(status, door).toBeLessThan(500);
	if (location?.startsWith('/sign-in?next=') || status === 401) return 'sign in';
	return status === 403 ? 'not for you' : status === 404 ? 'no such thing' : 'in';
}

const expected = (who: Reach['who'], role: Role | null): 'in' | 'out' =>
	who === 'everybody' || (role !== null && who.includes(role)) ? 'in' : 'out';
const LEARNERS: readonly Role[] = ['apprentice', 'instructor', 'administrator'];

let people: Record<Role, Actor>;
beforeAll(async () => {
	const made = await Promise.all(roles.map(async (role) => [role, (await createUser(role)).actor] as const));
	people = Object.fromEntries(made) as Record<Role, Actor>;
});

async function createAttemptOf(actor: Actor): Promise<Record<string, string>> {
	const { exercise } = await createCourse();
	const { attempt } = await startAttempt(actor, exercise.slug, new Date());
	return { id: String(attempt.id) };
}

it('the table names every load, action and endpoint that there is, and no other', () => {
	expect([...doors.keys()].sort()).toEqual(Object.keys(REACH).sort());
});

describe.each(Object.entries(REACH).filter(([, { thing }]) => thing !== 'attempt'))('%s', (door, reach) => {
	it('lets in whom the table says', async () => {
		const { exercise } = await createCourse();
		const params = {
			...{ slug: exercise.slug, id: '999999', unitId: '999999', figureId: 'none' },
			...{ course: 'none', unit: '06-spread', file: 'lesson.md' }
		};
		for (const role of [null, ...roles]) {
			// A fresh person, since signing out or starting an attempt changes one.
			const actor = role && (door.startsWith('load') ? people[role] : (await createUser(role)).actor);
			const outcome = await ask(door, actor, params);
			const inside = reach.absent ? 'no such thing' : 'in';
			const outside = role ? 'not for you' : 'sign in';
			const wanted = expected(reach.who, role) === 'in' ? inside : outside;
			expect([role, outcome]).toEqual([role, wanted]);
		}
	});
});

describe.each(Object.entries(REACH).filter(([, { thing }]) => thing === 'attempt'))('%s', (door, reach) => {
	it('lets in the attempt’s owner, and of others whom the table says', async () => {
		const strange = await createAttemptOf((await createUser('apprentice')).actor);
		expect(await ask(door, null, strange)).toBe('sign in');
		for (const role of roles) {
			const outcome = await ask(door, people[role], strange);
			expect([role, outcome === 'in' ? 'in' : 'out'], outcome).toEqual([role, expected(reach.who, role)]);
			if (LEARNERS.includes(role)) {
				const own = await createAttemptOf(people[role]);
				// 404 is said of what an open attempt doesn't have yet, such as its finding.
				const asOwner = await ask(door, people[role], own);
				expect([role, asOwner]).toEqual([role, reach.absentWhileOpen ? 'no such thing' : 'in']);
			}
		}
	});
});
