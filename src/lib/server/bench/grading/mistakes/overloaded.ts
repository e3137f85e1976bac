import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { mixerChangeDb, mixerLevelDbm, overloads } from '../mixer';
import { defineMistake } from '../mistake';
import { withSettings } from '../spoil';
import { modelSpread } from '../spreads';

/** A carrier read while the mixer has more than it can take: compressed, and low. Made by too little attenuation, or a preamplifier left on. */
export const overloaded = defineMistake(
	'overloaded',
	z.strictObject({ attenuationDb: z.number().min(0), preamp: z.boolean().optional() }),
	({ attenuationDb, preamp = false }) => ({
		stage: 'reading',
		label: 'mixer overloaded',
		phrase: 'read with the mixer overloaded',
		families: ['point'],
		shows: ({ setUp }, context) => overloads(context, setUp.resolved),
		predict: (context, { resolved }) =>
			overloads(context, resolved)
				? {
						value: context.question.truth + mixerChangeDb(context, resolved),
						spread: modelSpread(context.question)
					}
				: null,
		explain({ setUp, yours, drawn, question }) {
			const context = { drawn, question };
			const resolved = setUp?.resolved;
			const mixer = resolved ? `${figure(mixerLevelDbm(context, resolved), 1)} dBm` : 'too much';
			const lostDb = resolved ? -mixerChangeDb(context, resolved) : 0;
			const set = resolved?.preamp
				? `${resolved.attenuationDb} dB of attenuation and the preamplifier on`
				: `${resolved?.attenuationDb ?? 0} dB of attenuation`;
			return {
				title: 'A mixer that is full bends everything',
				text: `With ${set}, ${mixer} stood at the mixer, all carriers together, where this receiver begins to bend above ${figure((drawn.profile.toiDbm ?? 0) - 12.6, 1)} dBm. What you read is what the mixer let through. Ten decibels more attenuation must leave a true needle where it is.`,
				sum: `${figure(yours, question.digits)} + ${figure(lostDb, 1)} = ${figure(yours + lostDb, question.digits)} ${question.unit}`,
				part: 'what the overloaded mixer held back',
				bad: { at: 'set-up', text: `Here: ${mixer} at the mixer; attenuate until nothing moves` }
			};
		},
		make: (steps) => withSettings(steps, { attenuationDb, preamp })
	})
);
