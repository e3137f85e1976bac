/** A level in dBm as the voltage it makes across an impedance, and back. V² = P·R; voltages are r.m.s. */
import { dbmToMilliwatts, milliwattsToDbm, voltageRatioToDb } from './decibel';

/** Impedance of the bench, Ω. */
export const BENCH_OHMS = 50;

export const dbmToWatts = (levelDbm: number): number => dbmToMilliwatts(levelDbm) / 1000;
/** @param watts greater than 0 */
export const wattsToDbm = (watts: number): number => milliwattsToDbm(watts * 1000);

/** r.m.s. voltage: 0 dBm across 50 Ω is 0.2236 V. */
export const dbmToVolts = (levelDbm: number, ohms: number = BENCH_OHMS): number =>
	Math.sqrt(dbmToWatts(levelDbm) * ohms);
/** @param volts r.m.s., greater than 0 */
export const voltsToDbm = (volts: number, ohms: number = BENCH_OHMS): number =>
	wattsToDbm((volts * volts) / ohms);

/** dBµV above dBm: 106.9897 dB across 50 Ω. */
const microvoltOffsetDb = (ohms: number): number => voltageRatioToDb(dbmToVolts(0, ohms) * 1e6);

export const dbmToDbMicrovolts = (levelDbm: number, ohms: number = BENCH_OHMS): number =>
	levelDbm + microvoltOffsetDb(ohms);
export const dbMicrovoltsToDbm = (levelDbMicrovolts: number, ohms: number = BENCH_OHMS): number =>
	levelDbMicrovolts - microvoltOffsetDb(ohms);
export const dbmToDbMillivolts = (levelDbm: number, ohms: number = BENCH_OHMS): number =>
	dbmToDbMicrovolts(levelDbm, ohms) - 60;
export const dbMillivoltsToDbm = (levelDbMillivolts: number, ohms: number = BENCH_OHMS): number =>
	dbMicrovoltsToDbm(levelDbMillivolts + 60, ohms);
