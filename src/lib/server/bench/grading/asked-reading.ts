import type { ReadingRequest } from '$lib/measure/reading-request';
import type { Context } from './mistake';
import { readStepOf } from './spoil';

/** The reading that the taught method answers a question from. */
export const askedReading = ({ drawn, question }: Context): ReadingRequest =>
	readStepOf(drawn.method, question.id).reading as ReadingRequest;
