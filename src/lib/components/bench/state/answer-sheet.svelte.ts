/** What is typed as answers: kept on the server as it is typed, right or wrong, and handed in once. */
import type { TypedAnswer, TypedAs } from '$lib/schemas/answer';
import type { DraftsView } from '$lib/schemas/attempt';
import type { QuestionView } from '$lib/schemas/questions/view';
import { blankAnswer, isBlank } from './blank-answer';
import { Refusal, type BenchWire } from './bench-wire';

/** How long the keys must rest before what was typed is kept, ms. */
const restMs = 600;
const retryMs = 5000;

export class AnswerSheet {
	answers = $state<Record<string, TypedAnswer>>({});
	/** Why an answer was refused, by question. */
	problems = $state.raw<Readonly<Record<string, string>>>({});
	/** When the drafts were last kept, ISO. */
	savedAt = $state<string | null>(null);
	state = $state<'kept' | 'typing' | 'not-kept'>('kept');
	handingIn = $state(false);
	/** A refusal that belongs to no question. */
	trouble = $state<string | undefined>();
	/** Handed in, here or elsewhere. */
	closed = $state(false);
	readonly answered: number = $derived(
		Object.values(this.answers).filter((answer) => !isBlank(answer)).length
	);
	readonly #wire: BenchWire;
	readonly #questions: readonly QuestionView[];
	#timer: ReturnType<typeof setTimeout> | undefined;
	/** The last keeping of drafts: answers handed in wait for it, so that none arrives late. */
	#keeping: Promise<void> = Promise.resolve();

	constructor(questions: readonly QuestionView[], drafts: DraftsView, wire: BenchWire) {
		this.#wire = wire;
		this.#questions = questions;
		this.savedAt = drafts.savedAt;
		for (const question of questions) {
			const kept = drafts.answers[question.id];
			this.answers[question.id] = kept?.type === question.type ? kept : blankAnswer(question);
		}
	}

	/** The answer to a question that asks for a number. @throws Error for any other question */
	number(id: string): TypedAs<'number'> {
		const answer = this.answers[id];
		if (answer?.type !== 'number') throw new Error(`Question ${id} asks for no number`);
		return answer;
	}

	type(id: string, text: string): void {
		this.number(id).text = text;
		this.#touched(id);
	}

	chooseUnit(id: string, unit: string): void {
		this.number(id).unit = unit;
		this.#touched(id);
	}

	/** The reading that an answer rests on; nothing but a number and a value with its uncertainty rests on one. */
	backing(id: string): number | null {
		const answer = this.answers[id];
		return 'readingId' in answer ? (answer.readingId ?? null) : null;
	}

	attach(id: string, readingId: number | null): void {
		const answer = this.answers[id];
		if (answer.type === 'number' || answer.type === 'uncertainty') answer.readingId = readingId;
		this.#touched(id);
	}

	/** Answers with what is no number, whole. */
	give(id: string, answer: TypedAnswer): void {
		this.answers[id] = answer;
		this.#touched(id);
	}

	/** Names of the questions (by position, from 1) that a reading is attached to. */
	attachedTo(readingId: number): number[] {
		return this.#positions((answer) => 'readingId' in answer && answer.readingId === readingId);
	}

	/** Questions with nothing answered. */
	get open(): string[] {
		return this.#questions.filter(({ id }) => isBlank(this.answers[id])).map(({ id }) => id);
	}

	/** Numbers (by position, from 1) that no reading is attached to. */
	get bare(): number[] {
		return this.#positions((answer) =>
			answer.type === 'number' || answer.type === 'uncertainty' ? !answer.readingId : false
		);
	}

	#positions(is: (answer: TypedAnswer) => boolean): number[] {
		return this.#questions.flatMap(({ id }, i) => (is(this.answers[id]) ? [i + 1] : []));
	}

	refuse(id: string, message: string): void {
		this.problems = { ...this.problems, [id]: message };
	}

	/** Hands everything in. @returns true when it was taken; else `problems` and `trouble` say why not */
	async handIn(): Promise<boolean> {
		clearTimeout(this.#timer);
		this.handingIn = true;
		this.trouble = undefined;
		try {
			await this.#keeping;
			await this.#wire.handIn($state.snapshot(this.answers));
			this.state = 'kept';
			this.closed = true;
			return true;
		} catch (error) {
			if (!(error instanceof Refusal)) {
				this.trouble = 'The server could not be reached. Everything typed is still here; try again.';
				return false;
			}
			if (error.status === 409) this.closed = true;
			this.#sort(error);
			return false;
		} finally {
			this.handingIn = false;
		}
	}

	/** Puts each issue at its question; what names none is told at the foot. */
	#sort(refusal: Refusal): void {
		const problems: Record<string, string> = {};
		for (const { field, message } of refusal.issues) {
			const question = this.#questions.find(({ id }) => field.split('.').includes(id));
			if (question) problems[question.id] ??= message;
		}
		this.problems = problems;
		if (Object.keys(problems).length === 0) this.trouble = refusal.message;
	}

	#touched(id: string): void {
		this.state = 'typing';
		this.problems = Object.fromEntries(Object.entries(this.problems).filter(([key]) => key !== id));
		clearTimeout(this.#timer);
		this.#timer = setTimeout(() => this.#keepSoon(), restMs);
	}

	/** Keeps at once what waits to be kept: the page is going. */
	flush(): void {
		if (this.state === 'kept' || this.closed) return;
		clearTimeout(this.#timer);
		void this.#keep(true);
	}

	#keepSoon(): void {
		this.#keeping = this.#keep();
	}

	async #keep(leaving = false): Promise<void> {
		try {
			this.savedAt = await this.#wire.saveDrafts($state.snapshot(this.answers), leaving);
			this.state = 'kept';
		} catch (error) {
			this.state = 'not-kept';
			if (error instanceof Refusal && error.status < 500) {
				if (error.status === 409) this.closed = true;
				else this.trouble = error.message;
				return;
			}
			this.#timer = setTimeout(() => this.#keepSoon(), retryMs);
		}
	}
}
