/** How well one person masters the skills of a course, and what would raise each. */
import { z } from 'zod';

export const skillView = z.strictObject({
	/** Of the unit that teaches it. */
	slug: z.string(),
	number: z.int(),
	title: z.string(),
	level: z.enum(['not begun', 'begun', 'on the way', 'sure']),
	/** What the answers that count were worth, 1, ½ or 0, the oldest first; at most eight. */
	worths: z.array(z.union([z.literal(0), z.literal(0.5), z.literal(1)])),
	/** The weighted share of those, 0 … 1; null before the first answer. */
	share: z.number().nullable(),
	/** What raises it; null where there is no level above. */
	raise: z.string().nullable(),
	/** Where to do that; null when nothing of it is open. */
	exercise: z
		.strictObject({ slug: z.string(), place: z.string(), title: z.string(), practice: z.boolean() })
		.nullable()
});

export const courseSkills = z.strictObject({
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	skills: z.array(skillView)
});

export type SkillView = z.infer<typeof skillView>;
export type CourseSkills = z.infer<typeof courseSkills>;
