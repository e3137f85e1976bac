/**
 * Peak deviation of sinusoidal frequency modulation from its lines: levels go as |J_n(β)|, deviation = β·modulating frequency.
 * All lines are fitted together, so that an index above 1, or a carrier that vanishes, is no harder than a small one.
 */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { fitModulationIndex, type IndexFit } from '../fit-modulation-index';
import { noiseBetweenDbm } from '../line-spectrum';
import { type ModulationLines, modulationLines } from '../modulation-lines';
import { independentValues } from '../noise-statistics';
import { isNoNumber, type Reader } from '../reader';
import { type Remark, remark } from '../remark';
import { unresolvedLineRemarks } from '../remarks';
import type { Trace } from '../trace';

export const fmDeviation: Reader<'fm-deviation'> = (trace, { carrierHz }) => {
	const lines = modulationLines(trace, carrierHz);
	if (isNoNumber(lines)) return lines;
	const fit = fitModulationIndex(lines.pairs.map(meanAmplitude));
	const { modulatingHz, modulatingSpreadHz } = lines;
	return {
		value: fit.index * modulatingHz,
		unit: 'Hz',
		spread: Math.hypot(modulatingHz * indexSpread(trace, fit), fit.index * modulatingSpreadHz),
		remarks: [...unresolvedLineRemarks(trace), ...fitRemarks(lines, fit)],
		parts: { modulatingHz, index: fit.index }
	};
};

/** √mW, over the sides that the trace holds. */
function meanAmplitude({ lower, upper }: ModulationLines['pairs'][number]): number {
	const sides = [lower, upper].filter((line) => line !== undefined);
	return sides.reduce((sum, { levelDbm }) => sum + dbmToMilliwatts(levelDbm / 2), 0) / sides.length;
}

/** Noise moves every amplitude by √(noise/2); the slopes of all J_n together have Σ J_n′² = ½, whatever the index. */
function indexSpread(trace: Trace, { amplitude }: IndexFit): number {
	const noiseMw = dbmToMilliwatts(noiseBetweenDbm(trace)) / independentValues(trace, 1);
	return Math.min(10, Math.sqrt(noiseMw) / amplitude);
}

function fitRemarks({ pairs, lastFound }: ModulationLines, { residual }: IndexFit): Remark[] {
	const found: Remark[] = [];
	const first = pairs[1];
	const unequalDb = first?.lower && first.upper ? Math.abs(first.lower.levelDbm - first.upper.levelDbm) : 0;
	if (unequalDb > 1) {
		found.push(
			remark('sidebands-unequal', 'The first sidebands differ: there is amplitude modulation as well.')
		);
	}
	if (lastFound < 2) {
		found.push(
			remark(
				'no-second-pair',
				'No second pair of sidebands stands out: amplitude modulation would look the same.'
			)
		);
	}
	if (residual > 0.1) {
		found.push(
			remark(
				'poor-fit',
				`The lines do not fit one sinusoidal deviation: ${(100 * residual).toFixed(0)} % is left over.`
			)
		);
	}
	return found;
}
