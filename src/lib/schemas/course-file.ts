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
	exercises: z.array(slug).max(20)
});
export const courseFile = z.strictObject({
	slug,
	title: line,
	summary: line,
	units: z.array(courseUnit).min(1).max(40)
});

export type CourseUnit = z.infer<typeof courseUnit>;
export type CourseFile = z.infer<typeof courseFile>;
