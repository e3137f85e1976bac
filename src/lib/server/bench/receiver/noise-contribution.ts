/** The Gaussian part of what reaches the filter: floor, densities, skirts beyond the filter. */
import type { Contribution, RowContext } from './contribution';
import { tunedHz, type Frame } from './frame';
import { GaussianProcess } from './gaussian-process';
import type { IncidentNoise } from './incident';
import type { Seed } from './random';
import { Schedule } from './schedule';

/** A process that is always on: its amplitude over the sweep never changes, so it is made once. */
export class SteadyNoise implements Contribution {
	private readonly process: GaussianProcess;
	private readonly amplitude: Float64Array;

	constructor(
		noise: IncidentNoise,
		frame: Frame,
		private readonly stream: string
	) {
		this.process = new GaussianProcess(noise.ownWidthHz ?? frame.rbwHz, frame.stepS, frame.total);
		this.amplitude = steadyAmplitudes(noise, frame);
	}

	addTo(row: RowContext, _frame: Frame, re: Float64Array, im: Float64Array): void {
		this.process.addTo(row.random(this.stream), this.amplitude, re, im);
	}
}

/** A process that comes and goes or hops: the filter smooths its edges, so its power follows the step answer of |h|². */
export class TimedNoise implements Contribution {
	private readonly process: GaussianProcess;
	private readonly schedule: Schedule;
	private readonly amplitude: Float64Array;
	private readonly perChannel = new Map<number, Float64Array>();

	constructor(
		private readonly noise: IncidentNoise,
		frame: Frame,
		seed: Seed,
		private readonly stream: string
	) {
		this.process = new GaussianProcess(noise.ownWidthHz ?? frame.rbwHz, frame.stepS, frame.total);
		this.schedule = new Schedule(noise.timing!, seed);
		this.amplitude = new Float64Array(frame.total);
	}

	addTo(row: RowContext, frame: Frame, re: Float64Array, im: Float64Array): void {
		const { stepS, lead, total } = frame;
		const from = -lead * stepS;
		const edgeS = 2 / frame.rbwHz;
		this.amplitude.fill(0);
		const driftHz = (this.noise.timing!.driftHzPerS ?? 0) * row.clockS;
		const on = this.schedule.stretches(
			row.clockS + from - edgeS,
			row.clockS + (total - lead) * stepS + edgeS
		);
		for (const stretch of on) {
			const steady = this.channelAmplitude(frame, (stretch.channelHz ?? this.noise.centreHz ?? 0) + driftHz);
			const a = stretch.startS - row.clockS;
			const b = stretch.stopS - row.clockS;
			const first = Math.max(0, Math.ceil((a - edgeS) / stepS) + lead);
			const last = Math.min(total, Math.floor((b + edgeS) / stepS) + lead + 1);
			for (let i = first; i < last; i++) {
				const t = (i - lead) * stepS;
				const share = stepShare((t - a) * frame.rbwHz) - stepShare((t - b) * frame.rbwHz);
				this.amplitude[i] = Math.hypot(this.amplitude[i], steady[i] * Math.sqrt(Math.max(0, share)));
			}
		}
		this.process.addTo(row.random(this.stream), this.amplitude, re, im);
	}

	private channelAmplitude(frame: Frame, channelHz: number): Float64Array {
		let found = this.perChannel.get(channelHz);
		if (!found) {
			if (this.perChannel.size > 300) this.perChannel.clear(); // a drifting density never repeats
			found = amplitudes(this.noise, frame, channelHz - (this.noise.centreHz ?? channelHz));
			this.perChannel.set(channelHz, found);
		}
		return found;
	}
}

const steady = new WeakMap<IncidentNoise, Map<string, Float64Array>>();

/** Amplitudes of a process over a frame's lattice, made once: sweeps that detect it in other ways share them. */
function steadyAmplitudes(noise: IncidentNoise, frame: Frame): Float64Array {
	const known = steady.get(noise) ?? new Map<string, Float64Array>();
	steady.set(noise, known);
	const key = `${frame.startHz} ${frame.sweepHzPerS} ${frame.stepS} ${frame.lead} ${frame.total}`;
	const made = known.get(key) ?? amplitudes(noise, frame);
	known.set(key, made);
	return made;
}

function amplitudes(noise: IncidentNoise, frame: Frame, shiftHz = 0): Float64Array {
	const list = new Float64Array(frame.total);
	for (let i = 0; i < list.length; i++)
		list[i] = Math.sqrt(Math.max(0, noise.variance(tunedHz(frame, i) - shiftHz)) / 2);
	return list;
}

/**
 * Share of |h|² gathered by time x (in 1/B) after an edge: ½(1 + erf(√2·π·x/√(2 ln 2))), by a logistic fit of the normal law
 * good to 2·10⁻⁴ (Bowling et al., J. Ind. Eng. Manag. 2, 114, 2009).
 */
function stepShare(x: number): number {
	if (x === Infinity) return 1;
	const u = (x * 2 * Math.PI) / Math.sqrt(2 * Math.LN2);
	return 1 / (1 + Math.exp(-(0.07056 * u * u * u + 1.5976 * u)));
}
