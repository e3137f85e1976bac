import { drawReceiverError } from '../receiver/receiver-error';
import { isAbsoluteLevel } from './evidence';
import type { Context } from './mistake';

/** This receiver's own level error where a question asks: in every level read with it. 0 for what isn't a level. */
export const receiverErrorDb = ({ drawn, question }: Context): number =>
	isAbsoluteLevel(question.unit)
		? drawReceiverError(drawn.profile, drawn.seed).levelDb(question.frequencyHz)
		: 0;
