import type { DraftView } from '$lib/schemas/desk';

interface File {
	path: string;
	hash: string;
}

/** What files there are in place of those of an edition. One that holds what another held has moved. */
export function changesAgainst(edition: readonly File[], draft: readonly File[]): DraftView['changes'] {
	const before = new Map(edition.map(({ path, hash }) => [path, hash]));
	const now = new Map(draft.map(({ path, hash }) => [path, hash]));
	const gone = edition.filter(({ path }) => !now.has(path));
	const moved = new Set<string>();
	const changes: DraftView['changes'] = draft.flatMap(({ path, hash }): DraftView['changes'] => {
		if (before.get(path) === hash) return [];
		if (before.has(path)) return [{ path, what: 'changed' }];
		const from = gone.find((file) => file.hash === hash && !moved.has(file.path));
		if (!from) return [{ path, what: 'added' }];
		moved.add(from.path);
		return [{ path, what: 'moved' }];
	});
	const out = gone.filter(({ path }) => !moved.has(path));
	return [...changes, ...out.map(({ path }) => ({ path, what: 'taken out' as const }))];
}
