/** An exercise with one seed's numbers in it. It holds the scene and the truths: it never leaves the server. */
import type { AnswerUnit, ChainPart, Exercise, WatchedMistake } from '$lib/schemas/exercise';
import type { Part } from '$lib/schemas/part';
import type { Quantity } from '$lib/schemas/quantity';
import type { BenchRequest, MaskLimits } from '$lib/schemas/reading';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { LossTable, Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import type { Seed } from '../receiver/random';
import type { Scope } from './expression';

export interface DrawnQuestion {
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

/** A step of the taught method with its numbers in place. */
export type FilledStep =
	| { do: 'set'; settings: Settings; why?: string }
	| { do: 'sweep'; sweeps: number; why?: string }
	/** Named is the part of the reading, where one is given, else its value. */
	| { do: 'read'; reading: BenchRequest; part?: Part; trace: number; as: string; why?: string }
	| { do: 'answer'; question: string; value: (scope: Scope) => number; reading: string; why?: string };

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
