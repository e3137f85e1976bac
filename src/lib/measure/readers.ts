/** Every kind of reading, one line each. */
import { adjacentChannel } from './readings/adjacent-channel';
import { amDepth } from './readings/am-depth';
import { bandPower } from './readings/band-power';
import { carrierToNoise } from './readings/carrier-to-noise';
import { channelPower } from './readings/channel-power';
import { delta } from './readings/delta';
import { fmDeviation } from './readings/fm-deviation';
import { harmonics } from './readings/harmonics';
import { intercept } from './readings/intercept';
import { marker } from './readings/marker';
import { mask } from './readings/mask';
import { minimum } from './readings/minimum';
import { nextPeak } from './readings/next-peak';
import { noiseDensity } from './readings/noise-density';
import { occupiedBandwidth } from './readings/occupied-bandwidth';
import { peak } from './readings/peak';
import { phaseNoise } from './readings/phase-noise';
import { powerDensity } from './readings/power-density';
import { pulse } from './readings/pulse';
import { thd } from './readings/thd';
import { time } from './readings/time';
import { xDbBandwidth } from './readings/x-db-bandwidth';
import type { Reader } from './reader';
import type { ReadingKind } from './reading-request';

export const readers: { [K in ReadingKind]: Reader<K> } = {
	marker,
	delta,
	peak,
	'next-peak': nextPeak,
	minimum,
	'noise-density': noiseDensity,
	'band-power': bandPower,
	'channel-power': channelPower,
	'power-density': powerDensity,
	'occupied-bandwidth': occupiedBandwidth,
	'x-db-bandwidth': xDbBandwidth,
	'adjacent-channel': adjacentChannel,
	harmonics,
	thd,
	intercept,
	'carrier-to-noise': carrierToNoise,
	'phase-noise': phaseNoise,
	'am-depth': amDepth,
	'fm-deviation': fmDeviation,
	pulse,
	time,
	mask
};
