import type { Cookies } from '@sveltejs/kit';

const DEVICE_LIFETIME_S = 180 * 24 * 3600;

/** Browsers take a name with __Host- only over https, for the whole site, and from no neighbour of its domain. */
const nameOf = (word: string, secure: boolean): string => (secure ? `__Host-${word}` : word);

const flags = (secure: boolean) => ({ path: '/', httpOnly: true, sameSite: 'lax', secure }) as const;

export const readSessionCookie = (cookies: Cookies, secure: boolean): string | undefined =>
	cookies.get(nameOf('session', secure));

export const setSessionCookie = (cookies: Cookies, secure: boolean, token: string, expires: Date): void =>
	cookies.set(nameOf('session', secure), token, { ...flags(secure), expires });

export const clearSessionCookie = (cookies: Cookies, secure: boolean): void =>
	cookies.delete(nameOf('session', secure), flags(secure));

/** The device cookie says only “somebody has signed in with this browser before”; it opens nothing. */
export const readDeviceCookie = (cookies: Cookies, secure: boolean): string | undefined =>
	cookies.get(nameOf('device', secure));

export const setDeviceCookie = (cookies: Cookies, secure: boolean, token: string): void =>
	cookies.set(nameOf('device', secure), token, { ...flags(secure), maxAge: DEVICE_LIFETIME_S });
