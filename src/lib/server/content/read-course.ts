import { courseFile, type CourseUnit } from '$lib/schemas/course-file';
import { ContentError } from './content-error';
import { addressIn, filesUnder, foldersIn, textIn, type ContentTree } from './content-tree';
import type { CourseContent, UnitContent } from './course-content';
import { readExercise, type CheckedExercises } from './read-exercise';
import { GLOSSARY, readGlossary } from './read-glossary';
import { readLesson } from './read-lesson';
import { readYaml } from './read-yaml';

/** A unit's folder: its number in two digits, and its slug. */
export const folderOf = ({ number, slug }: Pick<CourseUnit, 'number' | 'slug'>): string =>
	`${String(number).padStart(2, '0')}-${slug}`;

/**
 * A course whose files have all been read and checked.
 * @param onFault is told of each fault in turn; it throws where one is enough
 * @returns null when there was a fault and `onFault` went on
 */
export function readCourse(
	tree: ContentTree,
	checked: CheckedExercises,
	onFault: (fault: ContentError) => void = (fault) => {
		throw fault;
	}
): CourseContent | null {
	let faulty = false;
	/** What `read` gives; null when it has a fault. */
	const tried = <T>(read: () => T): T | null => {
		try {
			return read();
		} catch (cause) {
			if (!(cause instanceof ContentError)) throw cause;
			faulty = true;
			onFault(cause);
			return null;
		}
	};
	const outline = tried(() => readOutline(tree));
	if (!outline) return null;
	const units = outline.units.map((unit) => {
		const folder = folderOf(unit);
		tried(() => refuseStrays(tree, unit));
		const lesson = tried(() => readLesson(tree, `${folder}/lesson.md`));
		const exercises = unit.exercises.map((slug) =>
			tried(() => readExercise(tree, `${folder}/${slug}.yaml`, slug, checked))
		);
		return { ...unit, ...lesson, exercises } as UnitContent;
	});
	const glossary = tried(() => readGlossary(tree, outline.units));
	if (!faulty) tried(() => refuseUnknownSkills(tree, units));
	const { slug, title, summary } = outline;
	return faulty || !glossary ? null : { slug, title, summary, units, glossary };
}

/** What course.yaml says. @throws ContentError */
export function readOutline(tree: ContentTree) {
	const { value, errorAt } = readYaml(tree, 'course.yaml', courseFile);
	if (value.slug !== tree.name) throw errorAt('slug', `must be the folder's name, ${tree.name}`);
	const expected = value.units.map(folderOf);
	const stray = foldersIn(tree).find((name) => !expected.includes(name));
	if (stray) throw errorAt('units', `the folder ${stray} is no unit of this course`);
	const other = tree.paths.find((path) => !path.includes('/') && !['course.yaml', GLOSSARY].includes(path));
	if (other) throw new ContentError(addressIn(tree, other), 1, '', 'belongs to no unit');
	return value;
}

/**
 * What course.yaml says, when every file that it names is there and no other; what the files say is not looked at.
 * @throws ContentError
 */
export function readStructure(tree: ContentTree) {
	const outline = readOutline(tree);
	for (const unit of outline.units) {
		refuseStrays(tree, unit);
		const names = ['lesson.md', ...unit.exercises.map((slug) => `${slug}.yaml`)];
		for (const name of names) textIn(tree, `${folderOf(unit)}/${name}`);
	}
	return outline;
}

function refuseStrays(tree: ContentTree, unit: CourseUnit): void {
	const folder = folderOf(unit);
	const expected = ['lesson.md', ...unit.exercises.map((slug) => `${slug}.yaml`)];
	const stray = filesUnder(tree, folder).find((name) => !expected.includes(name));
	if (stray)
		throw new ContentError(addressIn(tree, `${folder}/${stray}`), 1, '', 'is not named in course.yaml');
}

/** A skill is what a unit of this course teaches. */
function refuseUnknownSkills(tree: ContentTree, units: readonly UnitContent[]): void {
	for (const unit of units)
		for (const exercise of unit.exercises)
			exercise.questions.forEach(({ skill }, index) => {
				if (skill === undefined || units.some(({ slug }) => slug === skill)) return;
				const path = `${folderOf(unit)}/${exercise.slug}.yaml`;
				const line = textIn(tree, path)
					.split('\n')
					.findIndex((text) => text.trim() === `skill: ${skill}`);
				throw new ContentError(
					addressIn(tree, path),
					line + 1 || 1,
					`questions[${index}].skill`,
					`${skill} is no unit of this course`
				);
			});
}
