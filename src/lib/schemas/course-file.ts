/** content/<course>/course.yaml: a course as its author writes it. A unit's folder holds lesson.md and one file per exercise. */
import { z } from 'zod';

const slug = z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'lower-case words joined by hyphens');
const line = z.string().trim().min(1).max(300);

export const courseUnit = z.strictObject({
	/** Folder name without its number: 06-power-of-a-spread-signal → number 6 and this slug. */
	number: z.int().min(1).max(99),
	slug,
	title: line,
	summary: line,
	/** Slugs of its exercises, in teaching order: files <slug>.yaml in the unit's folder. */
	exercises: z.array(slug).max(20),
	/** Slugs of the units that a learner does first; all of them stand before this one. */
	needs: z.array(slug).max(20).optional(),
	/** So many of its exercises right, and the unit is done; all of them unless it says so. */
	doneWith: z.int().min(1).max(20).optional()
});
export const courseFile = z
	.strictObject({
		slug,
		title: line,
		summary: line,
		units: z.array(courseUnit).min(1).max(40)
	})
	.superRefine(({ units }, context) => {
		units.forEach(({ needs = [], doneWith, exercises }, index) => {
			const refuse = (path: (string | number)[], message: string) =>
				context.addIssue({ code: 'custom', path: ['units', index, ...path], message });
			if (doneWith !== undefined && doneWith > exercises.length)
				refuse(['doneWith'], `the unit has only ${exercises.length} exercises`);
			needs.forEach((name, place) => {
				const needed = units.slice(0, index).find((unit) => unit.slug === name);
				if (!needed) refuse(['needs', place], `${name} is no unit that stands before this one`);
				else if (needed.exercises.length === 0)
					refuse(['needs', place], `${name} has no exercise, so it can’t be done`);
			});
		});
	});

export type CourseUnit = z.infer<typeof courseUnit>;
export type CourseFile = z.infer<typeof courseFile>;
