import { fail, redirect, type RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import { displayNameForm, endSessionForm, passwordForm } from '$lib/schemas/account';
import { clearSessionCookie, readSessionCookie, setSessionCookie } from '$lib/server/auth/cookies';
import { requireUser } from '$lib/server/auth/require-actor';
import { readForm } from '$lib/server/read-form';
import { parseWith } from '$lib/server/read-json';
import { refusalOf, respond } from '$lib/server/respond';
import { changeDisplayName } from '$lib/server/services/accounts/change-display-name';
import { changePassword } from '$lib/server/services/accounts/change-password';
import { endAllSessions, endOneSession, endOtherSessions } from '$lib/server/services/accounts/end-sessions';
import { listSessions } from '$lib/server/services/accounts/list-sessions';
import type { Actions, PageServerLoad } from './$types';

const tokenOf = ({ cookies, locals }: RequestEvent): string | undefined =>
	readSessionCookie(cookies, locals.secureCookies);

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { sessions: await respond(() => listSessions(actor, tokenOf(event), new Date())) };
};

/** One form of this page: what it did in words, or the refusal with what was typed, but never a password. */
async function handle<S extends z.ZodType>(
	event: RequestEvent,
	part: 'name' | 'password' | 'sessions',
	schema: S,
	work: (actor: ReturnType<typeof requireUser>, form: z.output<S>) => Promise<string>
) {
	const actor = requireUser(event);
	let displayName: string | undefined;
	try {
		const typed = await readForm(event.request);
		if (typeof typed.displayName === 'string') displayName = typed.displayName;
		const done = await work(actor, parseWith(schema, typed));
		return { part, done, message: undefined, issues: [], displayName: undefined };
	} catch (cause) {
		const { status, message, issues, retryAfterS } = refusalOf(cause);
		if (retryAfterS) event.setHeaders({ 'retry-after': String(retryAfterS) });
		return fail(status, { part, done: undefined, message, issues, displayName });
	}
}

export const actions: Actions = {
	name: (event) =>
		handle(event, 'name', displayNameForm, async (actor, { displayName }) => {
			await changeDisplayName(actor, displayName);
			if (event.locals.person) event.locals.person = { ...event.locals.person, displayName };
			return `You are shown as ${displayName} from now on.`;
		}),

	password: (event) =>
		handle(event, 'password', passwordForm, async (actor, form) => {
			const { cookies, locals, request } = event;
			const { token, expiresAt } = await changePassword(
				actor,
				{ ...form, address: event.getClientAddress(), userAgent: request.headers.get('user-agent') },
				new Date()
			);
			setSessionCookie(cookies, locals.secureCookies, token, expiresAt);
			return 'The password is changed, and every other session has ended.';
		}),

	end: (event) =>
		handle(event, 'sessions', endSessionForm, async (actor, { session }) => {
			await endOneSession(actor, session);
			return 'The session has ended.';
		}),

	endOthers: async (event) => {
		const actor = requireUser(event);
		const ended = await endOtherSessions(actor, tokenOf(event) ?? '');
		const done = ended === 0 ? 'There was no other session.' : 'Every other session has ended.';
		return { part: 'sessions' as const, done, message: undefined, issues: [], displayName: undefined };
	},

	endAll: async (event) => {
		await endAllSessions(requireUser(event));
		clearSessionCookie(event.cookies, event.locals.secureCookies);
		redirect(303, '/sign-in');
	}
};
