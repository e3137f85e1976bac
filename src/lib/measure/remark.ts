/** What a reading has to say about the settings it was taken with. The number stands; the remark is its warning. */

export type RemarkCode =
	| 'sweep-too-fast'
	| 'detector-peak-on-noise'
	| 'detector-minimum'
	| 'held-noise'
	| 'not-a-power-scale'
	| 'rbw-too-wide'
	| 'rbw-too-narrow'
	| 'vbw-too-narrow'
	| 'too-few-points'
	| 'window-too-wide-for-snr'
	| 'window-too-narrow'
	| 'window-outside-span'
	| 'signal-in-window'
	| 'near-noise'
	| 'peak-at-edge'
	| 'sidebands-unequal'
	| 'second-pair'
	| 'no-second-pair'
	| 'poor-fit'
	| 'no-repetition';

export interface Remark {
	code: RemarkCode;
	/** One sentence for the person at the bench. */
	text: string;
}

export const remark = (code: RemarkCode, text: string): Remark => ({ code, text });
