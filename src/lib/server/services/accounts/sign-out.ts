import { endSession } from '$lib/server/auth/sessions';

/** Ends the session that this token belongs to. Not an error if it has ended already. */
export async function signOut(sessionToken: string | undefined): Promise<void> {
	if (sessionToken !== undefined) await endSession(sessionToken);
}
