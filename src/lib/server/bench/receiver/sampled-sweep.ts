/** A sweep followed sample by sample: buckets short enough, or signals that must be seen whole. */
import type { Detector, Scale } from '$lib/schemas/settings';
import type { Contribution, RowContext } from './contribution';
import { detectAverage, detectPeaks, detectSample } from './detect';
import type { Frame } from './frame';
import { envelopePeaks, videoPeaks } from './peak-finders';
import type { RunIn } from './run-in';
import { filtersVideo, onePole, toScale } from './video';

export class SampledSweep {
	private readonly re: Float64Array;
	private readonly im: Float64Array;
	private readonly video: Float64Array;

	constructor(
		private readonly frame: Frame,
		private readonly detector: Detector,
		private readonly scale: Scale,
		private readonly contributions: Contribution[],
		/** Where the video filter's state comes from, if it filters. */
		private readonly runIn?: RunIn
	) {
		this.re = new Float64Array(frame.total);
		this.im = new Float64Array(frame.total);
		this.video = new Float64Array(frame.total);
	}

	/** One detected value per point, on the scale (ln p, p or √p). */
	row(context: RowContext, out: Float64Array): void {
		const { frame, re, im, video } = this;
		re.fill(0);
		im.fill(0);
		for (const contribution of this.contributions) contribution.addTo(context, frame, re, im);
		for (let i = 0; i < frame.total; i++) video[i] = re[i] * re[i] + im[i] * im[i];
		this.detect(context, out);
	}

	private detect(context: RowContext, out: Float64Array): void {
		const { frame, detector, scale, video } = this;
		const filtered = filtersVideo(frame);
		if (!filtered && detector !== 'average' && detector !== 'sample') {
			// unfiltered peaks are sought on the complex samples, in power
			const find = envelopePeaks(this.re, this.im, video, (power) => power);
			detectPeaks(frame, detector, video, find, out);
			toScale(out, scale, 0, frame.points);
			return;
		}
		if (!filtered && detector === 'sample') {
			detectSample(frame, video, out);
			toScale(out, scale, 0, frame.points);
			return;
		}
		toScale(video, scale, 0, frame.total);
		if (filtered)
			onePole(video, frame.vbwHz, frame.stepS, frame.total, this.runIn?.state(context) ?? video[0]);
		if (detector === 'average') detectAverage(frame, video, out);
		else if (detector === 'sample') detectSample(frame, video, out);
		else detectPeaks(frame, detector, video, videoPeaks(video), out);
	}
}
