/** Lines: always on, drifting, or in bursts. */
import { addBurst } from './burst-response';
import { reachIndexes, turns, type Contribution, type RowContext } from './contribution';
import type { Frame } from './frame';
import type { IncidentLine } from './incident';
import { addLine, lineReachHz, type PassingLine } from './line-response';
import type { Seed } from './random';
import { Schedule } from './schedule';

/** Power below the floor at which a line is left out: 60 dB under the noise adds 5·10⁻³ dB at most. */
const NEGLIGIBLE = 1e-6;
/** However strong, a line is followed no farther than this many resolution bandwidths. */
const FARTHEST_RBW = 30;

/** Tuned distance within which a line of this power matters over a floor of `floorMw`, Hz. */
export function reachHz(frame: Frame, powerMw: number, floorMw: number, passingHzPerS: number): number {
	const ratio = (NEGLIGIBLE * floorMw) / powerMw;
	if (ratio >= 1) return 0;
	const chirp = (frame.c * passingHzPerS) / Math.PI;
	return Math.min(
		lineReachHz(frame.c, chirp, ratio),
		FARTHEST_RBW * frame.rbwHz * Math.sqrt(1 + chirp * chirp)
	);
}

/** The line as a sweep that starts at the row's clock meets it; phases are relative to the tuned start, common to all. */
export function passing(line: IncidentLine, frame: Frame, clockS: number, channelHz?: number): PassingLine {
	const drift = line.timing?.driftHzPerS ?? 0;
	const frequencyHz = channelHz ?? line.frequencyHz;
	const offset0 = frequencyHz - frame.startHz;
	const phase = turns(offset0 * clockS) + turns(0.5 * drift * clockS * clockS);
	const cos = Math.cos(phase);
	const sin = Math.sin(phase);
	return {
		re: line.re * cos - line.im * sin,
		im: line.re * sin + line.im * cos,
		offsetHz: offset0 + drift * clockS,
		passingHzPerS: frame.sweepHzPerS - drift
	};
}

export class LineContribution implements Contribution {
	private readonly powerMw: number;
	private readonly schedule?: Schedule;

	constructor(
		private readonly line: IncidentLine,
		private readonly floorMw: number,
		seed: Seed
	) {
		this.powerMw = line.re * line.re + line.im * line.im;
		const t = line.timing;
		if (t && (t.gate || t.hop || t.pulse)) this.schedule = new Schedule(t, seed);
	}

	addTo(row: RowContext, frame: Frame, re: Float64Array, im: Float64Array): void {
		if (!this.schedule) {
			this.addStretch(passing(this.line, frame, row.clockS), -Infinity, Infinity, frame, re, im);
			return;
		}
		const margin = 2 / frame.rbwHz;
		const fromS = row.clockS - frame.lead * frame.stepS - margin;
		const toS = row.clockS + (frame.total - frame.lead) * frame.stepS + margin;
		for (const s of this.schedule.stretches(fromS, toS))
			this.addStretch(
				passing(this.line, frame, row.clockS, s.channelHz),
				s.startS - row.clockS,
				s.stopS - row.clockS,
				frame,
				re,
				im
			);
	}

	private addStretch(
		line: PassingLine,
		startS: number,
		stopS: number,
		frame: Frame,
		re: Float64Array,
		im: Float64Array
	) {
		const reach =
			reachHz(frame, this.powerMw, this.floorMw, line.passingHzPerS) + spreadHz(startS, stopS, frame);
		if (reach === 0) return;
		const { from, to } = reachIndexes(frame, line.offsetHz, line.passingHzPerS, reach);
		if (to <= from) return;
		if (startS === -Infinity && stopS === Infinity) addLine(frame, line, from, to, re, im);
		else addBurst(frame, line, startS, stopS, from, to, re, im);
	}
}

/** An edge spreads a line's spectrum far past the filter's reach: a burst is followed over the whole sweep if it is short. */
function spreadHz(startS: number, stopS: number, frame: Frame): number {
	if (startS === -Infinity && stopS === Infinity) return 0;
	return 1000 * frame.rbwHz + 20 / (stopS - startS);
}
