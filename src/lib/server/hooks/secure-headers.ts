import type { Handle } from '@sveltejs/kit';
import { readSettings } from './settings';

const HEADERS = {
	'x-content-type-options': 'nosniff',
	'referrer-policy': 'same-origin',
	'cross-origin-opener-policy': 'same-origin',
	'cross-origin-resource-policy': 'same-origin',
	'x-frame-options': 'DENY',
	'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()'
};

/** Pages bring a policy with nonces of their own, made from svelte.config.js; all else is data, and may load nothing. */
const DATA_POLICY = "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

const TWO_YEARS_S = 2 * 365 * 24 * 3600;

/** Puts the security headers on every response; what a signed-in person sees is kept by no cache. */
export const secureHeaders: Handle = async ({ event, resolve }) => {
	event.locals.origin = readSettings().origin;
	event.locals.secureCookies = readSettings().secureCookies;
	const response = await resolve(event);
	const { headers } = response;
	for (const [name, value] of Object.entries(HEADERS)) headers.set(name, value);
	if (!headers.has('content-security-policy')) headers.set('content-security-policy', DATA_POLICY);
	if (readSettings().origin.startsWith('https:')) {
		headers.set('strict-transport-security', `max-age=${TWO_YEARS_S}; includeSubDomains`);
	}
	if (event.locals.actor || !headers.has('cache-control')) headers.set('cache-control', 'no-store');
	return response;
};
