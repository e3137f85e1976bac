/** Thermal noise of a matched source. */
import { powerRatioToDb } from './decibel';

/** Boltzmann's constant, J/K; exact since 2019 (SI Brochure, 9th edition). */
export const BOLTZMANN = 1.380649e-23;
/** Reference temperature of noise figures, K. */
export const STANDARD_KELVIN = 290;

/** Density k·T of a matched source, dBm/Hz: −173.975 at 290 K. */
export const thermalDensityDbmPerHz = (kelvin: number = STANDARD_KELVIN): number =>
	powerRatioToDb(BOLTZMANN * kelvin * 1000);
