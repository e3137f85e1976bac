/** A carrier and its harmonics, as far as the trace reaches. */
import { findLine } from './find-line';
import { lineSpreadDb, noiseBetweenDbm } from './line-spectrum';
import type { Harmonic } from './reading';
import { needsSpan, noNumber, type NoNumber, outsideTrace } from './reader';
import { type Remark, remark } from './remark';
import { outsideRemark, unresolvedLineRemarks } from './remarks';
import { covers, isZeroSpan, stepHz, type Trace } from './trace';

export interface HarmonicLines {
	fundamentalSpreadDb: number;
	harmonics: (Harmonic & { spreadDb: number })[];
	remarks: Remark[];
}

/** @param count harmonics above the fundamental: n = 2 … count + 1; those beyond the trace are left out */
export function readHarmonics(trace: Trace, fundamentalHz: number, count: number): HarmonicLines | NoNumber {
	if (isZeroSpan(trace)) return needsSpan();
	if (!covers(trace, fundamentalHz)) return outsideTrace('The fundamental');
	const reachHz = Math.max(2 * trace.rbwHz, 2 * stepHz(trace));
	const fundamental = findLine(trace, fundamentalHz, reachHz);
	const noiseDbm = noiseBetweenDbm(trace);
	const harmonics: HarmonicLines['harmonics'] = [];
	for (let n = 2; n <= count + 1; n++) {
		if (!covers(trace, n * fundamental.frequencyHz)) continue;
		// The fundamental is known to half a step, its n-th harmonic to n times that.
		const line = findLine(trace, n * fundamental.frequencyHz, Math.max(trace.rbwHz, (n * stepHz(trace)) / 2));
		harmonics.push({
			n,
			frequencyHz: line.frequencyHz,
			levelDbm: line.levelDbm,
			dbc: line.levelDbm - fundamental.levelDbm,
			spreadDb: lineSpreadDb(trace, line.levelDbm, noiseDbm)
		});
	}
	if (harmonics.length === 0)
		return noNumber('No harmonic lies on the trace.', 'a span up to twice the fundamental or more');
	const buried = harmonics.filter(({ levelDbm }) => levelDbm < noiseDbm + 10);
	const nearNoise = remark(
		'near-noise',
		`At harmonic ${buried.map(({ n }) => n).join(', ')} the trace shows little but noise.`
	);
	return {
		fundamentalSpreadDb: lineSpreadDb(trace, fundamental.levelDbm, noiseDbm),
		harmonics,
		remarks: [
			...unresolvedLineRemarks(trace),
			...(buried.length > 0 ? [nearNoise] : []),
			...(harmonics.length < count ? [outsideRemark()] : [])
		]
	};
}
