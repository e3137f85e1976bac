import type { IncidentEnvelope } from '../incident';
import type { CarriedLine } from './carried';
import { timingOf } from './line-timing';
import type { PhaseNoise } from './skirt-shape';

/** Emitters in a line's making that are followed as moving lines. */
const movingOrigins = (line: CarriedLine) =>
	line.origins.filter(({ arrival, order }) => arrival.waveform && order !== 0);

/** Whether the sweep follows it as a line that moves, not as one that stands. */
export const isMoving = (line: CarriedLine): boolean => movingOrigins(line).length === 1;

/**
 * A moving line (`quasi-static`) or what a product makes of one: its deviation counts as often as the line does.
 * Where the line was subtracted it moves the other way, half a period of the tone later: no filter that slow shows which.
 */
export function movingLine(carried: CarriedLine, receiver: PhaseNoise | null): IncidentEnvelope | null {
	if (!isMoving(carried)) return null;
	const [{ arrival, order }] = movingOrigins(carried);
	const emitter = arrival.waveform;
	if (!emitter) return null;
	const times = Math.abs(order);
	const { frequencyHz } = carried;
	const share = receiver ? Math.sqrt(receiver.lineShare) : 1;
	const timing = timingOf(carried);
	const scaled =
		emitter.kind === 'fm'
			? { ...emitter, frequencyHz, deviationHz: times * emitter.deviationHz }
			: emitter.kind === 'pm'
				? { ...emitter, frequencyHz, deviationRad: times * emitter.deviationRad }
				: { ...emitter, frequencyHz };
	return {
		emitter: scaled,
		index: arrival.index,
		frequencyHz,
		re: carried.re * share,
		im: carried.im * share,
		...(timing && { timing })
	};
}
