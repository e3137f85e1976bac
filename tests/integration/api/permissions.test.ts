/**
 * Every load, action and endpoint, asked by every role and by nobody, against one table. A route that the table
 * doesn't name fails it: say there who may use it.
 */
import { isActionFailure, isHttpError, isRedirect, type Cookies, type RequestEvent } from '@sveltejs/kit';
import { beforeAll, describe, expect, it } from 'vitest';
import { roles, type Actor, type Role } from '$lib/server/domain/role';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { createCourse } from '../../factories/course';
import { createUser } from '../../factories/user';
import { REACH, type Reach } from './permissions';

type Handler = (event: RequestEvent) => unknown;
type Module = Record<string, Handler | Record<string, Handler> | undefined>;

const modules = import.meta.glob<Module>('/src/routes/**/+{page,layout,}{.,}server.ts', { eager: true });

/** "POST /api/attempts", "load /learn", "action /account?/name" with what stands behind it. */
const doors = new Map<string, Handler>();
for (const [file, module] of Object.entries(modules)) {
	const path =
		file
			.replace(/^\/src\/routes/, '')
			.replace(/\/\([^)]+\)/g, '')
			.replace(/\/[^/]*$/, '') || '/';
	const what = file.includes('+layout') ? 'layout' : 'load';
	for (const [name, value] of Object.entries(module)) {
		if (name === 'actions')
			for (const [action, handler] of Object.entries(value as Record<string, Handler>))
				doors.set(`action ${path}?/${action}`, handler);
		else if (typeof value === 'function') doors.set(`${name === 'load' ? what : name} ${path}`, value);
	}
}

function cookieJar(): Cookies {
	const kept = new Map<string, string>();
	return {
		get: (name: string) => kept.get(name),
		getAll: () => [],
		set: (name: string, value: string) => void kept.set(name, value),
		delete: (name: string) => void kept.delete(name),
		serialize: () => ''
	} as unknown as Cookies;
}

function createEvent(door: string, actor: Actor | null, params: Record<string, string>): RequestEvent {
	const [verb, path] = door.split(' ');
	const { body, query = '' } = REACH[door];
	const isAction = verb === 'action';
	const method = isAction ? 'POST' : verb === 'load' || verb === 'layout' ? 'GET' : verb;
	const url = new URL(
		`http://bench.example${path.replace(/\[(\w+)\]/g, (_, name: string) => params[name])}${query}`
	);
	const request = new Request(url, {
		method,
		body: isAction ? new URLSearchParams() : method === 'GET' ? undefined : JSON.stringify(body ?? {}),
		headers: isAction ? {} : { 'content-type': 'application/json' }
	});
	return {
		locals: { actor, person: null, origin: url.origin, secureCookies: false },
		params,
		url,
		request,
		cookies: cookieJar(),
		getClientAddress: () => '192.0.2.1',
		setHeaders: () => undefined
	} as unknown as RequestEvent;
}

type Outcome = 'in' | 'sign in' | 'not for you' | 'no such thing';

const outcomeOf = (status: number): Outcome =>
	status === 401 ? 'sign in' : status === 403 ? 'not for you' : status === 404 ? 'no such thing' : 'in';

/** What became of it. Refused input is no refusal of the person. */
async function ask(door: string, actor: Actor | null, params: Record<string, string>): Promise<Outcome> {
	try {
		const result = await doors.get(door)?.(createEvent(door, actor, params));
		if (isActionFailure(result)) return outcomeOf(result.status);
		if (!(result instanceof Response)) return 'in';
		await result.body?.cancel();
		expect(result.status, door).toBeLessThan(500);
		return outcomeOf(result.status);
	} catch (cause) {
		if (isRedirect(cause)) return cause.location.startsWith('/sign-in?next=') ? 'sign in' : 'in';
		if (!isHttpError(cause)) throw cause;
		return outcomeOf(cause.status);
	}
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
		const params = { slug: exercise.slug, id: '999999', unitId: '999999', figureId: 'none' };
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
