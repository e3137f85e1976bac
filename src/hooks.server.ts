import { sequence } from '@sveltejs/kit/hooks';
import { checkOrigin } from '$lib/server/hooks/check-origin';
import { chooseScheme } from '$lib/server/hooks/choose-scheme';
import { reportError } from '$lib/server/hooks/report-error';
import { resolveSession } from '$lib/server/hooks/resolve-session';
import { secureHeaders } from '$lib/server/hooks/secure-headers';

export const handle = sequence(secureHeaders, checkOrigin, resolveSession, chooseScheme);

export const handleError = reportError;
