/** Every kind of mistake that an exercise can watch. */
import type { MistakeKind } from '../mistake';
import { couplingLeftOut } from './coupling-left-out';
import { couplingWrongSign } from './coupling-wrong-sign';
import { densityForPower } from './density-for-power';
import { densityNotDivided } from './density-not-divided';
import { densityOverChannel } from './density-over-channel';
import { halfOrDouble } from './half-or-double';
import { leadAtOtherPoint } from './lead-at-other-point';
import { leadLeftOut } from './lead-left-out';
import { leadTwice } from './lead-twice';
import { leadWrongSign } from './lead-wrong-sign';
import { logAverage } from './log-average';
import { logDensity } from './log-density';
import { markerAsPower } from './marker-as-power';
import { markerNotDivided } from './marker-not-divided';
import { overloaded } from './overloaded';
import { padLeftOut } from './pad-left-out';
import { padTwice } from './pad-twice';
import { pathLeftOut } from './path-left-out';
import { peakOnNoise } from './peak-on-noise';
import { unitMixed } from './unit-mixed';
import { wrongNeighbour } from './wrong-neighbour';
import { wrongWidth } from './wrong-width';

export const mistakeKinds: readonly MistakeKind[] = [
	couplingLeftOut,
	couplingWrongSign,
	densityForPower,
	densityNotDivided,
	densityOverChannel,
	halfOrDouble,
	leadAtOtherPoint,
	leadLeftOut,
	leadTwice,
	leadWrongSign,
	logAverage,
	logDensity,
	markerAsPower,
	markerNotDivided,
	overloaded,
	padLeftOut,
	padTwice,
	pathLeftOut,
	peakOnNoise,
	unitMixed,
	wrongNeighbour,
	wrongWidth
];
