/** "Power of a spread signal" → "power-of-a-spread-signal": for addresses and file names, at most 60 characters. */
export function slugOf(title: string): string {
	const plain = title
		.normalize('NFKD')
		.replace(/[\u0300-\u036f’']/g, '')
		.toLowerCase()
		.replace(/[^a-z0-9]+/g, '-')
		.slice(0, 60)
		.replace(/^-+|-+$/g, '');
	return plain || 'untitled';
}

/** The slug, or with the first number behind it that makes it one that nobody has. */
export function freeSlug(slug: string, taken: (slug: string) => boolean): string {
	let candidate = slug;
	for (let n = 2; taken(candidate); n++) candidate = `${slug}-${n}`;
	return candidate;
}
