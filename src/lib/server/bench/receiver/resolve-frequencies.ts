import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Settings } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';

export interface Frequencies {
	startHz: number;
	stopHz: number;
	centreHz: number;
	spanHz: number;
}

/** Rounding of doubles at the edge of the range, as a share of its top: not a frequency anybody meant. */
const ROUNDING = 1e-12;

const stated = (settings: Settings, fields: (keyof Settings)[]) =>
	fields.filter((field) => settings[field] !== undefined);

/** Either pair, never a mixture and never half of one. */
function statedPair(settings: Settings): 'centre' | 'start' | 'none' {
	const centre = stated(settings, ['centreHz', 'spanHz']);
	const start = stated(settings, ['startHz', 'stopHz']);
	if (centre.length && start.length) {
		throw new BenchError(
			start[0],
			`give centreHz and spanHz or startHz and stopHz, not ${centre[0]} with ${start[0]}`
		);
	}
	if (centre.length === 1) {
		throw new BenchError(centre[0], `needs ${centre[0] === 'centreHz' ? 'spanHz' : 'centreHz'} beside it`);
	}
	if (start.length === 1) {
		throw new BenchError(start[0], `needs ${start[0] === 'startHz' ? 'stopHz' : 'startHz'} beside it`);
	}
	return centre.length ? 'centre' : start.length ? 'start' : 'none';
}

/**
 * Where the sweep stands, Hz. With no frequency stated, the receiver's whole range.
 * @throws BenchError naming the entry that is half a pair, of both pairs, reversed, or outside the receiver's range
 */
export function resolveFrequencies(settings: Settings, profile: ReceiverProfile): Frequencies {
	const pair = statedPair(settings);
	const slackHz = ROUNDING * profile.stopHz;
	const outside = (frequencyHz: number) =>
		frequencyHz < profile.startHz - slackHz || frequencyHz > profile.stopHz + slackHz;
	const range = `${profile.name} covers ${profile.startHz} to ${profile.stopHz} Hz`;
	if (pair === 'centre') {
		const centreHz = settings.centreHz as number;
		const spanHz = settings.spanHz as number;
		const startHz = centreHz - spanHz / 2;
		const stopHz = centreHz + spanHz / 2;
		if (outside(centreHz)) throw new BenchError('centreHz', `${range}; given ${centreHz} Hz`);
		if (outside(startHz) || outside(stopHz)) {
			throw new BenchError(
				'spanHz',
				`${range}; ${spanHz} Hz about ${centreHz} Hz reaches from ${startHz} to ${stopHz} Hz`
			);
		}
		return { startHz, stopHz, centreHz, spanHz };
	}
	const startHz = settings.startHz ?? profile.startHz;
	const stopHz = settings.stopHz ?? profile.stopHz;
	if (outside(startHz)) throw new BenchError('startHz', `${range}; given ${startHz} Hz`);
	if (outside(stopHz)) throw new BenchError('stopHz', `${range}; given ${stopHz} Hz`);
	if (stopHz < startHz)
		throw new BenchError('stopHz', `must not be below startHz, ${startHz} Hz; given ${stopHz} Hz`);
	return { startHz, stopHz, centreHz: (startHz + stopHz) / 2, spanHz: stopHz - startHz };
}
