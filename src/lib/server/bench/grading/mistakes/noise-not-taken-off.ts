import { z } from 'zod';
import { powerRatioToDb, dbmToMilliwatts, milliwattsToDbm } from '$lib/units/decibel';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { isDeaf, noiseMw, noiseSpreadDb } from '../noise-in-reading';
import { withRawReading, withSettings } from '../spoil';

/**
 * A level or density near the noise, reported with the noise in it.
 * `rbwHz`: made with this resolution, where the taught one lets in too little to matter.
 */
export const noiseNotTakenOff = defineMistake(
	'noise-not-taken-off',
	z.strictObject({ rbwHz: z.number().positive().optional() }),
	({ rbwHz }) => ({
		stage: 'slip',
		label: 'noise left in',
		phrase: 'left the noise in',
		change(context, setUp, source) {
			if (source && Number.isFinite(source.cleanValue)) return source.planeValue - source.cleanValue;
			// a receiver that hears nothing but itself is another mistake
			if (!setUp || isDeaf(context, setUp)) return null;
			return powerRatioToDb(1 + noiseMw(context, setUp) / dbmToMilliwatts(context.question.truth));
		},
		// the noise left in is as uncertain as its own reading
		spread: noiseSpreadDb,
		explain({ yours, change, question }) {
			const noiseDbm = milliwattsToDbm(dbmToMilliwatts(yours) - dbmToMilliwatts(yours + change));
			const { digits, unit } = question;
			return {
				title: 'Noise adds to what you read',
				text: `What you reported is signal and noise together. The noise alone stood at ${figure(noiseDbm, digits)} ${unit} there, only ${figure(yours - noiseDbm, 1)} dB under your number. It comes off as power: in milliwatts, not in decibels.`,
				sum: `10 log (10^(${figure(yours, digits)}/10) − 10^(${figure(noiseDbm, digits)}/10)) = ${figure(yours + change, digits)} ${unit}`,
				part: 'noise, added to the signal',
				bad: { at: 'answer', text: 'Here: the noise is still in it; read it alone and take it off' }
			};
		},
		make: (steps, { question }) =>
			withRawReading(rbwHz === undefined ? steps : withSettings(steps, { rbwHz }), question)
	})
);
