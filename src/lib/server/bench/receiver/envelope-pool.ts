/**
 * A modulated waveform in buckets too long to follow: its filtered envelope is followed for a while at a few tuned frequencies,
 * once per set-up, and buckets draw from what was seen.
 */
import type { RowContext } from './contribution';
import { EnvelopeContribution } from './envelope-contribution';
import type { Frame } from './frame';
import type { IncidentEnvelope } from './incident';
import { Random, type Seed } from './random';
import { Schedule, type OnStretch } from './schedule';

/** Values followed at each tuned frequency: more where only one is needed. */
const FEW = 256;
const MANY = 8192;
const REACH_RBW = 2.5;

export class EnvelopePool {
	/** Power values seen at each tuned offset, rising; mW. */
	private readonly sorted: Float64Array[] = [];
	private readonly firstHz: number;
	private readonly stepHz: number;
	private readonly halfWidthHz: number;
	/** Independent envelopes a second. */
	private readonly ratePerS: number;
	private readonly schedule?: Schedule;
	private stretches: OnStretch[] = [];
	private clockS = 0;

	constructor(
		private readonly envelope: IncidentEnvelope,
		private readonly frame: Frame,
		seed: Seed
	) {
		const { emitter, timing } = envelope;
		const rateHz = emitter.kind === 'digital' ? emitter.symbolRateHz : emitter.kind === 'msk' ? emitter.bitRateHz : 0;
		this.halfWidthHz = 1.5 * rateHz + REACH_RBW * frame.rbwHz;
		this.ratePerS = 2 * Math.min(frame.rbwHz, rateHz);
		if (timing && (timing.gate || timing.hop)) this.schedule = new Schedule(timing, seed);
		const standing = frame.sweepHzPerS === 0 && !timing?.hop;
		this.stepHz = standing ? Infinity : this.halfWidthHz / 12;
		this.firstHz = standing ? frame.startHz - envelope.frequencyHz : -this.halfWidthHz;
		const places = standing ? 1 : 25;
		for (let p = 0; p < places; p++)
			this.sorted.push(this.follow(this.firstHz + (p ? p * this.stepHz : 0), standing ? MANY : FEW, seed));
	}

	/** Power of the filtered envelope at instants half an envelope apart, tuned `offsetHz` from the carrier. */
	private follow(offsetHz: number, count: number, seed: Seed): Float64Array {
		const still: Frame = {
			...this.frame,
			startHz: this.envelope.frequencyHz + offsetHz,
			sweepHzPerS: 0,
			chirp: 0,
			stepS: 1 / this.ratePerS,
			lead: 0,
			total: count
		};
		const plain = { ...this.envelope, timing: undefined };
		const re = new Float64Array(count);
		const im = new Float64Array(count);
		const row: RowContext = { clockS: 0, random: (stream) => new Random(seed, -1, stream) };
		new EnvelopeContribution(plain, still, seed).addTo(row, still, re, im);
		return re.map((x, i) => x * x + im[i] * im[i]).sort();
	}

	start(clockS: number): void {
		this.clockS = clockS;
		if (this.schedule)
			this.stretches = this.schedule.stretches(clockS, clockS + this.frame.points * this.frame.bucketS);
	}

	/** Power at a random instant near t seconds into the row; 0 while it is off or out of reach. */
	power(t: number, random: Random): number {
		const pool = this.poolAt(t);
		return pool ? pool[Math.floor(random.uniform() * pool.length)] : 0;
	}

	/** Greatest (or least) power over a stretch of lengthS about t. */
	extreme(t: number, lengthS: number, greatest: boolean, random: Random): number {
		const pool = this.poolAt(t);
		if (!pool) return 0;
		const share = random.open() ** (1 / Math.max(1, lengthS * this.ratePerS));
		const index = Math.floor((greatest ? share : 1 - share) * pool.length);
		return pool[Math.min(pool.length - 1, index)];
	}

	private poolAt(t: number): Float64Array | undefined {
		const { envelope, frame } = this;
		const at = this.clockS + t;
		const on = this.schedule ? this.stretches.find((s) => at >= s.startS && at < s.stopS) : undefined;
		if (this.schedule && !on) return undefined;
		const drift = (envelope.timing?.driftHzPerS ?? 0) * at;
		const offset = frame.startHz + frame.sweepHzPerS * t - (on?.channelHz ?? envelope.frequencyHz) - drift;
		if (this.stepHz === Infinity) return this.sorted[0];
		const place = Math.round((offset - this.firstHz) / this.stepHz);
		return place >= 0 && place < this.sorted.length ? this.sorted[place] : undefined;
	}
}
