/** Every kind of mistake that an exercise can watch. */
import type { MistakeKind } from '../mistake';
import { averagedOverBursts } from './averaged-over-bursts';
import { burstForCarrier } from './burst-for-carrier';
import { burstMissed } from './burst-missed';
import { coarsePoints } from './coarse-points';
import { companyInTheFilter } from './company-in-the-filter';
import { couplingLeftOut } from './coupling-left-out';
import { couplingWrongSign } from './coupling-wrong-sign';
import { crestForCarrier } from './crest-for-carrier';
import { deltaSign } from './delta-sign';
import { densityForPower } from './density-for-power';
import { densityNotDivided } from './density-not-divided';
import { densityOverChannel } from './density-over-channel';
import { differenceNotHalved } from './difference-not-halved';
import { edgeFromWidth } from './edge-from-width';
import { floorAsSignal } from './floor-as-signal';
import { floorInRatio } from './floor-in-ratio';
import { gainTakenOff } from './gain-taken-off';
import { halfOrDouble } from './half-or-double';
import { harmonicLevelForRatio } from './harmonic-level-for-ratio';
import { inTheSkirt } from './in-the-skirt';
import { leadAtOtherPoint } from './lead-at-other-point';
import { leadLeftOut } from './lead-left-out';
import { leadTwice } from './lead-twice';
import { leadWrongSign } from './lead-wrong-sign';
import { levelForDifference } from './level-for-difference';
import { levelForRatio } from './level-for-ratio';
import { logAverage } from './log-average';
import { logDensity } from './log-density';
import { markerAsPower } from './marker-as-power';
import { markerNotDivided } from './marker-not-divided';
import { markerOverResolution } from './marker-over-resolution';
import { markersForBands } from './markers-for-bands';
import { narrowForDepth } from './narrow-for-depth';
import { narrowForPulse } from './narrow-for-pulse';
import { neighbourWidth } from './neighbour-width';
import { noiseNotTakenOff } from './noise-not-taken-off';
import { notMeasured } from './not-measured';
import { notPerWidth } from './not-per-width';
import { oneLineForAll } from './one-line-for-all';
import { otherHarmonic } from './other-harmonic';
import { otherNoiseWidth } from './other-noise-width';
import { otherNull } from './other-null';
import { otherSideRead } from './other-side';
import { overloaded } from './overloaded';
import { ownNoise } from './own-noise';
import { ownPhaseNoise } from './own-phase-noise';
import { ownProducts } from './own-products';
import { padLeftOut } from './pad-left-out';
import { padTwice } from './pad-twice';
import { pathLeftOut } from './path-left-out';
import { peakOnNoise } from './peak-on-noise';
import { periodForOnTime } from './period-for-on-time';
import { powerForVoltage } from './power-for-voltage';
import { pulseDesensitised } from './pulse-desensitised';
import { silenceForOnTime } from './silence-for-on-time';
import { skirtOfTheFilter } from './skirt-of-the-filter';
import { smallIndexRule } from './small-index-rule';
import { spikesForLines } from './spikes-for-lines';
import { spurUnderSkirt } from './spur-under-skirt';
import { strongestAlone } from './strongest-alone';
import { sweepTooFast } from './sweep-too-fast';
import { troughOnNoise } from './trough-on-noise';
import { unitMixed } from './unit-mixed';
import { untestedProducts } from './untested-products';
import { wideResolution } from './wide-resolution';
import { widthAtLevel } from './width-at-level';
import { widthForDeviation } from './width-for-deviation';
import { widthOfShare } from './width-of-share';
import { windowTooWide } from './window-too-wide';
import { wrongCarrier } from './wrong-carrier';
import { wrongNeighbour } from './wrong-neighbour';
import { wrongOffset } from './wrong-offset';
import { wrongWidth } from './wrong-width';

export const mistakeKinds: readonly MistakeKind[] = [
	averagedOverBursts,
	burstForCarrier,
	burstMissed,
	coarsePoints,
	companyInTheFilter,
	couplingLeftOut,
	couplingWrongSign,
	crestForCarrier,
	deltaSign,
	densityForPower,
	densityNotDivided,
	densityOverChannel,
	differenceNotHalved,
	edgeFromWidth,
	floorAsSignal,
	floorInRatio,
	gainTakenOff,
	halfOrDouble,
	harmonicLevelForRatio,
	inTheSkirt,
	leadAtOtherPoint,
	leadLeftOut,
	leadTwice,
	leadWrongSign,
	levelForDifference,
	levelForRatio,
	logAverage,
	logDensity,
	markerAsPower,
	markerNotDivided,
	markerOverResolution,
	markersForBands,
	narrowForDepth,
	narrowForPulse,
	neighbourWidth,
	noiseNotTakenOff,
	notMeasured,
	notPerWidth,
	oneLineForAll,
	otherHarmonic,
	otherNoiseWidth,
	otherNull,
	otherSideRead,
	overloaded,
	ownNoise,
	ownPhaseNoise,
	ownProducts,
	padLeftOut,
	padTwice,
	pathLeftOut,
	peakOnNoise,
	periodForOnTime,
	powerForVoltage,
	pulseDesensitised,
	silenceForOnTime,
	skirtOfTheFilter,
	smallIndexRule,
	spikesForLines,
	spurUnderSkirt,
	strongestAlone,
	sweepTooFast,
	troughOnNoise,
	unitMixed,
	untestedProducts,
	wideResolution,
	widthAtLevel,
	widthForDeviation,
	widthOfShare,
	windowTooWide,
	wrongCarrier,
	wrongNeighbour,
	wrongOffset,
	wrongWidth
];
