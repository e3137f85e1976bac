import { drawReceiverError } from '../receiver/receiver-error';
import { asksPlace, isAbsoluteLevel } from './asked';
import type { Context } from './mistake';

/** This receiver's own error where a question asks, in the question's unit: of a level, or of where a signal stands; 0 of anything else. */
export function ownError({ drawn, question }: Context): number {
	const { levelDb, frequency } = drawReceiverError(drawn.profile, drawn.seed);
	if (isAbsoluteLevel(question.unit)) return levelDb(question.frequencyHz);
	return asksPlace(question) ? frequency * question.truth : 0;
}

/** The greatest that such a receiver may be off, in the question's unit: its data sheet's. */
export function greatestOwnError({ drawn, question }: Context): number {
	const { levelErrorDb, referencePpm } = drawn.profile;
	if (isAbsoluteLevel(question.unit)) return levelErrorDb;
	return asksPlace(question) ? Math.abs(question.truth) * referencePpm * 1e-6 : 0;
}
