/** A worker: does one task after another, each exercise parsed once. */
import { readFileSync } from 'node:fs';
import { parentPort } from 'node:worker_threads';
import type { Exercise } from '$lib/schemas/exercise';
import { BenchError } from '$lib/server/bench/bench-error';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { makeAnswers } from '$lib/server/bench/proof/misdiagnosis/make-answers';
import { proveSeeds } from '$lib/server/bench/proof/prove-exercise';
import type { Reply } from './run-tasks';
import type { Task } from './task';
import { threadSeconds } from './thread-seconds';

const exercises = new Map<string, Exercise>();

function exerciseOf(file: string): Exercise {
	const known = exercises.get(file);
	if (known) return known;
	const exercise = parseExerciseText(readFileSync(file, 'utf8'), file);
	exercises.set(file, exercise);
	return exercise;
}

function answer(task: Task): Reply {
	const startedS = threadSeconds();
	const cpuS = () => threadSeconds() - startedS;
	try {
		const exercise = exerciseOf(task.file);
		if (task.do === 'prove') return { result: proveSeeds(exercise, task), cpuS: cpuS() };
		return { result: makeAnswers(exercise, task), cpuS: cpuS() };
	} catch (cause) {
		if (cause instanceof BenchError) return { fault: { message: cause.message, field: cause.field } };
		return { fault: { message: cause instanceof Error ? (cause.stack ?? cause.message) : String(cause) } };
	}
}

parentPort?.on('message', (task: Task) => parentPort?.postMessage(answer(task)));
