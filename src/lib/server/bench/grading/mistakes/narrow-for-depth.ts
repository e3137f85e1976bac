import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { figure } from '$lib/server/bench/exercise/figure';
import { gaussianConstant } from '$lib/server/bench/receiver/resolution-filter';
import { defineMistake, type Context } from '../mistake';
import { toneOf } from '../modulation';
import { said } from '../said';
import { modelSpread } from '../spreads';
import { withSettings } from '../spoil';

/**
 * What both filters leave of the sidebands: the Gaussian one exp(−c·f²) of each, c = 2 ln 2/B², the video filter's pole
 * 1/√(1 + (f/VBW)²) of the envelope's swing.
 */
const leftOf = ({ rbwHz, vbwHz }: ResolvedSettings, toneHz: number): number =>
	Math.exp(-gaussianConstant(rbwHz) * toneHz ** 2) / Math.hypot(1, toneHz / vbwHz);

const isShaved = (context: Context, resolved: ResolvedSettings): boolean => {
	const { question } = context;
	const lost = 1 - leftOf(resolved, toneOf(context).modulatingHz);
	return resolved.spanHz === 0 && lost * question.truth > question.tolerance / 2;
};

/** The depth of amplitude modulation over time, through filters that hold the sidebands back. */
export const narrowForDepth = defineMistake(
	'narrow-for-depth',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'reading',
		label: `through ${formatFrequency(rbwHz)}`,
		phrase: 'watched the envelope through a filter too narrow for it',
		families: ['am-depth'],
		shows: ({ setUp }, context) => isShaved(context, setUp.resolved),
		predict(context, { resolved }) {
			if (!isShaved(context, resolved)) return null;
			const left = leftOf(resolved, toneOf(context).modulatingHz);
			return { value: left * context.question.truth, spread: modelSpread(context.question) };
		},
		explain({ setUp, yours, ...context }) {
			const { modulatingHz } = toneOf(context);
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			const left = setUp ? leftOf(setUp.resolved, modulatingHz) : yours / context.question.truth;
			return {
				title: 'The filter held the sidebands back',
				text: `An envelope moves as fast as its sidebands are far away: ${formatFrequency(Math.round(modulatingHz))} here. Your filter of ${formatFrequency(used)} lets the carrier through whole and of the sidebands only a part, so the envelope swings less than it does. Over time the filter must be ten times wider than the tone, and the video filter with it.`,
				sum: `${said(yours, context.question)} ÷ ${figure(left, 3)} = ${said(yours / left, context.question)}`,
				part: 'what the filter held back of the sidebands',
				bad: { at: 'set-up', text: `Here: resolution ${formatFrequency(used)}; ten times the tone or more` }
			};
		},
		make: (steps) =>
			steps.map((step) =>
				step.do === 'set' && step.settings.spanHz === 0
					? withSettings([step], { rbwHz, vbwHz: 'auto' })[0]
					: step
			)
	})
);
