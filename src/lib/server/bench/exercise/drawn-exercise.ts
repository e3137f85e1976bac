/** An exercise with one seed's numbers in it. It holds the scene and the truths: it never leaves the server. */
import type { AnswerUnit, WatchedMistake } from '$lib/schemas/questions/number';
import type { ChainPart, Exercise } from '$lib/schemas/exercise';
import type { Part } from '$lib/schemas/part';
import type { Quantity } from '$lib/schemas/quantity';
import type { Condition } from '$lib/schemas/questions/condition';
import type { Foreseen } from '$lib/schemas/questions/words';
import type { Filled } from '$lib/schemas/template';
import type { BenchRequest, MaskLimits } from '$lib/schemas/reading';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { LossTable, Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import type { Seed } from '../receiver/random';
import type { WrittenUncertainty } from '$lib/schemas/questions/uncertainty';
import type { GivenAnswer, TakenReading } from './attempt-record';
import type { Scope } from './expression';

/** Asks for a number with its unit. */
export interface NumberQuestion {
	type: 'number';
	id: string;
	text: string;
	quantity: Quantity;
	/** The part of it that is asked; absent: its value. */
	part?: Part;
	/** Whether it is asked without the noise it stands in. */
	noiseTakenOff: boolean;
	unit: AnswerUnit;
	digits: number;
	/** True value at the reference plane, in `unit`. */
	truth: number;
	/** Half width of what counts as right, in `unit`. */
	tolerance: number;
	/** Where in frequency the question asks: the place it names, else where the quantity is found in the scene. */
	frequencyHz: number;
	/** Loss between the reference plane and the connector there, dB. */
	leadDb: number;
	mistakes: WatchedMistake[];
}

/** An option as one attempt offers it. */
export interface DrawnOption {
	/** What the page knows it by: its place among those offered, as a letter. */
	key: string;
	id: string;
	text: string;
	right: boolean;
	/** What choosing it, or leaving it out, says where that is wrong. */
	chosen?: Foreseen;
	leftOut?: Foreseen;
}
export interface ChoiceQuestion {
	type: 'choice';
	id: string;
	text: string;
	pick: 'one' | 'several';
	/** In the order offered. */
	options: DrawnOption[];
	looked: { conditions: DrawnCondition[]; missing: string }[];
}

/** A condition with its numbers in place, and its name among the others. */
export type DrawnCondition = Filled<Condition> & { id: string };
export interface SetUpQuestion {
	type: 'set-up';
	id: string;
	text: string;
	conditions: DrawnCondition[];
	mistakes: { id: string; settings: Settings; breaks: string[] }[];
}

/** Where something stands, Hz as it truly is; of a flag the first alone. */
export interface Places {
	atHz: number;
	toHz?: number;
}
export interface MarkQuestion {
	type: 'mark';
	id: string;
	text: string;
	shape: 'flag' | 'band';
	truth: Places;
	toleranceHz: number;
	mistakes: (Foreseen & Places & { id: string })[];
}
export interface OrderQuestion {
	type: 'order';
	id: string;
	text: string;
	/** As offered. */
	items: { key: string; id: string; text: string; by: number }[];
	first: 'least' | 'greatest';
	/** Keys as they belong, first to last. */
	truth: string[];
	mistakes: (Foreseen & { id: string; items: [string, string] })[];
}
export interface EmissionsQuestion {
	type: 'emissions';
	id: string;
	text: string;
	/** In order of frequency. */
	emissions: { id: string; name: string; atHz: number; levelDbm: number; breaks: boolean | null }[];
	asksBreaks: boolean;
	toleranceHz: number;
	toleranceDb: number;
	ghosts: (Foreseen & { id: string; atHz: number })[];
}
export interface UncertaintyQuestion {
	type: 'uncertainty';
	id: string;
	text: string;
	unit: WrittenUncertainty['unit'];
	digits: number;
	/** At the reference plane. */
	truth: number;
	toleranceDb: number;
	/** What is lost between the reference plane and the connector there, dB. */
	leadDb: number;
	/** Without the spread of the reading. */
	budget: { id: string; text: string; db: number; standardDb: number }[];
	spreadDb: number;
	within: number;
}

export type DrawnQuestion =
	| NumberQuestion
	| ChoiceQuestion
	| SetUpQuestion
	| MarkQuestion
	| OrderQuestion
	| EmissionsQuestion
	| UncertaintyQuestion;
export type DrawnAs<T extends DrawnQuestion['type']> = Extract<DrawnQuestion, { type: T }>;

/** What an answer that is no number may follow from: the values read so far, and the set-up in force. */
export interface AnsweredFrom {
	values: Scope;
	/** The last entry of the log. */
	entry: number;
	/** Readings taken, by name. */
	taken: ReadonlyMap<string, TakenReading>;
}
/** A step of the taught method with its numbers in place. */
export type FilledStep =
	| { do: 'set'; settings: Settings; why?: string }
	| { do: 'sweep'; sweeps: number; why?: string }
	/** Named is the part of the reading, where one is given, else its value. */
	| { do: 'read'; reading: BenchRequest; part?: Part; trace: number; as: string; why?: string }
	| { do: 'answer'; question: string; value: (scope: Scope) => number; reading: string; why?: string }
	| { do: 'answer'; question: string; gives: (from: AnsweredFrom) => GivenAnswer; why?: string };

/** What the learner is told, placeholders filled in. */
export interface Brief {
	/** Markdown. */
	situation: string;
	plane: string;
	chain: ChainPart[];
	leads: { label: string; loss: LossTable }[];
	cautions: string[];
	mask?: { limits: MaskLimits };
	hints: string[];
	start: Settings;
}

export interface DrawnExercise {
	exercise: Exercise;
	seed: Seed;
	/** How many draws were turned down before this one. */
	redraws: number;
	profile: ReceiverProfile;
	parameters: Scope;
	scene: Scene;
	brief: Brief;
	questions: DrawnQuestion[];
	method: FilledStep[];
}

/** @throws Error for a question that the exercise doesn't ask: callers have checked it */
export function questionOf(drawn: DrawnExercise, id: string): DrawnQuestion {
	const question = drawn.questions.find((candidate) => candidate.id === id);
	if (!question) throw new Error(`${drawn.exercise.slug} asks no question ${id}`);
	return question;
}

/** Those of its questions that ask for a number. */
export const numberQuestions = ({ questions }: DrawnExercise): NumberQuestion[] =>
	questions.filter((question) => question.type === 'number');
