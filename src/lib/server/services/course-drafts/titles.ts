import { parseDocument } from 'yaml';
import { LeastRecentlyUsed } from '../process/least-recently-used';

// Only a cache, by the hash of the file: an outline names every exercise by its title.
const titles = new LeastRecentlyUsed<string, string>(2000);

/** The title an exercise's text gives itself, or its slug where that can't be read. */
export const titleOf = (hash: string, bytes: Uint8Array, slug: string): string =>
	titles.get(`${hash} ${slug}`, () => {
		// The title stands among the first lines: the rest needn't be parsed for it.
		const line = /^title:.*$/m.exec(Buffer.from(bytes).toString('utf8'))?.[0];
		const title: unknown = line ? parseDocument(line).get('title') : undefined;
		return typeof title === 'string' && title.trim() !== '' ? title : slug;
	});
