import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { quantityFrequencyHz } from '$lib/server/bench/exercise/quantity-frequency';
import { askedOffset, neighbourHz } from '../adjacent';
import { defineMistake, type Context } from '../mistake';
import { bandSpreadDb } from '../noise-law';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { drawReceiverError } from '$lib/server/bench/receiver/receiver-error';
import { channelDbm } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

const neighbourDbm = (context: Context): number =>
	channelDbm(context, neighbourHz(context), askedOffset(context).widthHz);
const ownDbm = ({ drawn, question }: Context): number => {
	const { quantity } = question;
	return quantity.kind === 'adjacent-channel'
		? channelDbm({ drawn, question }, quantity.centreHz, quantity.widthHz)
		: 0;
};

/** The power in the next channel given in dBm where its ratio to the own channel is asked, in dBc. */
export const levelForRatio = defineMistake('level-for-ratio', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'dBm, not dBc',
	phrase: 'gave a level where a ratio is asked',
	families: ['band'],
	shows: ({ request }, context) =>
		Math.abs(quantityFrequencyHz(request) - neighbourHz(context)) < 0.1 * askedOffset(context).offsetHz,
	predict(context, setUp) {
		const { correctionDb } = setUp.resolved;
		const { scene, profile, seed } = context.drawn;
		const atHz = neighbourHz(context);
		const leadDb = scene.path ? lossDbAt(scene.path, atHz) : 0;
		const applied = typeof correctionDb === 'number' ? correctionDb : leadDb;
		const errorDb = drawReceiverError(profile, seed).levelDb(atHz);
		return {
			value: neighbourDbm(context) - leadDb + applied + errorDb,
			spread: Math.hypot(modelSpread(context.question), bandSpreadDb(setUp, askedOffset(context).widthHz))
		};
	},
	explain({ yours, ...context }) {
		const { question } = context;
		const own = ownDbm(context);
		return {
			title: 'dBc is against the carrier',
			text: 'You gave the power in the next channel as it stands. The order asks how far it lies under the power of the transmitter’s own channel: both are read as channel power, and one is taken from the other.',
			sum: `${figure(neighbourDbm(context), question.digits)} dBm − (${figure(own, question.digits)} dBm) = ${figure(question.truth, question.digits)} dBc`,
			note:
				Math.abs(yours - neighbourDbm(context)) < 0.05
					? undefined
					: `you read ${figure(yours, question.digits)} dBm, with the receiver’s own error`,
			part: 'the power of the transmitter’s own channel, not taken off',
			bad: { at: 'answer', text: 'Here: dBm is not dBc; take the own channel’s power off' }
		};
	},
	make: (steps, context) =>
		withReading(steps, context.question.id, {
			kind: 'channel-power',
			centreHz: neighbourHz(context),
			widthHz: askedOffset(context).widthHz
		})
}));
