/** A prepared sweep: everything of (scene, receiver, settings, seed) that does not change from row to row, and the rows it gives. */
import { sweepLossDb } from '$lib/measure/resolution-filter';
import type { CorrectionTable, ResolvedSettings } from '$lib/schemas/settings';
import { makeEngine } from './engine';
import type { Incident } from './incident';
import { Random, type Seed } from './random';
import type { ReceiverError } from './receiver-error';
import type { SweptSettings } from './swept-settings';
import { tableDb } from './table-db';
import { scaleToDbm } from './video';

export interface SweepFlag {
	kind: 'too-fast' | 'overload' | 'input-protection';
	/** How much a single line reads low (too fast), or stands above the limit, dB. */
	db?: number;
}

/** What one row needs beside the bench's settings: its number and the bench clock. */
export interface SweepPlan {
	readonly settings: ResolvedSettings;
	readonly flags: SweepFlag[];
	/** True when the input has protected itself: there are no rows until the set-up changes. */
	readonly isProtected: boolean;
	/** Detected levels in dBm, one per point, correction and the receiver's own error included. */
	row(n: number, clockS: number): Float32Array;
	/** Bench time row n takes, retrace included, s. */
	durationS(n: number): number;
}

const RETRACE_S = 0.01;

/** What row n of a sweep that starts at a bench clock detects: one value per point on the scale, the caller's until the next row. */
export type DetectedRows = (n: number, clockS: number) => Float64Array;

/** The rows of what reaches the filter, before anything is added to show them. */
export function detectedRows(
	incident: Incident,
	settings: SweptSettings,
	frequencyError: number,
	seed: Seed
): DetectedRows {
	const engine = makeEngine(incident, settings, frequencyError, seed);
	const values = new Float64Array(settings.points);
	return (n, clockS) => {
		engine.row({ clockS, random: (stream) => new Random(seed, n, stream) }, values);
		return values;
	};
}

/**
 * A sweep of what reaches the filter.
 * @param makeRows what detects its rows; sweeps that are only shown in other ways may share it
 */
export function planSweep(
	incident: Incident,
	settings: ResolvedSettings,
	error: ReceiverError,
	seed: Seed,
	makeRows: () => DetectedRows = () => detectedRows(incident, settings, error.frequency, seed)
): SweepPlan {
	const isProtected = incident.protection !== undefined;
	const detected = isProtected ? undefined : makeRows();
	const shownDb = shownOffsets(settings, error);
	return {
		settings,
		flags: sweepFlags(incident, settings),
		isProtected,
		row(n, clockS) {
			if (!detected) throw new RangeError('the input has protected itself: no sweep can be made');
			const values = detected(n, clockS);
			const levels = new Float32Array(values.length);
			for (let i = 0; i < levels.length; i++) levels[i] = scaleToDbm(values[i], settings.scale) + shownDb[i];
			return levels;
		},
		durationS(n) {
			const jitter = new Random(seed, n, 'retrace').uniform();
			return (settings.sweepTimeS * settings.points) / (settings.points - 1) + RETRACE_S * (1 + jitter);
		}
	};
}

function sweepFlags(incident: Incident, settings: ResolvedSettings): SweepFlag[] {
	const flags: SweepFlag[] = [];
	if (settings.sweepTimeS < settings.autoSweepTimeS * (1 - 1e-9)) {
		const sweepHzPerS = settings.spanHz / settings.sweepTimeS;
		flags.push({ kind: 'too-fast', db: sweepLossDb(sweepHzPerS, settings.rbwHz) });
	}
	if (incident.overload) flags.push({ kind: 'overload' });
	if (incident.protection)
		flags.push({
			kind: 'input-protection',
			db: incident.protection.connectorDbm - incident.protection.limitDbm
		});
	return flags;
}

/** What is added to each point: the correction at the shown frequency, and the receiver's level error. */
function shownOffsets(settings: ResolvedSettings, error: ReceiverError): Float64Array {
	const step = settings.spanHz / (settings.points - 1);
	return Float64Array.from({ length: settings.points }, (_, i) => {
		const frequencyHz = settings.startHz + i * step;
		return correctionAt(settings.correctionDb, frequencyHz) + error.levelDb(frequencyHz);
	});
}

/** Correction in dB at a frequency: straight between the table's points, flat outside. */
export const correctionAt = (correction: number | CorrectionTable, frequencyHz: number): number =>
	typeof correction === 'number' ? correction : tableDb(correction, frequencyHz);
