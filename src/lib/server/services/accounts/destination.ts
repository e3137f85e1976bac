import { localPath } from '$lib/server/domain/local-path';
import type { Actor } from '$lib/server/domain/role';
import { homeOf } from '$lib/server/domain/rooms';

/** Where a person goes after signing in: the path they had asked for, if it is one of ours, else their home. */
export const destinationAfterSignIn = (next: string | null, home: string): string => localPath(next, home);

/** Where a choice made in passing, such as the colour scheme, leads back to. */
export const destinationBack = (next: string | null): string => localPath(next, '/');

/** The page on which whoever is signed in starts; null if nobody is. */
export const homeFor = (actor: Actor | null): string | null => actor && homeOf(actor);
