/**
 * Pulses from their spectrum. Lines: the filter is narrower than the repetition, and lines stand repetition apart. Pulses: it is wider,
 * and each pulse writes a spike as the sweep passes, so their distance is time. Either way the tops follow |sin(πfτ)/(πfτ)|.
 */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { median } from './envelope';
import { fitSinc } from './fit-sinc';
import { lineSpacing } from './line-spacing';
import { linesOf } from './line-spectrum';
import type { SpectralLine } from './find-line';
import { sweepTimeS } from './noise-statistics';
import { noNumber, outsideTrace, type Outcome } from './reader';
import { type Remark, remark } from './remark';
import { unresolvedLineRemarks } from './remarks';
import { covers, frequencyAt, spanHz, stepHz, type Trace } from './trace';

export function pulseSpectrum(trace: Trace, carrierHz: number): Outcome<'pulse'> {
	if (!covers(trace, carrierHz)) return outsideTrace('The carrier');
	const peaks = linesOf(trace, 40);
	const shape = spectrumShape(trace, peaks);
	const tops = shape === 'continuous' ? everyPoint(trace) : peaks;
	if (tops.length < 4) {
		return noNumber(
			'Too few lines or pulses stand on the trace to follow their envelope.',
			'a span of two or more lobes'
		);
	}
	const fit = fitSinc(
		tops.map(({ frequencyHz }) => frequencyHz - carrierHz),
		tops.map(({ levelDbm }) => dbmToMilliwatts(levelDbm / 2)),
		spanHz(trace)
	);
	const repetitionHz = repetition(trace, shape, peaks, carrierHz);
	return {
		value: fit.widthS,
		unit: 's',
		spread: fit.spreadS,
		remarks: [...(shape === 'lines' ? unresolvedLineRemarks(trace) : []), ...pulseRemarks(fit, repetitionHz)],
		parts: { widthS: fit.widthS, repetitionHz }
	};
}

type Shape = 'lines' | 'pulses' | 'continuous';

/** From the width of a peak 3 dB down: a line is as wide as the filter, a pulse's spike narrower, a lobe of a continuous envelope wider. */
function spectrumShape(trace: Trace, peaks: SpectralLine[]): Shape {
	if (peaks.length < 4) return 'continuous';
	const strongest = [...peaks].sort((a, b) => b.levelDbm - a.levelDbm).slice(0, 9);
	const widthHz = median(strongest.map(({ index }) => widthAt(trace, index))) * stepHz(trace);
	if (widthHz > 3 * trace.rbwHz + 2 * stepHz(trace)) return 'continuous';
	return widthHz < 0.6 * trace.rbwHz ? 'pulses' : 'lines';
}

/** Width of a peak 3 dB down, in points. */
function widthAt({ levelsDbm }: Trace, index: number): number {
	const limitDbm = levelsDbm[index] - 3.0103;
	let [from, to] = [index, index];
	while (from > 0 && levelsDbm[from] > limitDbm) from--;
	while (to < levelsDbm.length - 1 && levelsDbm[to] > limitDbm) to++;
	const share = (inside: number, outside: number) =>
		levelsDbm[inside] === levelsDbm[outside]
			? 0
			: Math.min(1, Math.max(0, (levelsDbm[inside] - limitDbm) / (levelsDbm[inside] - levelsDbm[outside])));
	return to - from - (1 - share(from + 1, from)) - (1 - share(to - 1, to));
}

/** A few hundred points are enough to fit two numbers, and keep the reading as quick as the screen. */
function everyPoint(trace: Trace): { frequencyHz: number; levelDbm: number }[] {
	const stride = Math.ceil(trace.levelsDbm.length / 400);
	return Array.from({ length: Math.ceil(trace.levelsDbm.length / stride) }, (_, i) => ({
		frequencyHz: frequencyAt(trace, i * stride),
		levelDbm: trace.levelsDbm[i * stride]
	}));
}

function repetition(
	trace: Trace,
	shape: Shape,
	peaks: SpectralLine[],
	carrierHz: number
): number | undefined {
	if (shape === 'continuous') return undefined;
	const gaps = peaks.slice(1).map(({ frequencyHz }, i) => frequencyHz - peaks[i].frequencyHz);
	// A spike stands where the sweep was when its pulse came, to a point, however wide the filter.
	const toleranceHz = shape === 'pulses' ? stepHz(trace) : Math.max(stepHz(trace), trace.rbwHz / 10);
	const spacingHz = lineSpacing(peaks, carrierHz, toleranceHz)?.spacingHz ?? median(gaps);
	return shape === 'lines' ? spacingHz : spanHz(trace) / sweepTimeS(trace) / spacingHz;
}

function pulseRemarks({ residual }: { residual: number }, repetitionHz: number | undefined): Remark[] {
	const found: Remark[] = [];
	if (repetitionHz === undefined) {
		found.push(
			remark('no-repetition', 'Neither lines nor single pulses stand apart: no repetition can be read.')
		);
	}
	if (residual > 0.15) {
		found.push(
			remark(
				'poor-fit',
				`The envelope does not follow one pulse width: ${(100 * residual).toFixed(0)} % is left over.`
			)
		);
	}
	return found;
}
