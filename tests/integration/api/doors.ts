/** Every load, action and endpoint that there is, and a way to ask at each. */
import { isActionFailure, isHttpError, isRedirect, type Cookies, type RequestEvent } from '@sveltejs/kit';
import type { Actor } from '$lib/server/domain/role';

type Handler = (event: RequestEvent) => unknown;
type Module = Record<string, Handler | Record<string, Handler> | undefined>;

const modules = import.meta.glob<Module>('/src/routes/**/+{page,layout,}{.,}server.ts', { eager: true });

/** "POST /api/attempts", "load /learn", "action /account?/name" with what stands behind it. */
export const doors = new Map<string, Handler>();
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

export interface Asked {
	params?: Record<string, string>;
	query?: string;
	body?: BodyInit;
	headers?: Record<string, string>;
}

export interface Answer {
	status: number;
	/** Of a redirection. */
	location?: string;
	/** What a refusal says; of anything else nothing. */
	problem?: { message?: string; issues?: { field: string; message: string }[] };
}

/** What became of a request at this door. Throws what is no refusal: a server would answer it with 500. */
export async function askAt(door: string, actor: Actor | null, asked: Asked = {}): Promise<Answer> {
	try {
		const result = await doors.get(door)?.(createEvent(door, actor, asked));
		if (isActionFailure(result)) return { status: result.status, problem: result.data as Answer['problem'] };
		if (!(result instanceof Response)) return { status: 200 };
		if (result.ok) await result.body?.cancel();
		return { status: result.status, problem: result.ok ? undefined : await result.json() };
	} catch (cause) {
		if (isRedirect(cause)) return { status: cause.status, location: cause.location };
		if (!isHttpError(cause)) throw cause;
		return { status: cause.status, problem: cause.body };
	}
}

function createEvent(
	door: string,
	actor: Actor | null,
	{ params = {}, query = '', body, headers }: Asked
): RequestEvent {
	const [verb, path] = door.split(' ');
	const method = verb === 'action' ? 'POST' : verb === 'load' || verb === 'layout' ? 'GET' : verb;
	const named = path.replace(/\[(\w+)\]/g, (_, name: string) => encodeURIComponent(params[name]));
	const url = new URL(`http://bench.example${named}${query}`);
	return {
		locals: { actor, person: null, origin: url.origin, secureCookies: false },
		params,
		url,
		request: new Request(url, { method, body: method === 'GET' ? undefined : body, headers }),
		cookies: cookieJar(),
		getClientAddress: () => '192.0.2.1',
		setHeaders: () => undefined
	} as unknown as RequestEvent;
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
