import type { PersonView } from '$lib/schemas/person';
import type { Actor } from '$lib/server/domain/role';

declare global {
	namespace App {
		interface Error {
			message: string;
			/** Under which the cause stands in the log. */
			id?: string;
			issues?: { field: string; message: string }[];
		}

		interface Locals {
			/** Who asks; null if nobody is signed in. */
			actor: Actor | null;
			person: PersonView | null;
			/** Scheme, host and port under which browsers reach the site. */
			origin: string;
			/** Whether cookies travel over https only. */
			secureCookies: boolean;
		}

		interface PageData {
			person: PersonView | null;
		}
	}
}
