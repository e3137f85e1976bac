/** Modulated signals in long buckets: slow modulations as lines that move, waveforms as pools of what the filter shows of them. */
import { EnvelopePool } from './envelope-pool';
import type { Frame } from './frame';
import type { IncidentEnvelope } from './incident';
import { MovingLine } from './moving-line';
import type { Random, Seed } from './random';

const isWaveform = ({ emitter }: IncidentEnvelope): boolean =>
	emitter.kind === 'digital' || emitter.kind === 'msk';

export class ModulatedSources {
	private readonly movers: MovingLine[];
	private readonly pools: EnvelopePool[];

	constructor(
		private readonly frame: Frame,
		envelopes: IncidentEnvelope[],
		seed: Seed
	) {
		this.movers = envelopes.filter((e) => !isWaveform(e)).map((e) => new MovingLine(e, frame, seed));
		this.pools = envelopes.filter(isWaveform).map((e) => new EnvelopePool(e, frame, seed));
	}

	start(clockS: number): void {
		for (const source of [...this.movers, ...this.pools]) source.start(clockS);
	}

	/** Whether anything of them can be met between two instants of the row. */
	within(fromS: number, toS: number): boolean {
		const { frame, movers, pools } = this;
		if (movers.length === 0 && pools.length === 0) return false;
		const at = [fromS, (fromS + toS) / 2, toS].map((t) => frame.startHz + frame.sweepHzPerS * t);
		return [...movers, ...pools].some((source) => at.some((f) => source.reaches(f)));
	}

	/** Adds their answer t seconds into the row to out[0], out[1]; waveforms at a random instant near it, with a phase of their own. */
	addAt(t: number, out: Float64Array, random: Random): void {
		for (const mover of this.movers) mover.addAt(t, out);
		for (const pool of this.pools) addPower(pool.power(t, random), out, random);
	}

	/** Whether there are waveforms, whose extremes over a bucket are drawn as such. */
	get hasWaveforms(): boolean {
		return this.pools.length > 0;
	}

	/** The same at the instant of a stretch of lengthS when the waveforms are strongest (or weakest). */
	addExtremeAt(t: number, lengthS: number, greatest: boolean, out: Float64Array, random: Random): void {
		for (const mover of this.movers) mover.addAt(t, out);
		for (const pool of this.pools) addPower(pool.extreme(t, lengthS, greatest, random), out, random);
	}

	/** The same with waveforms at a middling power: where buckets meet, no extreme is to be found that the buckets don't draw. */
	addTypicalAt(t: number, out: Float64Array, random: Random): void {
		for (const mover of this.movers) mover.addAt(t, out);
		for (const pool of this.pools) addPower(pool.typical(t), out, random);
	}
}

function addPower(power: number, out: Float64Array, random: Random): void {
	if (power === 0) return;
	const phase = 2 * Math.PI * random.uniform();
	out[0] += Math.sqrt(power) * Math.cos(phase);
	out[1] += Math.sqrt(power) * Math.sin(phase);
}
