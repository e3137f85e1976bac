import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { drawReceiverError } from '$lib/server/bench/receiver/receiver-error';
import { defineMistake, type Context } from '../mistake';
import { lineDbm } from '../other-carrier';
import { modelSpread } from '../spreads';
import { withReading } from '../spoil';

/** Where the harmonic asked for stands, Hz. */
function harmonicHz({ question: { quantity, part } }: Context): number {
	const fundamentalHz = 'fundamentalHz' in quantity ? quantity.fundamentalHz : 0;
	return (part !== undefined && typeof part !== 'string' && 'n' in part ? part.n : 2) * fundamentalHz;
}

/** A harmonic's own level in dBm given where its ratio to the carrier, in dBc, is asked. */
export const harmonicLevelForRatio = defineMistake('harmonic-level-for-ratio', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'dBm, not dBc',
	phrase: 'gave the harmonic’s level for its ratio',
	families: ['point'],
	shows: () => true,
	predict(context) {
		const atHz = harmonicHz(context);
		const { profile, seed } = context.drawn;
		const value = lineDbm(context, atHz) + drawReceiverError(profile, seed).levelDb(atHz);
		return { value, spread: 2 * modelSpread(context.question) };
	},
	explain({ yours, ...context }) {
		const { question } = context;
		const { quantity, digits } = question;
		const carrierDbm = lineDbm(context, 'fundamentalHz' in quantity ? quantity.fundamentalHz : 0);
		return {
			title: 'dBc is against the carrier',
			text: 'You gave the harmonic’s level as it stands on the screen. dBc says how far it stands from the carrier: take the carrier’s level off.',
			sum: `${figure(yours, digits)} dBm − (${figure(carrierDbm, digits)} dBm) = ${figure(yours - carrierDbm, digits)} dBc`,
			part: 'the carrier’s own level, not taken off',
			bad: { at: 'answer', text: 'Here: dBm is not dBc; take the carrier’s level off' }
		};
	},
	make: (steps, context) =>
		withReading(steps, context.question.id, { kind: 'marker', atHz: harmonicHz(context) })
}));
