import { z } from 'zod';
import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import type { ReadingRequest } from '$lib/measure/reading-request';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { ownShare } from '../own-share';
import { shownPrediction } from '../shown-reading';
import { withSettings } from '../spoil';
import { widthText } from '../width-words';

const decides = (context: Context, setUp: SetUp, request: ReadingRequest): boolean => {
	const share = ownShare(context, setUp, request);
	return (
		share !== null && share.noiseUp > context.question.tolerance / 2 && share.noiseUp >= share.productsUp
	);
};

const asksWidth = ({ quantity }: NumberQuestion): boolean =>
	quantity.kind === 'occupied-bandwidth' || quantity.kind === 'x-db-bandwidth';

/** Too much attenuation: the receiver's noise read as part of what is measured, leakage or width. */
export const ownNoise = defineMistake(
	'own-noise',
	z.strictObject({ attenuationDb: z.number().min(0) }),
	({ attenuationDb }) => ({
		stage: 'reading',
		label: `${shortFigure(attenuationDb, 0)} dB in front`,
		phrase: 'read the receiver’s own noise as part of the signal',
		families: ['adjacent-channel', 'band', 'occupied-bandwidth', 'x-db-bandwidth'],
		shows: ({ setUp, request, family }, context) =>
			(family === 'adjacent-channel' || request.kind === context.question.quantity.kind) &&
			decides(context, setUp, request as ReadingRequest),
		predict(context, setUp) {
			const request = askedReading(context);
			return decides(context, setUp, request) ? shownPrediction(context, setUp, request) : null;
		},
		explain({ setUp, change, question }) {
			const usedDb = setUp?.resolved.attenuationDb ?? attenuationDb;
			const inFront = `With ${shortFigure(usedDb, 0)} dB of attenuation`;
			const bad = {
				at: 'set-up',
				text: `Here: ${shortFigure(usedDb, 0)} dB in front of the mixer is too much`
			} as const;
			const part = 'the receiver’s own noise';
			if (asksWidth(question)) {
				return {
					title: 'Your own floor pushed the edges out',
					text: `${inFront} the signal came so weak to the mixer that noise filled the window beside it. The share that belongs outside is then used up by noise, and the edges wander off into it. Take attenuation out while the mixer allows it, and keep the window narrow.`,
					sum: `${widthText(Math.abs(change))} too much; noise belongs at least 35 dB under the signal`,
					part,
					bad
				};
			}
			return {
				title: 'That leakage was your own floor',
				text: `${inFront} the signal came so weak to the mixer that the receiver’s noise filled the next channel. Take 10 dB out: what belongs to the transmitter keeps its ratio, the noise falls by 10 dB against the signal.`,
				sum: `of your number, ${figure(Math.abs(change), question.digits)} dB were the receiver’s noise; ${figure(question.truth, question.digits)} ${question.unit} is the transmitter’s`,
				part,
				bad
			};
		},
		make: (steps) => withSettings(steps, { attenuationDb })
	})
);
