import { partOf, type Part } from '$lib/schemas/part';
import { BenchError } from '../bench-error';
import { resolveSettings } from '../receiver/resolve-settings';
import { prepareSweep } from '../receiver/sweep';
import type { AttemptRecord, TakenReading } from './attempt-record';
import { BenchSession, type SweepWith } from './bench-session';
import type { DrawnExercise, FilledStep } from './drawn-exercise';
import { SWEPT_RBW_HZ } from './swept-rbw';

/** A step as it was done: the reading taken, and the number it named or answered with. */
export interface PlayedStep {
	step: FilledStep;
	taken?: TakenReading;
	value?: number;
}
export interface PlayedMethod {
	record: AttemptRecord;
	steps: PlayedStep[];
	/** By question: the reading handed in with a number. */
	evidence: Record<string, TakenReading>;
}

/**
 * Does a method's steps on the bench: the taught one, or one with a mistake in it. From the exercise's start settings,
 * with the attempt's own seed, through the same sweeps and readings as everyone's.
 * @param sweepWith the receiver; a proof may plant a fault in it
 * @throws BenchError when a step can't be done
 */
export function runMethod(
	drawn: DrawnExercise,
	steps: readonly FilledStep[] = drawn.method,
	sweepWith: SweepWith = prepareSweep
): PlayedMethod {
	const bench = new BenchSession(drawn.scene, drawn.profile, drawn.seed, drawn.brief.start, sweepWith);
	const byName = new Map<string, TakenReading>();
	const values: Record<string, number> = {};
	const record: AttemptRecord = { log: bench.log, readings: bench.readings, answers: {} };
	const evidence: Record<string, TakenReading> = {};
	const played = steps.map((step): PlayedStep => {
		switch (step.do) {
			case 'set':
				bench.set(step.settings);
				return { step };
			case 'sweep':
				bench.sweep(step.sweeps);
				return { step };
			case 'read': {
				const taken = bench.read(step.reading, step.trace);
				byName.set(step.as, taken);
				values[SWEPT_RBW_HZ] = resolveSettings(bench.log[bench.log.length - 1].settings, drawn.profile).rbwHz;
				values[step.as] = named(taken, step.part);
				return { step, taken, value: values[step.as] };
			}
			case 'answer': {
				if ('gives' in step) {
					record.answers[step.question] = step.gives({ values, entry: bench.log.length - 1, taken: byName });
					return { step };
				}
				const value = step.value(values);
				const taken = byName.get(step.reading);
				record.answers[step.question] = { value, readingId: taken?.id };
				if (taken) evidence[step.question] = taken;
				return { step, value };
			}
		}
	});
	return { record, steps: played, evidence };
}

/** The number that a read step names. @throws BenchError when the reading has no such part */
function named({ reading }: TakenReading, part: Part | undefined): number {
	if (part === undefined) return reading.value;
	const value = partOf('parts' in reading ? reading.parts : undefined, part);
	if (value === undefined) throw new BenchError('part', `${reading.kind} has no such part here`);
	return value;
}
