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

/** Envelopes followed at each tuned frequency: more where only one is needed; samples to an envelope, and envelopes to a block. */
const FEW = 96;
const MANY = 800;
const PER_ENVELOPE = 12;
const BLOCK = 4;
const REACH_RBW = 2.5;
/** Stands for nothing at all, mW. */
const LEAST_MW = 1e-30;

/** Powers seen at one tuned offset, mW: at instants, and the extremes of blocks (rising). */
interface Seen {
	/** Of all instants, dB over 1 mW. */
	meanDb: number;
	instants: Float64Array;
	greatest: Float64Array;
	least: Float64Array;
}

export class EnvelopePool {
	private readonly seen: Seen[] = [];
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
		const rateHz =
			emitter.kind === 'digital' ? emitter.symbolRateHz : emitter.kind === 'msk' ? emitter.bitRateHz : 0;
		this.halfWidthHz = 1.5 * rateHz + REACH_RBW * frame.rbwHz;
		this.ratePerS = Math.min(frame.rbwHz, rateHz);
		if (timing && (timing.gate || timing.hop)) this.schedule = new Schedule(timing, seed);
		const standing = frame.sweepHzPerS === 0 && !timing?.hop;
		this.stepHz = standing ? Infinity : this.halfWidthHz / 12;
		this.firstHz = standing ? frame.startHz - envelope.frequencyHz : -this.halfWidthHz;
		const places = standing ? 1 : 25;
		for (let p = 0; p < places; p++)
			this.seen.push(this.follow(this.firstHz + (p ? p * this.stepHz : 0), standing ? MANY : FEW, seed));
	}

	/** The filtered envelope, tuned `offsetHz` from the carrier, followed for so many envelopes. */
	private follow(offsetHz: number, envelopes: number, seed: Seed): Seen {
		const total = envelopes * PER_ENVELOPE;
		const still: Frame = {
			...this.frame,
			startHz: this.envelope.frequencyHz + offsetHz,
			sweepHzPerS: 0,
			chirp: 0,
			// off the symbols' own beat: else every instant would fall at one of a few places in the symbol
			stepS: 1 / (this.ratePerS * (PER_ENVELOPE + 0.381966)),
			lead: 0,
			total
		};
		const plain = { ...this.envelope, timing: undefined };
		const re = new Float64Array(total);
		const im = new Float64Array(total);
		const row: RowContext = { clockS: 0, random: (stream) => new Random(seed, -1, stream) };
		new EnvelopeContribution(plain, still, seed).addTo(row, still, re, im);
		const instants = re.map((x, i) => x * x + im[i] * im[i]);
		const length = BLOCK * PER_ENVELOPE;
		const blocks = Array.from({ length: Math.floor(total / length) }, (_, b) =>
			instants.subarray(b * length, (b + 1) * length)
		);
		const extremes = (pick: (a: number, b: number) => number) =>
			Float64Array.from(blocks, (block) => block.reduce((a, b) => pick(a, b))).sort();
		const meanMw = instants.reduce((sum, power) => sum + power, 0) / total;
		return {
			meanDb: 10 * Math.log10(Math.max(LEAST_MW, meanMw)),
			instants,
			greatest: extremes(Math.max),
			least: extremes(Math.min)
		};
	}

	start(clockS: number): void {
		this.clockS = clockS;
		if (this.schedule)
			this.stretches = this.schedule.stretches(clockS, clockS + this.frame.points * this.frame.bucketS);
	}

	/** Whether the filter, tuned there, can see anything of it. */
	reaches(tunedHz: number): boolean {
		const { timing, frequencyHz } = this.envelope;
		if (timing?.hop) return true;
		const drift = (timing?.driftHzPerS ?? 0) * this.clockS;
		return Math.abs(tunedHz - frequencyHz - drift) < this.halfWidthHz;
	}

	/** Power at a random instant near t seconds into the row; 0 while it is off or out of reach. */
	power(t: number, random: Random): number {
		const place = this.placeAt(t);
		if (!place) return 0;
		const { instants } = place.seen;
		return place.gain * instants[Math.floor(random.uniform() * instants.length)];
	}

	/** The power it shows as often above as below, for places where an extreme must not be drawn twice. */
	typical(t: number): number {
		const place = this.placeAt(t);
		if (!place) return 0;
		const { greatest, least } = place.seen;
		return (
			place.gain * Math.sqrt(greatest[greatest.length >> 1] * Math.max(LEAST_MW, least[least.length >> 1]))
		);
	}

	/** Greatest (or least) power over a stretch of lengthS about t: of as many blocks as it holds. */
	extreme(t: number, lengthS: number, greatest: boolean, random: Random): number {
		const place = this.placeAt(t);
		if (!place) return 0;
		const share = random.open() ** (1 / Math.max(1, (lengthS * this.ratePerS) / BLOCK));
		const list = greatest ? place.seen.greatest : place.seen.least;
		const index = Math.floor((greatest ? share : 1 - share) * list.length);
		return place.gain * list[Math.min(list.length - 1, index)];
	}

	/** Where the filter is tuned t seconds into the row: the nearest place followed, and the gain from there to here. */
	private placeAt(t: number): { seen: Seen; gain: number } | undefined {
		const { envelope, frame, seen } = this;
		const at = this.clockS + t;
		const on = this.schedule ? this.stretches.find((s) => at >= s.startS && at < s.stopS) : undefined;
		if (this.schedule && !on) return undefined;
		const drift = (envelope.timing?.driftHzPerS ?? 0) * at;
		const offset = frame.startHz + frame.sweepHzPerS * t - (on?.channelHz ?? envelope.frequencyHz) - drift;
		if (this.stepHz === Infinity) return { seen: seen[0], gain: 1 };
		const position = (offset - this.firstHz) / this.stepHz;
		const place = Math.round(position);
		if (place < 0 || place >= seen.length) return undefined;
		return { seen: seen[place], gain: 10 ** (this.differenceDb(place, position - place) / 10) };
	}

	/** How the mean power changes from a place to `by` steps beside it, dB: a parabola through three places, which a Gaussian skirt is. */
	private differenceDb(place: number, by: number): number {
		const { seen } = this;
		const middle = Math.min(seen.length - 2, Math.max(1, place));
		const [below, here, above] = [-1, 0, 1].map((step) => seen[middle + step].meanDb);
		const slope = (above - below) / 2;
		const bend = (above - 2 * here + below) / 2;
		const at = (x: number): number => slope * x + bend * x * x;
		return at(place - middle + by) - at(place - middle);
	}
}
