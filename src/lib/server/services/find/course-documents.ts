import type { FindView } from '$lib/schemas/find-view';
import type { LessonPart } from '$lib/schemas/lesson';
import { Edition } from '$lib/server/db/models/edition';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import type { FindDocument } from '$lib/server/domain/find/find-in';
import { textOf } from '../courses/text-of';
import { LeastRecentlyUsed } from '../process/least-recently-used';

export interface CourseDocument extends FindDocument {
	kind: FindView['results'][number]['kind'];
	place: string;
	href: string;
}

// An edition never changes: what has been taken out of it once holds for good.
const taken = new LeastRecentlyUsed<number, Promise<CourseDocument[]>>(8);

/** Everything that can be found in an edition: parts of lessons, exercises, terms. */
export function courseDocuments(editionId: number): Promise<CourseDocument[]> {
	return taken.get(editionId, () => {
		const documents = takeDocuments(editionId);
		documents.catch(() => taken.forget(editionId));
		return documents;
	});
}

async function takeDocuments(editionId: number): Promise<CourseDocument[]> {
	const order: [string, string][] = [['number', 'ASC']];
	const [edition, units, exercises] = await Promise.all([
		Edition.findByPk(editionId, { attributes: ['glossary'], rejectOnEmpty: true }),
		Unit.findAll({ where: { editionId }, attributes: ['id', 'number', 'slug', 'title', 'lesson'], order }),
		Exercise.findAll({ where: { editionId }, attributes: ['unitId', 'number', 'slug', 'title'], order })
	]);
	const placeOf = (unit: Unit) => `Unit ${unit.number}, ${unit.title}`;
	const terms = edition.glossary.flatMap(({ slug, term, forms, definition, unit: name }) => {
		const unit = units.find((candidate) => candidate.slug === name);
		const text = forms.length > 0 ? `${definition} Also: ${forms.join(', ')}.` : definition;
		return unit
			? [{ kind: 'term' as const, title: term, text, place: placeOf(unit), href: `/learn/glossary#${slug}` }]
			: [];
	});
	const tasks = exercises.flatMap(({ unitId, number, slug, title }) => {
		const unit = units.find(({ id }) => id === unitId);
		return unit
			? [
					{
						kind: 'exercise' as const,
						title,
						text: '',
						place: `Exercise ${unit.number}.${number} of ${placeOf(unit).toLowerCase()}`,
						href: `/learn/exercises/${slug}`
					}
				]
			: [];
	});
	const lessons = units.flatMap((unit) =>
		lessonParts(unit.lesson.parts, unit.lesson.title).map(({ title, text, anchor }) => ({
			...{ kind: 'lesson' as const, title, text, place: placeOf(unit) },
			href: `/learn/units/${unit.slug}${anchor ? `#${anchor}` : ''}`
		}))
	);
	return [...terms, ...tasks, ...lessons];
}

/** A lesson cut at its headings, so that what is found is a place in it. */
function lessonParts(parts: readonly LessonPart[], title: string) {
	const html = parts.map((part) => (part.kind === 'text' ? part.html : '')).join('\n');
	const [opening, ...rest] = html.split(/(?=<h2[ >])/);
	const words = (text: string) =>
		textOf(text.replace(/<(\/?)(p|li|td|th|tr|h\d)\b[^>]*>/g, ' '), '')
			.replace(/\s+/g, ' ')
			.trim();
	return [
		{ title, text: words(opening), anchor: null as string | null },
		...rest.map((part) => {
			const [, id, heading] = /^<h2(?: id="([a-z0-9-]+)")?>(.*?)<\/h2>/s.exec(part) ?? [];
			return {
				title: heading ? words(heading) : title,
				text: words(part.replace(/^<h2.*?<\/h2>/s, '')),
				anchor: id ?? null
			};
		})
	];
}
