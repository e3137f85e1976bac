import type { RequestEvent } from '@sveltejs/kit';
import type { Actor } from '$lib/server/domain/role';

/** What an endpoint is given of a request, as far as ours look at it. */
export function createEvent(
	actor: Actor | null,
	params: Record<string, string>,
	{ method = 'GET', body, query = '' }: { method?: string; body?: BodyInit; query?: string } = {}
): RequestEvent {
	const url = new URL(`http://bench.example/api${query}`);
	const init = { method, body, headers: { 'content-type': 'application/json' }, duplex: 'half' };
	const request = new Request(url, init);
	const getClientAddress = () => '192.0.2.1';
	return { locals: { actor }, params, url, request, getClientAddress } as unknown as RequestEvent;
}
