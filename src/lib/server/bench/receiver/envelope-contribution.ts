/** A modulated signal that the filter is wide enough to follow: its waveform, mixed by the chirp, through the filter's impulse response. */
import { reachIndexes, turns, type Contribution, type RowContext } from './contribution';
import type { Frame } from './frame';
import { CUT_RBW, GaussianFir } from './gaussian-fir';
import type { IncidentEnvelope } from './incident';
import type { Seed } from './random';
import { Schedule } from './schedule';
import { SymbolHash } from './symbol-hash';
import { digitalWaveform, mskWaveform, type Waveform } from './waveform';

export class EnvelopeContribution implements Contribution {
	private readonly waveform: Waveform;
	private readonly schedule?: Schedule;
	/** Fine steps to a lattice step, so that the waveform and the filter's reach beside it fit without folding. */
	private readonly fine: number;
	private readonly fir: GaussianFir;
	private x = new Float64Array(0);
	private y = new Float64Array(0);

	constructor(
		private readonly envelope: IncidentEnvelope,
		frame: Frame,
		seed: Seed
	) {
		const hash = new SymbolHash(seed, envelope.index);
		const { emitter, timing } = envelope;
		if (emitter.kind === 'digital') this.waveform = digitalWaveform(emitter, hash);
		else if (emitter.kind === 'msk') this.waveform = mskWaveform(emitter, hash);
		else throw new RangeError(`no waveform is made symbol by symbol for ${emitter.kind}`);
		if (timing && (timing.gate || timing.hop)) this.schedule = new Schedule(timing, seed);
		this.fine = Math.max(1, Math.ceil(frame.stepS * (2 * this.waveform.halfWidthHz + 5 * frame.rbwHz)));
		const stepS = frame.stepS / this.fine;
		this.fir = new GaussianFir(frame.rbwHz, frame.c, stepS, this.fine);
	}

	addTo(row: RowContext, frame: Frame, re: Float64Array, im: Float64Array): void {
		const margin = 2 / frame.rbwHz;
		const fromS = row.clockS - frame.lead * frame.stepS - margin;
		const toS = row.clockS + (frame.total - frame.lead) * frame.stepS + margin;
		const stretches = this.schedule?.stretches(fromS, toS) ?? [{ startS: -Infinity, stopS: Infinity }];
		for (const s of stretches) this.addStretch(row, frame, s.startS, s.stopS, s.channelHz, re, im);
	}

	/** Through the filter from bench time startS to stopS, on one channel. */
	private addStretch(
		row: RowContext,
		frame: Frame,
		startS: number,
		stopS: number,
		channelHz: number | undefined,
		re: Float64Array,
		im: Float64Array
	): void {
		const drift = this.envelope.timing?.driftHzPerS ?? 0;
		const offset0 = (channelHz ?? this.envelope.frequencyHz) - frame.startHz;
		const offsetHz = offset0 + drift * row.clockS;
		const rate = frame.sweepHzPerS - drift;
		const reach = reachIndexes(frame, offsetHz, rate, this.waveform.halfWidthHz + 2.5 * frame.rbwHz);
		const runIn = CUT_RBW / frame.rbwHz;
		const at = (s: number): number => Math.round((s - row.clockS) / frame.stepS) + frame.lead;
		const from = Math.max(reach.from, startS === -Infinity ? 0 : at(startS - runIn));
		const to = Math.min(reach.to, stopS === Infinity ? frame.total : at(stopS + runIn) + 1);
		if (to <= from) return;
		const count = (to - from - 1) * this.fine + 1 + 2 * this.fir.half;
		if (this.x.length < count) {
			this.x = new Float64Array(count);
			this.y = new Float64Array(count);
		}
		const stepS = frame.stepS / this.fine;
		const firstS = (from - frame.lead) * frame.stepS - this.fir.half * stepS;
		this.waveform.fill(row.clockS + firstS, stepS, count, this.x, this.y);
		if (startS !== -Infinity || stopS !== Infinity)
			for (let i = 0; i < count; i++) {
				const t = row.clockS + firstS + i * stepS;
				if (t < startS || t >= stopS) this.x[i] = this.y[i] = 0;
			}
		const phase = turns(offset0 * row.clockS) + turns(0.5 * drift * row.clockS * row.clockS);
		mix(this.x, this.y, count, offsetHz, rate, firstS, stepS, phase);
		this.fir.addTo(from, to, this.x, this.y, this.envelope.re, this.envelope.im, re, im);
	}
}

/** Multiplies by e^{j(phase + 2π(offset·t − rate·t²/2))}: the oscillator's chirp, by recurrence, restarted every 1024 samples. */
function mix(
	x: Float64Array,
	y: Float64Array,
	count: number,
	offsetHz: number,
	rateHzPerS: number,
	firstS: number,
	stepS: number,
	phaseRad: number
): void {
	for (let start = 0; start < count; start += 1024) {
		const t = firstS + start * stepS;
		const psi = phaseRad + turns(offsetHz * t) - Math.PI * rateHzPerS * t * t;
		const turn = 2 * Math.PI * ((offsetHz - rateHzPerS * t) * stepS - 0.5 * rateHzPerS * stepS * stepS);
		const bend = -2 * Math.PI * rateHzPerS * stepS * stepS;
		let zx = Math.cos(psi);
		let zy = Math.sin(psi);
		let sx = Math.cos(turn);
		let sy = Math.sin(turn);
		const bx = Math.cos(bend);
		const by = Math.sin(bend);
		const end = Math.min(count, start + 1024);
		for (let i = start; i < end; i++) {
			const a = x[i];
			const b = y[i];
			x[i] = a * zx - b * zy;
			y[i] = a * zy + b * zx;
			const nx = zx * sx - zy * sy;
			zy = zx * sy + zy * sx;
			zx = nx;
			const ns = sx * bx - sy * by;
			sy = sx * by + sy * bx;
			sx = ns;
		}
	}
}
