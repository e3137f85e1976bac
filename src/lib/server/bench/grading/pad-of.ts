import type { FilledStep } from '../exercise/drawn-exercise';
import type { Context, SetUp } from './mistake';
import { setUpOf } from './set-up-of';

/** The pad before the connector, dB; 0 without one or without knowing. */
export const padOf = (setUp: SetUp | undefined): number => setUp?.resolved.input.padDb ?? 0;

/** The pad that a method puts before the connector for a question, dB. */
export const padIn = (steps: readonly FilledStep[], { drawn, question }: Context): number =>
	padOf(setUpOf(drawn, steps, question.id));
