/** What stands at the filter during each long bucket of a row: steady noise and lines, and whatever is on for part of it. */
import type { Scale } from '$lib/schemas/settings';
import { addBurst, EDGE_RBW } from './burst-response';
import type { RowContext } from './contribution';
import type { Frame } from './frame';
import type { Incident, IncidentLine } from './incident';
import { InnerSkirts } from './inner-skirts';
import { passing, reachHz } from './line-contribution';
import { addLineAt, type PassingLine } from './line-response';
import type { Piece, Window } from './long-bucket';
import { ModulatedSources } from './modulated-sources';
import type { Random, Seed } from './random';
import type { EdgeConditions } from './shared-edges';
import { SteadyNoiseTable } from './steady-noise-table';
import { TimedSources, touching, type Burst } from './timed-sources';
import { WindowSampler, type WindowBurst } from './window-sampler';
import { shifted } from './shifted-line';

/** Windows followed in one bucket at most; the rest are taken to be like them. */
const MOST_WINDOWS = 6;
/** Amplitude of an edge's splatter at δ from its line, times δ/B: the tail of the error function, 1/(2√(2π·ln 2)). */
const SPLATTER = 0.24;
/** Instants at which beating lines are looked at in one bucket. */
const BEAT_NODES = 24;

export class LongBucketConditions {
	private readonly noise: SteadyNoiseTable;
	private readonly steady: IncidentLine[];
	private readonly timed: TimedSources;
	private readonly sampler: WindowSampler;
	private readonly modulated: ModulatedSources;
	private passing: { line: PassingLine; fromS: number; toS: number }[] = [];
	private burstCursor = { at: 0 };
	private stretchCursor = { at: 0 };
	private instantCursor = { at: 0 };
	private readonly out = new Float64Array(2);
	private readonly y = new Float64Array(1);
	private readonly x = new Float64Array(1);

	constructor(
		private readonly frame: Frame,
		incident: Incident,
		scale: Scale,
		seed: Seed,
		/** Whether the edges of long bursts are followed: they matter to peaks, and vanish in averages. */
		private readonly followsEdges: boolean
	) {
		const comesAndGoes = (t: IncidentLine['timing']): boolean => !!t && !!(t.gate || t.hop || t.pulse);
		this.steady = incident.lines.filter((l) => !comesAndGoes(l.timing));
		const inner = new InnerSkirts(
			frame,
			this.steady.filter((l) => !l.timing)
		);
		this.noise = new SteadyNoiseTable(frame, [
			...incident.noises.filter((n) => !n.timing),
			{ variance: (tunedHz) => inner.at(tunedHz) }
		]);
		this.modulated = new ModulatedSources(frame, incident.envelopes, seed);
		this.timed = new TimedSources(
			frame,
			incident.lines.filter((l) => comesAndGoes(l.timing)),
			incident.noises.filter((n) => n.timing),
			seed
		);
		this.sampler = new WindowSampler(frame, scale);
	}

	start(row: RowContext): void {
		const { frame, noise } = this;
		this.passing = this.steady.map((incident) => {
			const line = passing(incident, frame, row.clockS);
			const reach = reachHz(frame, line.re * line.re + line.im * line.im, noise.least, line.passingHzPerS);
			const rate = line.passingHzPerS;
			if (rate === 0) {
				const within = Math.abs(line.offsetHz) <= reach;
				return { line, fromS: within ? -Infinity : Infinity, toS: within ? Infinity : -Infinity };
			}
			const a = (line.offsetHz - reach) / rate;
			const b = (line.offsetHz + reach) / rate;
			return { line, fromS: Math.min(a, b), toS: Math.max(a, b) };
		});
		this.timed.start(row);
		this.modulated.start(row.clockS);
		this.burstCursor = { at: 0 };
		this.stretchCursor = { at: 0 };
		this.instantCursor = { at: 0 };
	}

	/** Pieces and windows of bucket b; asked in rising order. */
	bucket(b: number, random: Random): { pieces: Piece[]; windows: Window[] } {
		const { frame } = this;
		const fromS = b * frame.bucketS;
		const toS = fromS + frame.bucketS;
		const lines = this.passing.filter((p) => p.fromS < toS && p.toS > fromS).map((p) => p.line);
		const margin = EDGE_RBW / frame.rbwHz;
		const middleS = (fromS + toS) / 2;
		const bursts = touching(this.timed.bursts, this.burstCursor, fromS - margin, toS + margin).filter((q) =>
			this.shows(q, middleS)
		);
		const stretches = touching(this.timed.stretches, this.stretchCursor, fromS, toS);
		const modulated = this.modulated.within(fromS, toS);
		if (lines.length === 0 && bursts.length === 0 && stretches.length === 0 && !modulated)
			return { pieces: this.noise.pieces(b), windows: [] };
		const windows = this.windows(b, bursts, random);
		const rest = Math.max(0, 1 - windows.reduce((sum, w) => sum + w.share, 0));
		const long = bursts.filter((q) => !this.isShort(q));
		if (lines.length === 0 && long.length === 0 && stretches.length === 0 && !modulated) {
			const pieces = this.noise.pieces(b);
			for (const piece of pieces) piece.share *= rest;
			return { pieces, windows };
		}
		const beating = lines.length + long.length + (modulated ? 2 : 0);
		const times = this.nodes(fromS, toS, beating, [...long, ...stretches], random);
		const { out } = this;
		const fixed = (t: number): number => {
			out.fill(0);
			for (const line of lines) addLineAt(frame, line, t, out);
			for (const burst of long)
				if (t >= burst.startS && t < burst.stopS) addLineAt(frame, burst.line, t, out);
			let v = this.noise.at(t);
			for (const s of stretches)
				if (t >= s.startS && t < s.stopS) v += s.variance(frame.startHz + frame.sweepHzPerS * t);
			return v;
		};
		if (modulated && this.followsEdges && this.modulated.hasWaveforms)
			return { pieces: this.extremePieces(times, rest, fixed, random), windows };
		const pieces = times.map(({ t, share }) => {
			const v = fixed(t);
			if (modulated) this.modulated.addAt(t, out, random);
			return { share: share * rest, v, p: out[0] * out[0] + out[1] * out[1] };
		});
		return { pieces, windows };
	}

	/** A bucket full of waveforms, for a peak detector: one piece at their strongest, one at their weakest. */
	private extremePieces(
		times: { t: number }[],
		rest: number,
		fixed: (t: number) => number,
		random: Random
	): Piece[] {
		const { out } = this;
		return [true, false].map((greatest) => {
			const { t } = times[Math.floor(random.uniform() * times.length)];
			const v = fixed(t);
			this.modulated.addExtremeAt(t, this.frame.bucketS, greatest, out, random);
			return { share: rest / 2, v, p: out[0] * out[0] + out[1] * out[1] };
		});
	}

	/** Whether a burst, or the splatter of its edges (0.24·B/δ of its amplitude at δ from it), stands out of the noise. */
	private shows({ line }: Burst, t: number): boolean {
		const { frame } = this;
		const across = Math.abs(line.passingHzPerS) * frame.bucketS;
		const away = Math.max(0, Math.abs(line.offsetHz - line.passingHzPerS * t) - across / 2);
		const power = line.re * line.re + line.im * line.im;
		if (away <= reachHz(frame, power, this.noise.least, line.passingHzPerS)) return true;
		return this.followsEdges && power * ((SPLATTER * frame.rbwHz) / away) ** 2 > 0.05 * this.noise.least;
	}

	private isShort(burst: Burst): boolean {
		return burst.stopS - burst.startS < (2 * EDGE_RBW) / this.frame.rbwHz;
	}

	/** Instants that stand for the bucket: every interval between edges has at least one; beating lines and wide buckets need more. */
	private nodes(
		fromS: number,
		toS: number,
		lines: number,
		gates: { startS: number; stopS: number }[],
		random: Random
	): { t: number; share: number }[] {
		const edges = gates.flatMap((g) => [g.startS, g.stopS]).filter((t) => t > fromS && t < toS);
		const bounds = [fromS, ...edges.sort((a, b) => a - b), toS];
		const span = toS - fromS;
		const across = (8 * Math.abs(this.frame.sweepHzPerS) * span) / this.frame.rbwHz;
		const wanted = Math.min(
			32,
			Math.max(
				lines > 1 ? Math.min(BEAT_NODES, Math.max(4, Math.ceil(span * this.frame.rbwHz))) : 1,
				Math.ceil(across)
			)
		);
		const list: { t: number; share: number }[] = [];
		for (let i = 1; i < bounds.length; i++) {
			const length = bounds[i] - bounds[i - 1];
			if (length <= 0) continue;
			const count = Math.max(1, Math.round((wanted * length) / span));
			for (let j = 0; j < count; j++) {
				const jitter = lines > 1 ? random.uniform() : 0.5;
				list.push({ t: bounds[i - 1] + ((j + jitter) * length) / count, share: length / count / span });
			}
		}
		return list;
	}

	/** Short bursts whole, and the edges of long ones, each over the time either side in which the filter answers. */
	private windows(b: number, bursts: Burst[], random: Random): Window[] {
		const { frame, sampler } = this;
		const fromS = b * frame.bucketS;
		const toS = fromS + frame.bucketS;
		const half = EDGE_RBW / frame.rbwHz;
		const spans: { startS: number; stopS: number }[] = [];
		for (const burst of bursts) {
			const middle = (burst.startS + burst.stopS) / 2;
			if (this.isShort(burst)) {
				if (middle >= fromS && middle < toS)
					spans.push({ startS: burst.startS - half, stopS: burst.stopS + half });
			} else if (this.followsEdges)
				for (const edge of [burst.startS, burst.stopS])
					if (edge >= fromS && edge < toS) spans.push({ startS: edge - half, stopS: edge + half });
		}
		if (spans.length === 0) return [];
		spans.sort((a, b) => a.startS - b.startS);
		// neighbours closer than their reach share the time between them
		for (let i = 1; i < spans.length; i++)
			if (spans[i].startS < spans[i - 1].stopS) {
				const between = (spans[i].startS + spans[i - 1].stopS) / 2;
				spans[i].startS = spans[i - 1].stopS = between;
			}
		const step = Math.max(1, spans.length / MOST_WINDOWS);
		const chosen = Array.from(
			{ length: Math.min(spans.length, MOST_WINDOWS) },
			(_, i) => spans[Math.floor(i * step)]
		);
		const all = spans.reduce((sum, s) => sum + s.stopS - s.startS, 0);
		const taken = chosen.reduce((sum, s) => sum + s.stopS - s.startS, 0);
		const scale = Math.min(all, frame.bucketS) / taken / frame.bucketS;
		return chosen.map(({ startS, stopS }) => {
			const length = Math.min(stopS - startS, sampler.longestS);
			const v = this.noise.at((startS + stopS) / 2);
			const got = sampler.sample(length, v, this.local(bursts, startS, startS + length), random);
			return { ...got, share: (stopS - startS) * scale };
		});
	}

	/** Everything that is on between two instants, seen from the first. */
	private local(bursts: Burst[], startS: number, stopS: number): WindowBurst[] {
		const half = EDGE_RBW / this.frame.rbwHz;
		const list: WindowBurst[] = [];
		for (const q of bursts)
			if (q.stopS > startS - half && q.startS < stopS + half)
				list.push({ line: shifted(q.line, startS), startS: q.startS - startS, stopS: q.stopS - startS });
		for (const p of this.passing)
			if (p.fromS < stopS && p.toS > startS)
				list.push({ line: shifted(p.line, startS), startS: -Infinity, stopS: Infinity });
		return list;
	}

	/** The filtered video t seconds into the sweep, its filter run in over `runInS`. Asked in rising order of t. */
	filteredInstant(t: number, runInS: number, random: Random): number {
		const half = EDGE_RBW / this.frame.rbwHz;
		const startS = t - Math.min(runInS + half, this.sampler.longestS);
		const bursts = touching(this.timed.bursts, this.instantCursor, startS - half, t + half);
		const seen = this.local(bursts, startS, t);
		if (this.modulated.within(startS, t)) seen.push(this.standing(t, random));
		return this.sampler.last(t - startS, this.noise.at(t), seen, random);
	}

	/** What modulated signals show t seconds into the sweep, as a line that stands in the filter while the video settles. */
	private standing(t: number, random: Random): WindowBurst {
		const { out } = this;
		out.fill(0);
		this.modulated.addAt(t, out, random);
		const line = { re: out[0], im: out[1], offsetHz: 0, passingHzPerS: 0 };
		return { line, startS: -Infinity, stopS: Infinity };
	}

	/** Conditions at the edge before bucket b. */
	edge(b: number, random: Random): EdgeConditions {
		return this.conditionsAt(b * this.frame.bucketS, random, false);
	}

	/** The filter's answer t seconds into the sweep: amplitude of all lines, and the noise beside them. Asked in rising order of t. */
	instant(t: number, random: Random): EdgeConditions {
		return this.conditionsAt(t, random, true);
	}

	private conditionsAt(t: number, random: Random, drawsWaveforms: boolean): EdgeConditions {
		const { frame, out } = this;
		out.fill(0);
		for (const p of this.passing) if (p.fromS <= t && p.toS >= t) addLineAt(frame, p.line, t, out);
		const half = EDGE_RBW / frame.rbwHz;
		for (const burst of touching(this.timed.bursts, this.instantCursor, t - half, t + half)) {
			this.x[0] = this.y[0] = 0;
			const local = { ...frame, lead: 0, total: 1, stepS: 1 / frame.rbwHz };
			addBurst(local, shifted(burst.line, t), burst.startS - t, burst.stopS - t, 0, 1, this.x, this.y);
			out[0] += this.x[0];
			out[1] += this.y[0];
		}
		if (drawsWaveforms) this.modulated.addAt(t, out, random);
		else this.modulated.addTypicalAt(t, out, random);
		let v = this.noise.at(t);
		for (const s of this.timed.stretches)
			if (t >= s.startS && t < s.stopS) v += s.variance(frame.startHz + frame.sweepHzPerS * t);
		return { v, re: out[0], im: out[1] };
	}
}
