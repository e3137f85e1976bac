const BASE = 'https://site.invalid';

/**
 * Where to go after signing in: `wanted` if it is a path on this site, else `fallback`.
 * What a browser would read as another site, or as a script, never comes back out.
 */
export function localPath(wanted: string | null | undefined, fallback: string): string {
	if (!wanted?.startsWith('/') || !URL.canParse(wanted, BASE)) return fallback;
	const url = new URL(wanted, BASE);
	const path = url.pathname + url.search + url.hash;
	// “/a/..//evil” is on this site as it stands, but its normal form “//evil” would not be.
	if (url.origin !== BASE || path.startsWith('//')) return fallback;
	return path;
}
