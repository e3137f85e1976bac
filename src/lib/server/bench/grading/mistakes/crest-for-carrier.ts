import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { Settings } from '$lib/schemas/settings';
import { figure } from '$lib/server/bench/exercise/figure';
import { truth } from '$lib/server/bench/truth/truth';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { modelSpread } from '../spreads';
import { withSettings, withSweeps } from '../spoil';

const SWEEPS = 60;
/** Of many sweeps at any moment of the tone the best meets nearly the crest: mean of the greatest of some tens of cosines. */
const MET = 0.99;

/** Depth of the carrier asked for, 0 to 1, and its tone, Hz. */
function modulationOf({ drawn, question }: Context): { depth: number; modulatingHz: number } {
	const { value, parts } = truth(drawn.scene, { kind: 'am-depth', carrierHz: question.frequencyHz });
	return { depth: value / 100, modulatingHz: (parts as { modulatingHz: number }).modulatingHz };
}

/** The sidebands within the filter, and the highest moments kept. */
const keepsCrests = (context: Context, { resolved, trace }: SetUp): boolean =>
	resolved.rbwHz > 4 * modulationOf(context).modulatingHz && trace.mode === 'max-hold';

/** The crest of an amplitude-modulated carrier given for the carrier's level. */
export const crestForCarrier = defineMistake(
	'crest-for-carrier',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => {
		const held: Settings = {
			rbwHz,
			vbwHz: 'auto',
			sweepTimeS: 'auto',
			detector: 'positive-peak',
			traces: [{ mode: 'max-hold' }]
		};
		return {
			stage: 'reading',
			label: 'crest of the envelope',
			phrase: 'read the crest of the modulation for the carrier',
			families: ['point'],
			shows: ({ setUp }, context) => keepsCrests(context, setUp),
			predict(context, setUp) {
				if (!keepsCrests(context, setUp)) return null;
				const crestDb = 20 * Math.log10(1 + MET * modulationOf(context).depth);
				return { value: context.question.truth + crestDb, spread: 2 * modelSpread(context.question) };
			},
			explain({ setUp, yours, ...context }) {
				const { digits, unit } = context.question;
				const { depth } = modulationOf(context);
				const crestDb = 20 * Math.log10(1 + depth);
				const width = setUp?.resolved.rbwHz ?? rbwHz;
				return {
					title: 'That is the crest, not the carrier',
					text: `Your filter of ${formatFrequency(width)} holds the carrier and both sidebands, and the trace kept the highest moment of their sum: at ${figure(100 * depth, 0)} % depth the envelope climbs to ${figure(1 + depth, 2)} times the carrier. A filter narrower than the tone shows the carrier by itself.`,
					sum: `${figure(yours, digits)} − 20 log ${figure(1 + depth, 2)} = ${figure(yours - crestDb, digits)} ${unit}`,
					part: 'the modulation’s crest over the carrier',
					bad: {
						at: 'set-up',
						text: `Here: a held maximum through ${formatFrequency(width)}; narrower, and not held`
					}
				};
			},
			make: (steps) =>
				withSweeps(
					steps.map((step) =>
						step.do === 'set' && step.settings.spanHz === 0 ? step : withSettings([step], held)[0]
					),
					SWEEPS
				)
		};
	}
);
