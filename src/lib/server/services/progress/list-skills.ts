import type { CourseProgress, ExerciseProgress, UnitProgress } from '$lib/schemas/course-view';
import type { CourseSkills, SkillView } from '$lib/schemas/skill-view';
import { newestEditions } from '$lib/server/db/queries/newest-editions';
import { skillAnswers, skillExercises } from '$lib/server/db/queries/skill-answers';
import { LAST_COUNTED, masteryOf, worthOf, type Mastery } from '$lib/server/domain/progress/mastery';
import type { Actor } from '$lib/server/domain/role';
import { listCourse } from '../courses/list-course';

/** Every skill of every course as this person masters it, with what would raise it. A skill is what a unit teaches. */
export async function listSkills(actor: Actor, now: Date): Promise<CourseSkills[]> {
	const courses = await newestEditions();
	return Promise.all(
		courses.map(async ({ courseId, editionId, slug, title }) => {
			const [progress, answers, asking] = await Promise.all([
				listCourse(actor, slug, now),
				skillAnswers(actor.id, courseId),
				skillExercises(editionId)
			]);
			const skills = progress.units.map((unit): SkillView => {
				const worths = answers
					.filter(({ skill }) => skill === unit.slug)
					.map(({ verdict }) => worthOf(verdict));
				const slugs = asking.filter(({ skill }) => skill === unit.slug).map(({ exercise }) => exercise);
				const { level, share, raise } = masteryOf(worths);
				return {
					...{ slug: unit.slug, number: unit.number, title: unit.title, level, share },
					worths: worths.slice(-LAST_COUNTED),
					raise: raise && raiseText(raise),
					exercise: raise && exerciseFor(progress, slugs)
				};
			});
			return { course: { slug, title }, skills };
		})
	);
}

const raiseText = ({ answers, level }: NonNullable<Mastery['raise']>): string =>
	level === 'begun'
		? 'Its first answer begins it.'
		: answers === 1
			? `One more answer right: ${level}.`
			: `${answers} answers right in a row: ${level}.`;

/** Where to answer such a question: an exercise not yet right with a try left, else one to practise, the least recent first. */
function exerciseFor(course: CourseProgress, slugs: readonly string[]): SkillView['exercise'] {
	const open = course.units
		.filter(({ lock }) => lock === null)
		.flatMap((unit) => unit.exercises.map((exercise) => ({ unit, exercise })))
		.filter(({ exercise }) => slugs.includes(exercise.slug));
	const toDo = open.find(({ exercise }) => exercise.standing !== 'passed' && exercise.triesLeft > 0);
	if (toDo) return placeOf(toDo, false);
	const oldest = open.sort((a, b) => lastId(a.exercise) - lastId(b.exercise)).at(0);
	return oldest ? placeOf(oldest, true) : null;
}

const lastId = ({ attempts }: ExerciseProgress): number => attempts.at(-1)?.id ?? 0;

const placeOf = (
	{ unit, exercise }: { unit: UnitProgress; exercise: ExerciseProgress },
	practice: boolean
): SkillView['exercise'] => ({
	slug: exercise.slug,
	place: `${unit.number}.${exercise.number}`,
	title: exercise.title,
	practice
});
