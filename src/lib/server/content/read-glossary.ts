import type { CourseUnit } from '$lib/schemas/course-file';
import { glossaryFile, termSlug, type GlossaryTerm } from '$lib/schemas/glossary';
import type { ContentTree } from './content-tree';
import { readYaml } from './read-yaml';

export const GLOSSARY = 'glossary.yaml';

/** The glossary of a course, by term; empty where there is none. @throws ContentError for a name used twice or a unit that isn't there */
export function readGlossary(tree: ContentTree, units: readonly Pick<CourseUnit, 'slug'>[]): GlossaryTerm[] {
	if (!tree.paths.includes(GLOSSARY)) return [];
	const { value, errorAt } = readYaml(tree, GLOSSARY, glossaryFile);
	const owners = new Map<string, string>();
	const terms = value.map((entry, index) => {
		const slug = termSlug(entry.term);
		if (!slug) throw errorAt(`[${index}].term`, 'needs a letter or a digit');
		if (!units.some((unit) => unit.slug === entry.unit))
			throw errorAt(`[${index}].unit`, `${entry.unit} is no unit of this course`);
		for (const name of [slug, ...[entry.term, ...entry.forms].map((form) => form.toLowerCase())]) {
			const owner = owners.get(name);
			if (owner !== undefined && owner !== slug)
				throw errorAt(`[${index}].term`, `“${name}” is a name of “${owner}” already`);
			if (owner === undefined) owners.set(name, slug);
		}
		return { ...entry, slug };
	});
	const twice = terms.findIndex(({ slug }, at) => terms.findIndex((other) => other.slug === slug) !== at);
	if (twice >= 0) throw errorAt(`[${twice}].term`, `“${terms[twice].term}” stands here twice`);
	return terms.sort((a, b) => a.term.localeCompare(b.term, 'en', { sensitivity: 'base' }));
}
