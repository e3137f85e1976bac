import { z } from 'zod';
import { dbToPowerRatio, powerRatioToDb } from '$lib/units/decibel';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { skirtUpDb } from '../own-phase-noise';
import { withoutSum } from '../spoil';

/** How far a reading of skirts strays, dB, where no reading says. */
const STRAYS_DB = 0.2;

/** Phase noise near the receiver's own, reported with that in it. */
export const ownPhaseNoise = defineMistake('own-phase-noise', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'own oscillator left in',
	phrase: 'left your receiver’s own phase noise in',
	change(context, setUp, source) {
		if (source && Number.isFinite(source.cleanValue)) return source.planeValue - source.cleanValue;
		return setUp ? skirtUpDb(context, setUp) : null;
	},
	spread: () => STRAYS_DB,
	explain({ yours, change, question }) {
		const { digits, unit } = question;
		const rightDb = yours + change;
		const ownDb = powerRatioToDb(Math.max(1e-30, dbToPowerRatio(yours) - dbToPowerRatio(rightDb)));
		return {
			title: 'Two oscillators, one skirt',
			text: `The skirt on your screen is the sum of two: the carrier’s and that of your receiver’s own oscillator, which rides on every carrier that it meets. Yours stands at ${figure(ownDb, digits)} ${unit} at this offset, as a clean carrier shows. It comes off as power.`,
			sum: `10 log (10^(${figure(yours, digits)}/10) − 10^(${figure(ownDb, digits)}/10)) = ${figure(rightDb, digits)} ${unit}`,
			part: 'the receiver’s own phase noise',
			bad: {
				at: 'answer',
				text: 'Here: your own oscillator is still in it; read a clean carrier and take it off'
			}
		};
	},
	make: (steps, { question }) => withoutSum(steps, question.id)
}));
