import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { asksPlace } from '../asked';
import { displayedHz } from '../displayed';
import { defineMistake, type Context } from '../mistake';
import { ownError } from '../own-error';
import { said } from '../said';
import { modelSpread } from '../spreads';
import { withReading, withSettings } from '../spoil';

const stepHz = ({ spanHz, points }: ResolvedSettings): number => spanHz / (points - 1);

/** Where a marker put at `hz` comes to stand: on the nearest point. */
const onPointHz = (hz: number, resolved: ResolvedSettings): number =>
	resolved.startHz + Math.round((hz - resolved.startHz) / stepHz(resolved)) * stepHz(resolved);

const changed = z.strictObject({
	centreHz: z.number().positive().optional(),
	spanHz: z.number().positive(),
	points: z.int().positive().optional(),
	rbwHz: z.number().positive().optional()
});

/** A frequency, or a distance in frequency, read off points that lie farther apart than the answer has to be right. */
export const coarsePoints = defineMistake('coarse-points', changed, (settings) => ({
	stage: 'reading',
	label: 'off a wide span',
	phrase: 'read a frequency off points too far apart',
	families: ['point', 'delta'],
	shows: ({ setUp }, { question }) => question.unit === 'Hz' && stepHz(setUp.resolved) > question.tolerance,
	predict(context, { resolved }) {
		const { question } = context;
		if (stepHz(resolved) <= question.tolerance) return null;
		const spread = modelSpread(question);
		if (asksPlace(question)) {
			const shown = onPointHz(displayedHz(context, question.truth), resolved);
			return { value: shown - ownError(context), spread };
		}
		const [from, to] = markersHz(context).map((hz) => onPointHz(hz, resolved));
		return { value: to - from, spread };
	},
	explain({ question, setUp, yours }) {
		const step = setUp ? formatFrequency(stepHz(setUp.resolved)) : 'too far';
		return {
			title: 'A marker stands on a point',
			text: `Your points lay ${step} apart, and a marker can stand on nothing but a point. It may be half of that beside the top, ${asksPlace(question) ? '' : 'each of the two, '}while the order wants ±${said(question.tolerance, question)}. ${asksPlace(question) ? 'Count, or narrow the span.' : 'Narrow the span until both just fit.'}`,
			sum: `${said(yours, question)} read, ${said(question.truth, question)} true: ${said(yours - question.truth, question)} off`,
			part: 'what lies between two points',
			bad: { at: 'set-up', text: `Here: points ${step} apart` }
		};
	},
	make(steps, context) {
		const { question } = context;
		const coarse = withSettings(steps, settings);
		if (!asksPlace(question)) return coarse;
		const marker = { kind: 'marker', atHz: displayedHz(context, question.truth) } as const;
		return withReading(coarse, question.id, marker, undefined, 'frequencyHz');
	}
}));

/** Where the two markers of a distance go, Hz as displayed. */
function markersHz({ drawn, question }: Context): [number, number] {
	const { fromHz = 0, toHz = 0 } = question.quantity as { fromHz?: number; toHz?: number };
	return [displayedHz({ drawn }, fromHz), displayedHz({ drawn }, toHz)];
}
