/** A draft's course.yaml as it is edited: comments and whatever else stands in it stay. */
import { isMap, isSeq, parseDocument, type Document, type YAMLMap, type YAMLSeq } from 'yaml';
import { DomainError } from '$lib/server/errors';

/** Files before and after a change of the outline: moved first, then written. */
export interface FileChanges {
	moves: { from: string; to: string }[];
	writes: { path: string; text: string }[];
}

export interface UnitEntry {
	node: YAMLMap;
	number: number;
	slug: string;
	title: string;
	exercises: string[];
}

export class DraftOutline {
	readonly #document: Document;

	/** @param text of a course.yaml that has been read and checked */
	constructor(text: string) {
		this.#document = parseDocument(text);
	}

	get title(): string {
		return String(this.#document.get('title'));
	}

	get units(): UnitEntry[] {
		return this.#unitSeq.items.map((item) => {
			const node = item as YAMLMap;
			const exercises = node.get('exercises');
			return {
				node,
				number: Number(node.get('number')),
				slug: String(node.get('slug')),
				title: String(node.get('title')),
				exercises: isSeq(exercises) ? (exercises.toJSON() as string[]) : []
			};
		});
	}

	/** @throws DomainError `not_found` */
	unit(slug: string): UnitEntry {
		const unit = this.units.find((one) => one.slug === slug);
		if (!unit) throw new DomainError('not_found', 'The draft has no such unit.');
		return unit;
	}

	/** The unit that holds an exercise. @throws DomainError `not_found` */
	unitOf(exercise: string): UnitEntry {
		const unit = this.units.find(({ exercises }) => exercises.includes(exercise));
		if (!unit) throw new DomainError('not_found', 'The draft has no such exercise.');
		return unit;
	}

	setTitle(title: string, summary: string): void {
		this.#document.set('title', title);
		this.#document.set('summary', summary);
	}

	addUnit(entry: unknown, at = this.#unitSeq.items.length): void {
		const node = isMap(entry) ? entry : this.#document.createNode(entry);
		this.#unitSeq.items.splice(at, 0, node);
	}

	removeUnit({ node }: UnitEntry): void {
		const { items } = this.#unitSeq;
		items.splice(items.indexOf(node), 1);
	}

	addExercise({ node }: UnitEntry, slug: string, at: number): void {
		const seq = node.get('exercises') as YAMLSeq;
		// An empty list stands in brackets; what is added to it stands on lines of its own.
		seq.flow = false;
		seq.items.splice(at, 0, this.#document.createNode(slug));
	}

	removeExercise({ node, exercises }: UnitEntry, slug: string): void {
		const seq = node.get('exercises') as YAMLSeq;
		seq.items.splice(exercises.indexOf(slug), 1);
		if (seq.items.length === 0) seq.flow = true;
	}

	toString(): string {
		return this.#document.toString({ lineWidth: 0, flowCollectionPadding: true });
	}

	get #unitSeq(): YAMLSeq {
		return this.#document.get('units') as YAMLSeq;
	}
}
