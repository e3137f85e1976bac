import type { AttemptView } from '$lib/schemas/attempt';
import type { Exercise as ExerciseDefinition } from '$lib/schemas/exercise';
import { FrameDecoder, type Frame, type PieceFrame } from '$lib/schemas/frames';
import type { Settings } from '$lib/schemas/settings';
import {
	streamEnd,
	streamState,
	type StreamEnd,
	type StreamState,
	type SweepsRequest
} from '$lib/schemas/sweep-stream';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { numberQuestions, type DrawnExercise } from '$lib/server/bench/exercise/drawn-exercise';
import { Attempt } from '$lib/server/db/models/attempt';
import { findExercise } from '$lib/server/db/queries/find-exercise';
import type { Actor } from '$lib/server/domain/role';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { streamSweeps } from '$lib/server/services/attempts/stream-sweeps';
import { createCourse } from './course';
import { createUser } from './user';

/** An open attempt of somebody new at an exercise of its own. */
export async function createAttempt(
	over: Partial<Record<keyof ExerciseDefinition, unknown>> = {}
): Promise<{ actor: Actor; attempt: AttemptView; slug: string }> {
	const { actor } = await createUser('apprentice');
	const { exercise } = await createCourse(over);
	const { attempt } = await startAttempt(actor, exercise.slug, new Date());
	return { actor, attempt, slug: exercise.slug };
}

/** What came out of one stream. */
export interface Swept {
	state: StreamState;
	/** Rows that came whole, by number. */
	rows: Map<number, Float32Array>;
	pieces: PieceFrame[];
	end: StreamEnd | undefined;
}

/** Reads a stream to its end, or until `enough` says so. */
export async function readStream(
	stream: ReadableStream<Uint8Array>,
	enough: (pieces: PieceFrame[]) => boolean = () => false
): Promise<Swept> {
	const decoder = new FrameDecoder();
	const frames: Frame[] = [];
	const pieces: PieceFrame[] = [];
	const reader = stream.getReader();
	for (let next = await reader.read(); !next.done; next = await reader.read()) {
		for (const frame of decoder.push(next.value)) {
			frames.push(frame);
			if (frame.type === 'piece') pieces.push(frame);
		}
		if (enough(pieces)) {
			await reader.cancel();
			break;
		}
	}
	const noted = (type: 'state' | 'end') => frames.find((frame) => frame.type === type);
	const state = noted('state');
	const end = noted('end');
	return {
		state: streamState.parse(state?.type === 'state' ? state.json : undefined),
		rows: wholeRows(pieces),
		pieces,
		end: end?.type === 'end' ? streamEnd.parse(end.json) : undefined
	};
}

export function wholeRows(pieces: PieceFrame[]): Map<number, Float32Array> {
	const rows = new Map<number, Float32Array>();
	const whole = new Map<number, Float32Array>();
	for (const { row, points, fromPoint, levelsDbm, last } of pieces) {
		const levels = rows.get(row) ?? new Float32Array(points).fill(NaN);
		levels.set(levelsDbm, fromPoint);
		rows.set(row, levels);
		if (last && !levels.includes(NaN)) whole.set(row, levels);
	}
	return whole;
}

/** Sweeps so many rows with these settings. */
export const sweep = async (
	actor: Actor,
	attemptId: number,
	settings: Settings,
	over: Partial<SweepsRequest> = {}
): Promise<Swept> =>
	readStream(await streamSweeps(actor, attemptId, { settings, from: 0, sweeps: 5, ...over }, new Date()));

/** What must not leave the server while the attempt is open: its seed, its scene and its truths. */
export async function secretsOf(
	attemptId: number
): Promise<{ seed: string; drawn: DrawnExercise; marks: string[] }> {
	const attempt = await Attempt.findByPk(attemptId, { rejectOnEmpty: true });
	const exercise = await findExercise(attempt.exerciseId);
	if (!exercise) throw new Error('no exercise');
	const drawn = drawExercise(exercise.definition, attempt.seed);
	const numbers = [
		...numbersIn(drawn.scene.emitters),
		...numberQuestions(drawn).map(({ truth }) => truth),
		...Object.entries(drawn.parameters).flatMap(([name, value]) =>
			exercise.definition.shown.includes(name) ? [] : [value]
		)
	];
	return { seed: attempt.seed, drawn, marks: [attempt.seed, ...tellTale(numbers)] };
}

/** Every number in a structure. */
function numbersIn(value: unknown): number[] {
	if (typeof value === 'number') return [value];
	return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : [];
}

/** Of these values, those that can't stand in a text by accident: their first eight digits. */
const tellTale = (values: unknown[]): string[] =>
	values
		.filter((value): value is number => typeof value === 'number')
		.map((value) => String(Math.abs(value)))
		.filter((text) => text.replace('.', '').length >= 10)
		.map((text) => text.slice(0, 9));
