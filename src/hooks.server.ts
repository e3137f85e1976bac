import { building } from '$app/environment';
import { sequence } from '@sveltejs/kit/hooks';
import { checkOrigin } from '$lib/server/hooks/check-origin';
import { chooseScheme } from '$lib/server/hooks/choose-scheme';
import { reportError } from '$lib/server/hooks/report-error';
import { resolveSession } from '$lib/server/hooks/resolve-session';
import { secureHeaders } from '$lib/server/hooks/secure-headers';
import { useOneName } from '$lib/server/hooks/use-one-name';
import { startBackgroundWork, stopBackgroundWork } from '$lib/server/services/background/background-work';
import { endStreams } from '$lib/server/services/attempts/open-streams';

export const handle = sequence(secureHeaders, useOneName, checkOrigin, resolveSession, chooseScheme);

export const handleError = reportError;

/** A stopping process ends its sweep streams first: open ones would hold the server up until its time is over. */
export const init = (): void => {
	// A build loads the server too, perhaps with a database in reach.
	if (!building) startBackgroundWork();
	for (const signal of ['SIGTERM', 'SIGINT'] as const) {
		process.once(signal, endStreams);
		process.once(signal, stopBackgroundWork);
	}
};
