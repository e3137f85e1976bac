/** Every kind of mistake that an exercise can watch. */
import type { MistakeKind } from '../mistake';
import { averagedOverBursts } from './averaged-over-bursts';
import { burstForCarrier } from './burst-for-carrier';
import { burstMissed } from './burst-missed';
import { couplingLeftOut } from './coupling-left-out';
import { couplingWrongSign } from './coupling-wrong-sign';
import { densityForPower } from './density-for-power';
import { densityNotDivided } from './density-not-divided';
import { densityOverChannel } from './density-over-channel';
import { floorAsSignal } from './floor-as-signal';
import { gainTakenOff } from './gain-taken-off';
import { halfOrDouble } from './half-or-double';
import { leadAtOtherPoint } from './lead-at-other-point';
import { leadLeftOut } from './lead-left-out';
import { leadTwice } from './lead-twice';
import { leadWrongSign } from './lead-wrong-sign';
import { logAverage } from './log-average';
import { logDensity } from './log-density';
import { markerAsPower } from './marker-as-power';
import { markerNotDivided } from './marker-not-divided';
import { markerOverResolution } from './marker-over-resolution';
import { noiseNotTakenOff } from './noise-not-taken-off';
import { overloaded } from './overloaded';
import { padLeftOut } from './pad-left-out';
import { padTwice } from './pad-twice';
import { pathLeftOut } from './path-left-out';
import { peakOnNoise } from './peak-on-noise';
import { periodForOnTime } from './period-for-on-time';
import { silenceForOnTime } from './silence-for-on-time';
import { troughOnNoise } from './trough-on-noise';
import { unitMixed } from './unit-mixed';
import { wrongNeighbour } from './wrong-neighbour';
import { wrongWidth } from './wrong-width';

export const mistakeKinds: readonly MistakeKind[] = [
	averagedOverBursts,
	burstForCarrier,
	burstMissed,
	couplingLeftOut,
	couplingWrongSign,
	densityForPower,
	densityNotDivided,
	densityOverChannel,
	floorAsSignal,
	gainTakenOff,
	halfOrDouble,
	leadAtOtherPoint,
	leadLeftOut,
	leadTwice,
	leadWrongSign,
	logAverage,
	logDensity,
	markerAsPower,
	markerNotDivided,
	markerOverResolution,
	noiseNotTakenOff,
	overloaded,
	padLeftOut,
	padTwice,
	pathLeftOut,
	peakOnNoise,
	periodForOnTime,
	silenceForOnTime,
	troughOnNoise,
	unitMixed,
	wrongNeighbour,
	wrongWidth
];
