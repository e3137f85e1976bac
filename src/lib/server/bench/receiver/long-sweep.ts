/**
 * A sweep whose buckets are long against 1/B: each is cut into pieces where nothing changes, drawn from the laws of extremes
 * and averages, and short windows (edges of bursts, the bucket's own shared edges) that are followed sample by sample.
 */
import type { Detector, Scale } from '$lib/schemas/settings';
import type { RowContext } from './contribution';
import { GreatestOfNoise } from './extreme-laws';
import type { Frame } from './frame';
import type { Incident } from './incident';
import { LongBucketConditions } from './long-conditions';
import { averageOf, peakOf } from './long-bucket';
import type { Random, Seed } from './random';
import { SharedEdges } from './shared-edges';
import { Smoothing } from './smoothing';
import { filtersVideo, powerOnScale, videoRunInS } from './video';

export class LongSweep {
	private readonly conditions: LongBucketConditions;
	private readonly edges?: SharedEdges;
	private readonly table = new GreatestOfNoise();
	private readonly bt: number;
	private readonly smoothing?: Smoothing;

	constructor(
		private readonly frame: Frame,
		private readonly detector: Detector,
		private readonly scale: Scale,
		incident: Incident,
		seed: Seed
	) {
		this.bt = frame.rbwHz * frame.bucketS;
		const peaks = detector !== 'average' && detector !== 'sample';
		this.conditions = new LongBucketConditions(frame, incident, scale, seed, peaks);
		if (filtersVideo(frame)) this.smoothing = new Smoothing(frame, scale);
		if (peaks && !this.smoothing) this.edges = new SharedEdges(frame, scale);
	}

	row(context: RowContext, out: Float64Array): void {
		const random = context.random('law');
		this.conditions.start(context);
		if (this.detector === 'sample') this.samples(random, out);
		else if (this.detector !== 'average') this.peaks(context, random, out);
		else
			for (let b = 0; b < this.frame.points; b++) {
				const { pieces, windows } = this.conditions.bucket(b, random);
				out[b] = averageOf(pieces, windows, this.bt, this.scale, random);
			}
	}

	/** Values at the points stand so far apart that their noise is independent. */
	private samples(random: Random, out: Float64Array): void {
		const { frame, conditions } = this;
		for (let b = 0; b < frame.points; b++) {
			const t = (b + 0.5) * frame.bucketS;
			if (this.smoothing) {
				out[b] = conditions.filteredInstant(t, videoRunInS(frame.vbwHz), random);
				continue;
			}
			const at = conditions.instant(t, random);
			const a = Math.sqrt(at.v / 2);
			const x = at.re + a * random.normal();
			const y = at.im + a * random.normal();
			out[b] = powerOnScale(x * x + y * y, this.scale);
		}
	}

	private peaks(context: RowContext, random: Random, out: Float64Array): void {
		const { frame, edges, conditions, detector, scale, bt, table, smoothing } = this;
		edges?.draw(context.random('edges'), (b) => conditions.edge(b, random));
		for (let b = 0; b < frame.points; b++) {
			const { pieces, windows } = conditions.bucket(b, random);
			if (edges) {
				// half of 1/B at either end is followed, the rest is drawn
				const free = pieces.reduce((sum, q) => sum + q.share, 0);
				const trim = free > 0 ? Math.max(0, free - 1 / bt) / free : 0;
				for (const piece of pieces) piece.share *= trim;
				windows.push(edges.window(b));
			}
			out[b] = peakOf(b, detector, scale, pieces, windows, bt, table, smoothing, random);
		}
	}
}
