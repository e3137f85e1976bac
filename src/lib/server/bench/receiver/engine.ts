/** Chooses how a sweep's rows are made: sample by sample, from the laws of long buckets, or by chunks through a narrow video filter. */
import { ChunkSweep } from './chunk-sweep';
import type { Contribution, RowContext } from './contribution';
import { EnvelopeContribution } from './envelope-contribution';
import { bucketSeconds, makeFrame, samplesPerBucket, tunedHz, type Frame } from './frame';
import type { Incident } from './incident';
import { LineContribution } from './line-contribution';
import { LongSweep } from './long-sweep';
import { MovingLine } from './moving-line';
import { RunIn, runInFrame } from './run-in';
import { SteadyNoise, TimedNoise } from './noise-contribution';
import type { Seed } from './random';
import { SampledSweep } from './sampled-sweep';
import { SETTLED, SettledVideoSweep } from './settled-video-sweep';
import { SkirtContribution } from './skirt-contribution';
import { skirtShows } from './skirt-shows';
import type { SweptSettings } from './swept-settings';
import { videoKind } from './video';

/** Buckets longer than this (in 1/B) follow the laws. */
const LONG_BUCKET = 4;
/** Rows that carry a modulated envelope are sampled up to this many samples. */
const MOST_ENVELOPE_SAMPLES = 30_000;

export interface Engine {
	/** One value per point on the scale. */
	row(context: RowContext, out: Float64Array): void;
}

export function makeEngine(
	incident: Incident,
	settings: SweptSettings,
	frequencyError: number,
	seed: Seed
): Engine {
	const { rbwHz, vbwHz, detector, scale, points } = settings;
	const bucketS = bucketSeconds(settings);
	const bt = rbwHz * bucketS;
	const peaks = detector !== 'average' && detector !== 'sample';
	const perBucket = samplesPerBucket(rbwHz, bucketS, peaks);
	const needsWaveform =
		incident.envelopes.some((e) => e.emitter.kind === 'digital' || e.emitter.kind === 'msk') &&
		perBucket * points <= MOST_ENVELOPE_SAMPLES;
	if (bt <= LONG_BUCKET || needsWaveform) {
		const frame = makeFrame(settings, frequencyError, perBucket);
		const before = runInFrame(frame);
		const runIn =
			videoKind(vbwHz, rbwHz) === 'wide'
				? undefined
				: new RunIn(before, scale, contributions(incident, before, seed));
		return new SampledSweep(frame, detector, scale, contributions(incident, frame, seed), runIn);
	}
	const frame = makeFrame(settings, frequencyError, 2);
	const averagesAnyway = detector === 'average' && vbwHz * bucketS >= 4;
	if (videoKind(vbwHz, rbwHz) === 'narrow' && !averagesAnyway)
		return vbwHz * bucketS >= SETTLED
			? new SettledVideoSweep(frame, detector, scale, incident, seed)
			: new ChunkSweep(frame, detector, scale, incident, seed);
	return new LongSweep(frame, detector, scale, incident, seed);
}

function contributions(incident: Incident, frame: Frame, seed: Seed): Contribution[] {
	const noises = incident.noises.map((noise, i) =>
		noise.timing
			? new TimedNoise(noise, frame, seed, `noise/${i}`)
			: new SteadyNoise(noise, frame, `noise/${i}`)
	);
	const floorMw = leastVariance(incident, frame);
	return [
		...noises,
		...incident.lines.map((line) => new LineContribution(line, floorMw, seed)),
		...incident.lines.flatMap((line, i) =>
			line.skirt && !line.timing && skirtShows(line, line.skirt, incident.lines, frame, floorMw)
				? [new SkirtContribution(line, line.skirt, frame, `skirt/${i}`)]
				: []
		),
		...incident.envelopes.map((envelope) =>
			envelope.emitter.kind === 'digital' || envelope.emitter.kind === 'msk'
				? new EnvelopeContribution(envelope, frame, seed)
				: new MovingLine(envelope, frame, seed)
		)
	];
}

/** Smallest steady noise power of the sweep, mW: what a line must stand out from. */
function leastVariance(incident: Incident, frame: Frame): number {
	const steady = incident.noises.filter((n) => !n.timing);
	let least = Infinity;
	const step = Math.max(1, Math.floor(frame.total / 64));
	for (let i = 0; i < frame.total; i += step)
		least = Math.min(
			least,
			steady.reduce((sum, n) => sum + n.variance(tunedHz(frame, i)), 0)
		);
	return least;
}
