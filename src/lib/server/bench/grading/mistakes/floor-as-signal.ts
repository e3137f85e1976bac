import { z } from 'zod';
import { milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { familyOf } from '../family';
import { defineMistake, type Context, type Prediction, type SetUp } from '../mistake';
import { isDeaf, noiseMw, noiseSpreadDb, withNoiseDbm } from '../noise-in-reading';
import { crestPower } from '../noise-law';
import { setUpOf } from '../set-up-of';
import { withRawReading, withSettings } from '../spoil';
import { modelSpread } from '../spreads';

const parameters = z.discriminatedUnion('by', [
	z.strictObject({ by: z.literal('attenuator'), attenuationDb: z.number().positive() }),
	z.strictObject({ by: z.literal('preamplifier') })
]);

/** Of a rectangular distribution: its standard deviation over its width. */
const RECTANGULAR = 1 / Math.sqrt(12);

/**
 * What is read on the floor. A line isn't to be seen there: some put the marker where it should be and read the floor's mean,
 * some take the highest peak, the floor's crest; any level between is as likely.
 */
function floorRead(context: Context, setUp: SetUp): Prediction {
	const isLine = familyOf(context.question.quantity.kind) === 'point';
	const crestDb = isLine ? powerRatioToDb(crestPower(setUp)) : 0;
	return {
		value: withNoiseDbm(context, setUp) + crestDb / 2,
		spread: Math.hypot(modelSpread(context.question), noiseSpreadDb(context, setUp), RECTANGULAR * crestDb)
	};
}

/** The receiver's floor read as what stands under it: attenuation left in, or the preamplifier left off. */
export const floorAsSignal = defineMistake('floor-as-signal', parameters, (given) => {
	const { by } = given;
	const changes = by === 'attenuator' ? { attenuationDb: given.attenuationDb } : { preamp: false };
	/** Deaf, and this is why. */
	function isCause(context: Context, setUp: SetUp): boolean {
		const { drawn, question } = context;
		if (!isDeaf(context, setUp)) return false;
		const taught = setUpOf(drawn, drawn.method, question.id).resolved;
		const attenuated = setUp.resolved.attenuationDb > taught.attenuationDb;
		return attenuated === (by === 'attenuator');
	}
	return {
		stage: 'reading',
		label: by === 'attenuator' ? 'floor, attenuator in' : 'floor, preamplifier off',
		phrase: 'read your own floor',
		families: ['point', 'band', 'density'],
		shows: ({ setUp }, context) => isCause(context, setUp),
		fromReading: ({ planeValue }) => planeValue,
		predict: (context, setUp) =>
			isCause(context, setUp) && setUp.resolved.input.connected ? floorRead(context, setUp) : null,
		explain({ setUp, yours, ...context }) {
			const { question } = context;
			const floorDbm = setUp ? milliwattsToDbm(noiseMw(context, setUp)) : yours;
			const attenuationDb = setUp?.resolved.attenuationDb ?? 0;
			const cause =
				by === 'attenuator'
					? `${shortFigure(attenuationDb)} dB of attenuation lift it by ${shortFigure(attenuationDb)} dB, and the signal stays under it`
					: 'Without the preamplifier it is that high, and the signal stays under it';
			return {
				title: 'That was your own floor',
				text: `In this set-up noise alone reads ${figure(floorDbm, question.digits)} ${question.unit}. ${cause}. A matched load on the input would have shown the same.`,
				sum: `${figure(floorDbm, question.digits)} of noise, ${figure(question.truth, question.digits)} of signal: together ${figure(setUp ? withNoiseDbm(context, setUp) : yours, question.digits)} ${question.unit}`,
				part: 'noise of the receiver’s own',
				bad: {
					at: 'set-up',
					text:
						by === 'attenuator'
							? 'Here: attenuation still in; take it out for what is weak'
							: 'Here: preamplifier off; switch it on for what is weak'
				}
			};
		},
		make: (steps, { question }) => withRawReading(withSettings(steps, changes), question)
	};
});
