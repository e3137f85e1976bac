import type { ResolvedSettings } from '$lib/schemas/settings';

/** What of a set-up decides what reaches the resolution filter: set-ups that differ in nothing else share it. */
export type FrontEndSettings = Pick<
	ResolvedSettings,
	| 'startHz'
	| 'stopHz'
	| 'centreHz'
	| 'spanHz'
	| 'points'
	| 'rbwHz'
	| 'sweepTimeS'
	| 'attenuationDb'
	| 'preamp'
	| 'input'
>;
