/** Reads content/: courses as their authors write them. Whatever is broken stops it with file, line and field. */
import { ContentError } from './content-error';
import type { CourseContent } from './course-content';
import { coursesIn, treeOfFolder } from './folder-tree';
import { readCourse } from './read-course';
import type { CheckedExercises } from './read-exercise';

/**
 * Every course under `root`, in the order of their folders.
 * @param checked exercises that need no checking again
 * @throws ContentError at the first fault
 */
export function readContent(root: string, checked: CheckedExercises = new Map()): CourseContent[] {
	const courses = coursesIn(root).map(
		(folder) => readCourse(treeOfFolder(root, folder), checked) as CourseContent
	);
	refuseTwins(courses, 'exercises', ({ units }) => units.flatMap(({ exercises }) => exercises));
	refuseTwins(courses, 'units', ({ units }) => units);
	return courses;
}

/** Exercises and units are found by their names alone, whatever the course. */
function refuseTwins(
	courses: CourseContent[],
	what: string,
	namedIn: (course: CourseContent) => { slug: string }[]
): void {
	const seen = new Set<string>();
	for (const course of courses) {
		for (const { slug } of namedIn(course)) {
			if (seen.has(slug)) throw new ContentError(course.slug, 1, 'slug', `two ${what} are called ${slug}`);
			seen.add(slug);
		}
	}
}
