/** A lesson as it is kept and shown: prose as sanitised HTML, with the places of its figures between. */

export type LessonPart = { kind: 'text'; html: string } | { kind: 'figure'; id: string };

export interface Lesson {
	title: string;
	/** Of the prose, for the time it takes to read. */
	words: number;
	parts: LessonPart[];
}
