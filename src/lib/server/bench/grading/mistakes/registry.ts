/** Every kind of mistake that an exercise can watch. */
import type { MistakeKind } from '../mistake';
import { densityForPower } from './density-for-power';
import { densityNotDivided } from './density-not-divided';
import { densityOverChannel } from './density-over-channel';
import { leadLeftOut } from './lead-left-out';
import { leadTwice } from './lead-twice';
import { leadWrongSign } from './lead-wrong-sign';
import { logAverage } from './log-average';
import { logDensity } from './log-density';
import { markerAsPower } from './marker-as-power';
import { markerNotDivided } from './marker-not-divided';
import { peakOnNoise } from './peak-on-noise';
import { wrongWidth } from './wrong-width';

export const mistakeKinds: readonly MistakeKind[] = [
	densityForPower,
	densityNotDivided,
	densityOverChannel,
	leadLeftOut,
	leadTwice,
	leadWrongSign,
	logAverage,
	logDensity,
	markerAsPower,
	markerNotDivided,
	peakOnNoise,
	wrongWidth
];
