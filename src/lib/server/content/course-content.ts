import type { CourseUnit } from '$lib/schemas/course-file';
import type { Exercise } from '$lib/schemas/exercise';
import type { GlossaryTerm } from '$lib/schemas/glossary';
import type { Figure } from '$lib/schemas/figure';

export interface UnitContent extends Omit<CourseUnit, 'exercises'> {
	lessonMarkdown: string;
	/** Of the lesson's figure blocks, in their order. */
	figures: Figure[];
	exercises: Exercise[];
}

/** A course that has been read and checked. */
export interface CourseContent {
	slug: string;
	title: string;
	summary: string;
	units: UnitContent[];
	/** Empty for a course without glossary.yaml. */
	glossary: GlossaryTerm[];
}
