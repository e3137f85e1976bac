import { sweepLossDb } from '$lib/measure/resolution-filter';
import { formatFrequency, joinShown, showTime } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { modelSpread } from '../spreads';
import { withSettings } from '../spoil';

/** Below this a sweep's loss is not worth a word, dB. */
const WORTH_DB = 0.3;

const rateOf = ({ spanHz, sweepTimeS }: ResolvedSettings): number => spanHz / sweepTimeS;

/**
 * What a line loses to the filters, dB: the resolution filter's 5 log (1 + k²) (W. W. Peterson 1955), and what the video
 * filter cuts off the top that is left, a parabola in dB through one pole: 12.04·(S/(B√(1 + k²)))²·τ², τ = 1/(2π·VBW).
 */
function lossDb(resolved: ResolvedSettings): number {
	if (resolved.spanHz === 0) return 0;
	const filter = sweepLossDb(rateOf(resolved), resolved.rbwHz);
	const widened = 10 ** (filter / 5); // 1 + k²
	const perSecond = rateOf(resolved) / resolved.rbwHz;
	const lagS = 1 / (2 * Math.PI * resolved.vbwHz);
	return filter + ((40 * Math.log10(2)) / widened) * (perSecond * lagS) ** 2;
}

/** A carrier's level read off a sweep that ran through it before the filter could fill. */
export const sweepTooFast = defineMistake(
	'sweep-too-fast',
	z.strictObject({ sweepTimeS: z.number().positive(), spanHz: z.number().positive().optional() }),
	({ sweepTimeS, spanHz }) => ({
		stage: 'reading',
		label: 'swept too fast',
		phrase: 'swept faster than your filter fills',
		families: ['point'],
		shows: ({ setUp }) => lossDb(setUp.resolved) > WORTH_DB,
		predict: ({ question }, { resolved }) =>
			lossDb(resolved) > WORTH_DB
				? { value: question.truth - lossDb(resolved), spread: modelSpread(question) }
				: null,
		explain({ question, setUp, yours }) {
			const resolved = setUp?.resolved;
			const lost = resolved ? lossDb(resolved) : 0;
			const took = resolved ? joinShown(showTime(resolved.sweepTimeS)) : 'too little time';
			const needs = resolved ? joinShown(showTime(resolved.autoSweepTimeS)) : 'more';
			const width = resolved ? formatFrequency(resolved.rbwHz) : '';
			return {
				title: 'A narrow filter takes its time',
				text: `You swept in ${took} where a filter of ${width} needs ${needs}. It was past the carrier before it had filled: the needle comes out low, and wider than the filter is.`,
				sum: `${figure(yours, question.digits)} + ${figure(lost, 1)} = ${figure(yours + lost, question.digits)} ${question.unit}`,
				part: 'what the filter had no time to show',
				bad: { at: 'set-up', text: `Here: swept in ${took}, ${needs} needed` }
			};
		},
		make: (steps) => withSettings(steps, { sweepTimeS, ...(spanHz !== undefined && { spanHz }) })
	})
);
