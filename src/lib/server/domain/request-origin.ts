const SAFE_METHODS = ['GET', 'HEAD', 'OPTIONS'];

export interface RequestSource {
	method: string;
	/** The headers Origin and Sec-Fetch-Site, null where absent. */
	origin: string | null;
	fetchSite: string | null;
}

/**
 * Why a request must be refused for where it comes from; null if it may go on.
 * One that changes something must come from `ownOrigin`. A browser that sends no Origin must say same-origin instead;
 * a program that sends neither is refused, since it can't be told from a browser that hides both.
 */
export function refusedOrigin(
	{ method, origin, fetchSite }: RequestSource,
	ownOrigin: string
): string | null {
	if (SAFE_METHODS.includes(method)) return null;
	if (origin === ownOrigin) return null;
	if (origin === null && fetchSite === 'same-origin') return null;
	return `This was not sent from a page of ${ownOrigin}. Open the site at that address and try again.`;
}
