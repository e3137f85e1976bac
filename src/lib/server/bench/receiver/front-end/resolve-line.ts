/** Breaks what the stages saw as one line into the lines that the filter resolves. */
import { combOfSwitchedLine } from '$lib/server/bench/signal/comb';
import type { Band, Line } from '$lib/server/bench/signal/emitter-kind';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { milliwattsToDbm } from '$lib/units/decibel';
import type { Arrival } from './arrival';
import { pacemaker, type CarriedLine, type Origin } from './carried';

/** A train's lines are followed to this many repetition rates from their carrier. */
const FARTHEST_LINE = 5000;

/**
 * A line with its phase modulations and fast switching.
 * @param band where lines of a train are wanted: there are too many to list them all
 */
export function resolveLine(carried: CarriedLine, band: Band | undefined): Line[] {
	const { frequencyHz, re, im, origins } = carried;
	const modulated = origins
		.filter(({ arrival, order }) => arrival.angle && !arrival.waveform && order !== 0)
		.reduce<Line[]>(
			(lines, origin) => lines.flatMap((line) => modulate(line, origin)),
			[{ frequencyHz, re, im }]
		);
	const trains = pacemaker(origins.map(({ arrival }) => arrival))?.trains ?? [];
	return trains.reduce<Line[]>(
		(lines, train) => lines.flatMap((line) => switchLine(line, train, band)),
		modulated
	);
}

/** exp(j·n·φ(t)) on a line, φ the emitter's phase: the emitter's own lines with n times its deviation. */
function modulate(line: Line, { arrival: { angle, modulationRad }, order }: Origin): Line[] {
	const powerMw = line.re * line.re + line.im * line.im;
	if (!angle || powerMw === 0) return [line];
	const times = Math.abs(order);
	const at = { frequencyHz: line.frequencyHz, levelDbm: milliwattsToDbm(powerMw) };
	const phases = {
		carrierRad: Math.atan2(line.im, line.re),
		// −φ is φ half a period of the tone later.
		modulationRad: modulationRad + (order < 0 ? Math.PI : 0)
	};
	const louder =
		angle.kind === 'fm'
			? { ...angle, ...at, deviationHz: times * angle.deviationHz }
			: { ...angle, ...at, deviationRad: times * angle.deviationRad };
	return kindOf(louder).lines?.(louder, phases) ?? [];
}

function switchLine(line: Line, train: Arrival['trains'][number], band: Band | undefined): Line[] {
	const reachHz = FARTHEST_LINE / train.periodS;
	return combOfSwitchedLine(line, train, {
		startHz: Math.max(line.frequencyHz - reachHz, band?.startHz ?? -Infinity),
		stopHz: Math.min(line.frequencyHz + reachHz, band?.stopHz ?? Infinity)
	});
}
