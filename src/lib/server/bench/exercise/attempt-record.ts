/** What an attempt leaves behind, as the grader takes it: stored by the services, made afresh by proofs. */
import type { Reading } from '$lib/measure/reading';
import type { BenchRequest } from '$lib/schemas/reading';
import type { Settings } from '$lib/schemas/settings';
import type { Count } from '../receiver/count';

/** What is taken on the bench: read off a trace, or counted. */
export type BenchReading = Reading | Count;

/** One set-up and the sweeps drawn with it; none where it was only counted with. */
export interface SettingsLogEntry {
	/** As typed. */
	settings: Settings;
	/** Row number of its first sweep, counted over the attempt, and how many were drawn. */
	firstRow: number;
	sweeps: number;
	/** Bench clock at its first sweep. */
	clockS: number;
	/** Wall time in words, for the finding only. */
	at?: string;
}

/** A reading as the server took it off replayed rows. */
export interface TakenReading {
	id: string;
	request: BenchRequest;
	reading: BenchReading;
	/** Which trace of the set-up, 1…4; 1 for a count. */
	trace: number;
	/** First and last row in the trace; a count has a row number of its own. */
	rows: { from: number; to: number };
	at?: string;
}

/** An answer as the grader takes it; its question says of which type it is. */
export interface NumberAnswer {
	/** In the question's unit. */
	value: number;
	/** The reading it is said to rest on. */
	readingId?: string;
}
/** Keys of the options chosen. */
export interface ChoiceAnswer {
	chosen: string[];
}
/** Which entry of the log is handed in. */
export interface SetUpAnswer {
	entry: number;
}
/** As displayed, Hz; of a flag the first alone. */
export interface MarkAnswer {
	atHz: number;
	toHz?: number;
}
/** Keys of the items, first to last. */
export interface OrderAnswer {
	order: string[];
}
export interface EmissionsAnswer {
	rows: { atHz: number; levelDbm: number; breaks: boolean | null }[];
}
export interface UncertaintyAnswer {
	/** In the question's unit. */
	stated: number;
	expandedDb: number;
	k: number;
	readingId?: string;
}
export type GivenAnswer =
	NumberAnswer | ChoiceAnswer | SetUpAnswer | MarkAnswer | OrderAnswer | EmissionsAnswer | UncertaintyAnswer;

export interface AttemptRecord {
	log: SettingsLogEntry[];
	readings: TakenReading[];
	/** By question; a question left out is unanswered. */
	answers: Record<string, GivenAnswer>;
}

/** The answers of a record that are numbers, by question. */
export const numberAnswers = ({ answers }: Pick<AttemptRecord, 'answers'>): Record<string, NumberAnswer> =>
	Object.fromEntries(
		Object.entries(answers).flatMap(([question, answer]) => ('value' in answer ? [[question, answer]] : []))
	);
