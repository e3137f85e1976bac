/** A carrier whose modulation is slow against the filter: a line that moves (FM, PM) or breathes (AM) as the filter watches. */
import { turns, type Contribution, type RowContext } from './contribution';
import type { Frame } from './frame';
import { emitterPhases } from './front-end/arrival';
import type { IncidentEnvelope } from './incident';
import type { Seed } from './random';
import { Schedule, type OnStretch } from './schedule';

const ALWAYS: OnStretch[] = [{ startS: -Infinity, stopS: Infinity }];
/** Beyond this many resolution bandwidths the filter sees nothing of it. */
const REACH_RBW = 6;

export class MovingLine implements Contribution {
	private readonly modulationRad: number;
	private readonly schedule?: Schedule;
	private stretches: OnStretch[] = ALWAYS;
	private clockS = 0;

	constructor(
		private readonly envelope: IncidentEnvelope,
		private readonly frame: Frame,
		seed: Seed
	) {
		this.modulationRad = emitterPhases(seed, envelope.index).modulationRad;
		const t = envelope.timing;
		if (t && (t.gate || t.hop)) this.schedule = new Schedule(t, seed);
	}

	/** Farthest it strays from its carrier, Hz. */
	get strayHz(): number {
		const e = this.envelope.emitter;
		if (e.kind === 'fm') return e.deviationHz;
		return e.kind === 'pm' ? e.deviationRad * e.modulatingHz : 0;
	}

	/** Prepares a row that starts at the bench clock. */
	start(clockS: number): void {
		this.clockS = clockS;
		if (!this.schedule) return;
		const { frame } = this;
		this.stretches = this.schedule.stretches(
			clockS - frame.lead * frame.stepS,
			clockS + frame.points * frame.bucketS
		);
	}

	/** Whether it can reach the filter while that is tuned to this frequency, Hz. */
	reaches(tunedHz: number): boolean {
		const drift = (this.envelope.timing?.driftHzPerS ?? 0) * this.clockS;
		const reach = this.strayHz + REACH_RBW * this.frame.rbwHz;
		if (this.envelope.timing?.hop) return true;
		return Math.abs(this.envelope.frequencyHz + drift - tunedHz) < reach;
	}

	/** Adds its answer t seconds into the row to out[0], out[1]: the line's own answer at its momentary frequency and rate. */
	addAt(t: number, out: Float64Array): void {
		const { envelope, frame } = this;
		const at = this.clockS + t;
		const on = this.stretches.find((s) => at >= s.startS && at < s.stopS);
		if (!on) return;
		const e = envelope.emitter;
		if (e.kind === 'digital' || e.kind === 'msk') return;
		const theta = turns(e.modulatingHz * at) + this.modulationRad;
		const drift = envelope.timing?.driftHzPerS ?? 0;
		const carrierHz = (on.channelHz ?? envelope.frequencyHz) - frame.startHz;
		const w = 2 * Math.PI * e.modulatingHz;
		let strayHz = 0;
		let rate = drift;
		let phase = turns(carrierHz * at) + Math.PI * drift * at * at - Math.PI * frame.sweepHzPerS * t * t;
		let size = 1;
		if (e.kind === 'am') size = 1 + e.depth * Math.cos(theta);
		else if (e.kind === 'fm') {
			strayHz = e.deviationHz * Math.cos(theta);
			rate -= e.deviationHz * w * Math.sin(theta);
			phase += (e.deviationHz / e.modulatingHz) * Math.sin(theta);
		} else {
			strayHz = -e.deviationRad * e.modulatingHz * Math.sin(theta);
			rate -= e.deviationRad * e.modulatingHz * w * Math.cos(theta);
			phase += e.deviationRad * Math.cos(theta);
		}
		const delta = carrierHz + drift * at + strayHz - frame.sweepHzPerS * t;
		const k = (frame.c * (frame.sweepHzPerS - rate)) / Math.PI;
		const q = 1 + k * k;
		const decay = (frame.c * delta * delta) / q;
		if (decay > 40) return;
		size *= q ** -0.25 * Math.exp(-decay);
		phase += k * decay - 0.5 * Math.atan(k);
		const cos = size * Math.cos(phase);
		const sin = size * Math.sin(phase);
		out[0] += envelope.re * cos - envelope.im * sin;
		out[1] += envelope.re * sin + envelope.im * cos;
	}

	private readonly out = new Float64Array(2);

	addTo(row: RowContext, frame: Frame, re: Float64Array, im: Float64Array): void {
		this.start(row.clockS);
		for (let i = 0; i < frame.total; i++) {
			const t = (i - frame.lead) * frame.stepS;
			if (!this.reaches(frame.startHz + frame.sweepHzPerS * t)) continue;
			this.out[0] = this.out[1] = 0;
			this.addAt(t, this.out);
			re[i] += this.out[0];
			im[i] += this.out[1];
		}
	}
}
