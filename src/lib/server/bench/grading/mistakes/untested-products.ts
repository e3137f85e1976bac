import { z } from 'zod';
import type { ReadingRequest } from '$lib/measure/reading-request';
import { shortFigure } from '$lib/server/bench/exercise/figure';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { ownShare } from '../own-share';
import { said } from '../said';
import { shownReading } from '../shown-reading';
import { withSettings } from '../spoil';
import { modelSpread } from '../spreads';

/** Whether the mixer's own products, of either order, move what is read by half of what may be wrong. */
const decides = (context: Context, setUp: SetUp, request: ReadingRequest): boolean => {
	const share = ownShare(context, setUp, request);
	return share !== null && Math.abs(share.productsUp) > context.question.tolerance / 2;
};

/** Harmonics or intermodulation read without the attenuator test: the mixer's own, with too little in front of it. */
export const untestedProducts = defineMistake(
	'untested-products',
	z.strictObject({ attenuationDb: z.number().min(0) }),
	({ attenuationDb }) => ({
		stage: 'reading',
		label: `${shortFigure(attenuationDb, 0)} dB in front`,
		phrase: 'read products of the receiver’s own mixer',
		families: ['harmonics', 'thd', 'intercept', 'delta', 'point'],
		shows: ({ setUp, request }, context) =>
			request.kind !== 'count' && decides(context, setUp, request as ReadingRequest),
		predict(context, setUp) {
			const request = askedReading(context);
			if (!decides(context, setUp, request)) return null;
			const value = shownReading(context, setUp, request);
			// lines that stand clear of the noise: what it leaves open is no more than theory does
			return value === null ? null : { value, spread: 2 * modelSpread(context.question) };
		},
		explain({ setUp, yours, question }) {
			const usedDb = setUp?.resolved.attenuationDb ?? attenuationDb;
			return {
				title: 'Your mixer made part of that',
				text: `With ${shortFigure(usedDb, 0)} dB of attenuation${setUp?.resolved.preamp ? ' and the preamplifier on' : ''} the carriers drove the mixer so hard that it made harmonics and intermodulation of its own, on the very frequencies of those you look for. Put in 10 dB more: what belongs to the device keeps its ratio to the carrier; what is yours falls against it, second-order products by 10 dB, third-order ones by 20 dB.`,
				sum: `${said(yours, question)} with the receiver’s share, ${said(question.truth, question)} of the device alone`,
				part: 'products of the receiver’s own mixer',
				bad: { at: 'set-up', text: `Here: ${shortFigure(usedDb, 0)} dB in front of the mixer is too little` }
			};
		},
		make: (steps) => withSettings(steps, { attenuationDb })
	})
);
