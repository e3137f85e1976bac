/** What the bench asks of the server. The page gives the real thing; nothing in here fetches. */
import type { TypedAnswer } from '$lib/schemas/answer';
import type { AttemptView, HintResponse, ReadingView, TakeReadingRequest } from '$lib/schemas/attempt';
import type { Frame } from '$lib/schemas/frames';
import type { SavedSetUpView } from '$lib/schemas/saved-set-up';
import type { KeepRequest } from '$lib/schemas/logbook';
import type { LoggedSetUp } from '$lib/schemas/set-up-log';
import type { Settings } from '$lib/schemas/settings';
import type { Markings } from '$lib/schemas/markings';
import type { SweepsRequest } from '$lib/schemas/sweep-stream';

export interface Issue {
	field: string;
	message: string;
}

/** The server understood and said no; `issues` name the fields. */
export class Refusal extends Error {
	override name = 'Refusal';
	constructor(
		readonly status: number,
		message: string,
		readonly issues: readonly Issue[] = []
	) {
		super(message);
	}
}

/** Every method rejects with Refusal for a no, with any other error when the server could not be reached. */
export interface BenchWire {
	sweeps(request: SweepsRequest, signal: AbortSignal): Promise<AsyncIterable<Frame[]>>;
	/** Rows drawn before, both ends included, at once. */
	rows(from: number, to: number): Promise<AsyncIterable<Frame[]>>;
	/** Set-ups put by under a name; absent where nobody is signed in. */
	savedSetUps?: {
		list(): Promise<SavedSetUpView[]>;
		/** @returns whether one of the same name was replaced */
		save(name: string, settings: Settings): Promise<boolean>;
		remove(id: number): Promise<void>;
	};
	/** Puts something in the logbook; absent where nobody is signed in. */
	keep?(request: KeepRequest): Promise<void>;
	/** What was set so far; absent where nothing is logged. */
	setUps?(): Promise<LoggedSetUp[]>;
	acknowledge(row: number): Promise<void>;
	takeReading(request: TakeReadingRequest): Promise<ReadingView>;
	/** @param leaving the page is going, and the request must outlive it */
	saveDrafts(answers: Record<string, TypedAnswer>, leaving?: boolean): Promise<string>;
	/** @param leaving as for drafts */
	saveMarkings(markings: Markings, leaving?: boolean): Promise<void>;
	nextHint(): Promise<HintResponse>;
	handIn(answers: Record<string, TypedAnswer>): Promise<void>;
	/** Ends the attempt without answers; absent where there is nothing to spend. */
	abandon?(): Promise<void>;
	reload(): Promise<AttemptView>;
}
