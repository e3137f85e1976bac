import { pacemaker, type CarriedDensity } from './carried';

/** Share of the time that trains too fast for the filter leave a density on. */
export const densityShare = ({ arrivals }: CarriedDensity): number => pacemaker(arrivals)?.duty ?? 1;
