import type { ResolvedSettings } from '$lib/schemas/settings';
import type { FrontEndSettings } from './front-end/front-end-settings';

/** What of a set-up decides what a row detects; corrections and traces only change what is shown of it. */
export type SweptSettings = FrontEndSettings & Pick<ResolvedSettings, 'vbwHz' | 'detector' | 'scale'>;
