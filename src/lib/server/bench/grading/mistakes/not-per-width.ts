import { powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { BenchRequest } from '$lib/schemas/reading';
import { figure } from '$lib/server/bench/exercise/figure';
import { displayedHz } from '../displayed';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { NOISE_BANDWIDTH, pointSpreadDb } from '../noise-law';
import { shownReading } from '../shown-reading';
import { modelSpread } from '../spreads';
import { withReading } from '../spoil';

/** From the carrier to the noise, or the other way about, as the question's number has its sign. */
function deltaOf(context: Context): Extract<BenchRequest, { kind: 'delta' }> {
	const { quantity } = context.question;
	const shown = (hz: number) => displayedHz(context, hz);
	if (quantity.kind === 'phase-noise') {
		const { carrierHz, offsetHz } = quantity;
		return { kind: 'delta', fromHz: shown(carrierHz), toHz: shown(carrierHz + offsetHz) };
	}
	if (quantity.kind === 'carrier-to-noise') {
		return { kind: 'delta', fromHz: shown(quantity.noiseHz), toHz: shown(quantity.carrierHz) };
	}
	return { kind: 'delta', fromHz: 0, toHz: 0 };
}

/** Width that the question speaks of: a hertz, or the channel. */
const widthHzOf = ({ question: { quantity } }: Context): number =>
	quantity.kind === 'carrier-to-noise' ? quantity.widthHz : 1;

/** What brings a difference of two markers to the width asked for, dB. */
const missingDb = (context: Context, { resolved }: SetUp): number => {
	const db = powerRatioToDb(widthHzOf(context) / (NOISE_BANDWIDTH * resolved.rbwHz));
	return context.question.quantity.kind === 'carrier-to-noise' ? -db : db;
};

/** Carrier and noise compared with two markers: the noise in one filter, not in the width asked for. */
export const notPerWidth = defineMistake('not-per-width', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'two markers',
	phrase: 'compared carrier and noise with two markers',
	families: ['delta'],
	shows: () => true,
	predict(context, setUp) {
		const value = shownReading(context, setUp, deltaOf(context));
		if (value === null) return null;
		return { value, spread: Math.hypot(modelSpread(context.question), pointSpreadDb(setUp)) };
	},
	explain({ setUp, yours, ...context }) {
		const { digits, unit } = context.question;
		const rbwHz = setUp?.resolved.rbwHz ?? context.drawn.profile.rbwHz[0];
		const missing = setUp ? missingDb(context, setUp) : context.question.truth - yours;
		const wanted = widthHzOf(context) === 1 ? 'one hertz' : formatFrequency(widthHzOf(context));
		return {
			title: 'A marker on noise depends on the filter',
			text: `Carrier and noise were compared with two markers. The carrier reads the same through any filter; the noise is what your filter of ${formatFrequency(rbwHz)} lets in, ${figure(NOISE_BANDWIDTH * rbwHz, 0)} Hz of it. The order asks for the noise in ${wanted}.`,
			sum: `${figure(yours, digits)} ${missing < 0 ? '−' : '+'} ${figure(Math.abs(missing), 1)} = ${figure(yours + missing, digits)} ${unit}`,
			part: `the noise in ${wanted}, not in one filter`,
			bad: { at: 'reading', text: 'Here: two markers; take the reading that knows its filter' }
		};
	},
	make: (steps, context) => withReading(steps, context.question.id, deltaOf(context))
}));
