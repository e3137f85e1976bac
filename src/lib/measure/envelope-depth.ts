/** Depth of amplitude modulation from the envelope over time. */
import { envelopeOf, median, periodsS, voltagesOf } from './envelope';
import { minimise } from './minimise';
import { independentLag, pointTimeS, sweepTimeS, videoBandwidthHz } from './noise-statistics';
import { noNumber, type Outcome } from './reader';
import { type Remark, remark } from './remark';
import type { Trace } from './trace';

/** Fits one sinusoid to the voltage of a trace in span 0: depth = amplitude over mean. */
export function envelopeDepth(trace: Trace): Outcome<'am-depth'> {
	const voltages = voltagesOf(trace);
	const periods = periodsS(envelopeOf(trace));
	if (periods.length === 0) {
		return noNumber(
			'The envelope shows no whole period.',
			'a sweep time of several periods, or a span that holds the sidebands'
		);
	}
	const stepS = pointTimeS(trace);
	const roughHz = 1 / median(periods);
	// Fits of neighbouring frequencies differ by one turn over the sweep: the right one lies within half a turn.
	const reachHz = 0.4 / sweepTimeS(trace);
	const modulatingHz = minimise(
		(hz) => fitTone(voltages, hz * stepS).residual,
		roughHz - reachHz,
		roughHz + reachHz
	);
	const { mean, amplitude, residual } = fitTone(voltages, modulatingHz * stepS);
	const value = (100 * amplitude) / mean;
	const left = residual / voltages.length;
	const independent = Math.max(1, voltages.length / independentLag(trace));
	return {
		value,
		unit: '%',
		spread: (100 / mean) * Math.sqrt((2 * left) / independent),
		remarks: [
			...bandwidthRemarks(trace, modulatingHz),
			...(left > (0.1 * amplitude) ** 2 / 2 ? [poorFit()] : [])
		],
		parts: { modulatingHz }
	};
}

const poorFit = (): Remark =>
	remark('poor-fit', 'The envelope is not one sinusoid: noise, distortion or more than one tone.');

interface ToneFit {
	mean: number;
	amplitude: number;
	/** Sum of squares left over. */
	residual: number;
}

/** Least squares of mean, cosine and sine at a known number of turns per point (three normal equations, Cramer's rule). */
function fitTone(values: Float64Array, turnsPerPoint: number): ToneFit {
	const turn = 2 * Math.PI * turnsPerPoint;
	const n = values.length;
	let [c1, s1, cc, ss, cs, y, yc, ys, yy] = [0, 0, 0, 0, 0, 0, 0, 0, 0];
	for (let i = 0; i < n; i++) {
		const c = Math.cos(turn * i);
		const s = Math.sin(turn * i);
		const v = values[i];
		c1 += c;
		s1 += s;
		cc += c * c;
		ss += s * s;
		cs += c * s;
		y += v;
		yc += v * c;
		ys += v * s;
		yy += v * v;
	}
	const det = determinant(n, c1, s1, c1, cc, cs, s1, cs, ss);
	const mean = determinant(y, c1, s1, yc, cc, cs, ys, cs, ss) / det;
	const cosine = determinant(n, y, s1, c1, yc, cs, s1, ys, ss) / det;
	const sine = determinant(n, c1, y, c1, cc, yc, s1, cs, ys) / det;
	const residual = Math.max(0, yy - mean * y - cosine * yc - sine * ys);
	return { mean, amplitude: Math.hypot(cosine, sine), residual };
}

/** Of a 3 × 3 matrix, row by row. */
function determinant(
	a: number,
	b: number,
	c: number,
	d: number,
	e: number,
	f: number,
	g: number,
	h: number,
	i: number
) {
	return a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
}

/** Filters that take more than a hundredth off the sidebands: Gaussian 0.1 B, one pole 0.14 VBW. */
function bandwidthRemarks(trace: Trace, modulatingHz: number): Remark[] {
	const found: Remark[] = [];
	if (modulatingHz > 0.1 * trace.rbwHz) {
		found.push(
			remark(
				'rbw-too-narrow',
				'The resolution filter takes something off the sidebands: the depth reads low.'
			)
		);
	}
	if (modulatingHz > 0.14 * videoBandwidthHz(trace)) {
		found.push(remark('vbw-too-narrow', 'The video filter smooths the envelope: the depth reads low.'));
	}
	return found;
}
