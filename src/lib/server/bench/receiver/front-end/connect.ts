import { scaleDensity } from '$lib/server/bench/signal/scale-density';
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import type { Carried, CarriedDensity, CarriedLine } from './carried';
import type { Connection } from './connection';

/** Pieces that a spectrum is taken in to find the mean gain over it. */
const PIECES = 32;

/** Everything behind a connection. */
export function connect(carried: Carried, connection: Connection): Carried {
	if (connection.isFlat) return amplify(carried, connection.at(0));
	return {
		lines: carried.lines.map((line) => connectLine(line, connection.at)),
		densities: carried.densities.map((density) => connectDensity(density, connection.at))
	};
}

/** Everything at another level: power times `gain`. */
export function amplify({ lines, densities }: Carried, gain: number): Carried {
	const voltage = Math.sqrt(gain);
	return {
		lines: lines.map((line) => ({ ...line, re: line.re * voltage, im: line.im * voltage })),
		densities: densities.map((one) => ({ ...one, density: scaleDensity(one.density, gain) }))
	};
}

function connectLine(line: CarriedLine, gainAt: (frequencyHz: number) => number): CarriedLine {
	const places = placesHz(line.frequencyHz, line.origins);
	const gain = places.reduce((sum, frequencyHz) => sum + gainAt(frequencyHz), 0) / places.length;
	const voltage = Math.sqrt(gain);
	return { ...line, re: line.re * voltage, im: line.im * voltage };
}

/** Frequencies at which a line made of these is found: one, or one for each channel that it hops to. */
export function placesHz(frequencyHz: number, origins: CarriedLine['origins']): number[] {
	for (const { arrival, order } of origins) {
		const { emitter, timing } = arrival;
		if (!timing?.hop || !('frequencyHz' in emitter)) continue;
		return timing.hop.channelsHz.map((channelHz) => frequencyHz + order * (channelHz - emitter.frequencyHz));
	}
	return [frequencyHz];
}

/** The mean gain at once, in the spectrum's power; what differs from it, frequency by frequency, later. */
function connectDensity(carried: CarriedDensity, gainAt: (frequencyHz: number) => number): CarriedDensity {
	const { density, own } = carried;
	if (own?.timing?.hop) {
		const gains = own.timing.hop.channelsHz.map(gainAt);
		const gain = gains.reduce((sum, one) => sum + one, 0) / gains.length;
		return { ...carried, density: scaleDensity(density, gain) };
	}
	const mean = meanGain(density, gainAt);
	return {
		...carried,
		density: scaleDensity(density, mean),
		gainAt: (frequencyHz) => (carried.gainAt(frequencyHz) * gainAt(frequencyHz)) / mean
	};
}

function meanGain(density: Density, gainAt: (frequencyHz: number) => number): number {
	const pieceHz = (density.stopHz - density.startHz) / PIECES;
	let below = 0;
	let mean = 0;
	for (let i = 1; i <= PIECES; i++) {
		const upTo = i === PIECES ? 1 : density.cumulative(density.startHz + i * pieceHz);
		mean += (upTo - below) * gainAt(density.startHz + (i - 0.5) * pieceHz);
		below = upTo;
	}
	return mean;
}
