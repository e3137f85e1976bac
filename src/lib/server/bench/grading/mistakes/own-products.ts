import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import type { ReadingRequest } from '$lib/measure/reading-request';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { ownShare } from '../own-share';
import { shownPrediction } from '../shown-reading';
import { withSettings } from '../spoil';

const decides = (context: Context, setUp: SetUp, request: ReadingRequest): boolean => {
	const share = ownShare(context, setUp, request);
	return (
		share !== null && share.productsUp > context.question.tolerance / 2 && share.productsUp > share.noiseUp
	);
};

/** Too little attenuation: the mixer's own intermodulation read as the transmitter's leakage. */
export const ownProducts = defineMistake(
	'own-products',
	z.strictObject({ attenuationDb: z.number().min(0) }),
	({ attenuationDb }) => ({
		stage: 'reading',
		label: `${shortFigure(attenuationDb, 0)} dB in front`,
		phrase: 'read the receiver’s own products as leakage',
		families: ['adjacent-channel', 'band'],
		shows: ({ setUp, request, family }, context) =>
			(family === 'adjacent-channel' || request.kind === context.question.quantity.kind) &&
			decides(context, setUp, request as ReadingRequest),
		predict(context, setUp) {
			const request = askedReading(context);
			return decides(context, setUp, request) ? shownPrediction(context, setUp, request) : null;
		},
		explain({ setUp, change, question }) {
			const usedDb = setUp?.resolved.attenuationDb ?? attenuationDb;
			return {
				title: 'That leakage was made in your mixer',
				text: `With ${shortFigure(usedDb, 0)} dB of attenuation${setUp?.resolved.preamp ? ' and the preamplifier on' : ''} the signal drove the mixer so hard that it made third-order products of its own, just where the transmitter’s would be. Put in 10 dB: what belongs to the transmitter keeps its ratio, what is yours falls by 20 dB against the signal.`,
				sum: `of your number, ${figure(Math.abs(change), question.digits)} dB were the receiver’s; ${figure(question.truth, question.digits)} ${question.unit} is the transmitter’s`,
				part: 'products of the receiver’s own mixer',
				bad: { at: 'set-up', text: `Here: ${shortFigure(usedDb, 0)} dB in front of the mixer is too little` }
			};
		},
		make: (steps) => withSettings(steps, { attenuationDb })
	})
);
