/** Field strength from what an antenna delivers. */
import { dbmToDbMicrovolts } from './level';

/**
 * Field strength from the level at the antenna's connector: E = V · AF.
 * @param antennaFactorDbPerM at the frequency of the level, for the same impedance
 * @returns dBµV/m
 */
export const fieldStrengthDbMicrovoltsPerM = (
	levelDbm: number,
	antennaFactorDbPerM: number,
	ohms?: number
): number => dbmToDbMicrovolts(levelDbm, ohms) + antennaFactorDbPerM;
