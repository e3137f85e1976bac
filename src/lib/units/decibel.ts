/** Decibels. Power and voltage are different functions, never a flag. */

/** Power ratio (greater than 0) to dB: 2 is 3.0103. */
export const powerRatioToDb = (ratio: number): number => 10 * Math.log10(ratio);
/** dB to power ratio: 10 dB is 10. */
export const dbToPowerRatio = (db: number): number => 10 ** (db / 10);
/** Voltage ratio (greater than 0) to dB: 2 is 6.0206. */
export const voltageRatioToDb = (ratio: number): number => 20 * Math.log10(ratio);
/** dB to voltage ratio: 20 dB is 10. */
export const dbToVoltageRatio = (db: number): number => 10 ** (db / 20);
/** Power in mW (greater than 0) to dBm: 1 mW is 0 dBm. */
export const milliwattsToDbm = powerRatioToDb;
/** Power in dBm to mW: 0 dBm is 1 mW. */
export const dbmToMilliwatts = dbToPowerRatio;
