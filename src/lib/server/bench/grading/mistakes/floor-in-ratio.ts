import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { ownShare } from '../own-share';
import { said } from '../said';
import { shownReading } from '../shown-reading';
import { modelSpread } from '../spreads';
import { withSettings } from '../spoil';

const decides = (context: Context, setUp: SetUp): boolean => {
	const share = ownShare(context, setUp, askedReading(context));
	return share !== null && Math.abs(share.noiseUp) > context.question.tolerance / 2;
};

/** A carrier held against the receiver's own floor in place of the noise that came with it. */
export const floorInRatio = defineMistake(
	'floor-in-ratio',
	z.strictObject({ attenuationDb: z.number().min(0) }),
	({ attenuationDb }) => ({
		stage: 'reading',
		label: `${shortFigure(attenuationDb, 0)} dB in front`,
		phrase: 'held the carrier against your own floor',
		families: ['carrier-to-noise'],
		shows: ({ setUp }, context) => decides(context, setUp),
		predict(context, setUp) {
			if (!decides(context, setUp)) return null;
			const value = shownReading(context, setUp, askedReading(context));
			return value === null ? null : { value, spread: 2 * modelSpread(context.question) };
		},
		explain({ setUp, yours, question }) {
			const usedDb = setUp?.resolved.attenuationDb ?? attenuationDb;
			const preamp = setUp?.resolved.preamp ? 'on' : 'off';
			return {
				title: 'That noise was your own',
				text: `With ${shortFigure(usedDb, 0)} dB of attenuation and the preamplifier ${preamp}, the receiver’s floor stood over the noise that comes with the carrier. The ratio then says how good your set-up is, not the link. Attenuator out and preamplifier on, as far as the mixer allows: the floor must lie 10 dB under the noise you measure.`,
				sum: `${said(yours, question)} against your floor, ${said(question.truth, question)} against its own noise: ${figure(Math.abs(question.truth - yours), 1)} dB lost`,
				part: 'the receiver’s own floor in the noise',
				bad: { at: 'set-up', text: `Here: ${shortFigure(usedDb, 0)} dB in front, preamplifier ${preamp}` }
			};
		},
		make: (steps) => withSettings(steps, { attenuationDb, preamp: false })
	})
);
