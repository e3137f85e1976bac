/** An emitter as it arrives at the reference plane: what it is through this resolution bandwidth, and when. */
import type { Emitter, EmitterOf, Gate } from '$lib/schemas/scene';
import { lineOf } from '$lib/server/bench/signal/comb';
import type { Density, EmitterPhases, Line } from '$lib/server/bench/signal/emitter-kind';
import { kindOf } from '$lib/server/bench/signal/kinds';
import type { Timing } from '../incident';
import { Random, type Seed } from '../random';
import { phaseNoiseSkirt, type PhaseNoise } from './skirt-shape';

/** A carrier that the scene can place in time and frequency. */
export type Carrier = Exclude<Emitter, { kind: 'noise' | 'dc' }>;
/** A switching faster than the filter can follow: it shows as lines. */
export interface Train {
	onS: number;
	periodS: number;
	startS: number;
}

export interface Arrival {
	/** Place in the scene: names its chance. */
	index: number;
	emitter: Emitter;
	/** Its lines while on; one, at the carrier, for a constant envelope. */
	lines: Line[];
	/**
	 * Modulated by a tone in its phase only: the stages see a constant envelope and so one line, which breaks into the
	 * modulation's lines (or moves, when they are too dense to resolve) behind them.
	 */
	angle?: EmitterOf<'fm' | 'pm'>;
	/** Its density while on. */
	density?: Density;
	/** Made symbol by symbol, or as a moving line, by the sweep: then neither lines nor density are swept themselves. */
	waveform?: EmitterOf<'digital' | 'msk' | 'fm' | 'pm'>;
	/** Switching, hopping, drifting that the filter can follow. */
	timing?: Timing;
	/** Switching that it can't. */
	trains: Train[];
	/** Phase of its modulation at bench clock 0. */
	modulationRad: number;
	/** Share of the time that the trains leave on. */
	duty: number;
	phaseNoise?: PhaseNoise;
}

/** Phases of an emitter at bench clock 0, the same for a whole attempt: the carrier's is drawn first, then the modulation's. */
export function emitterPhases(seed: Seed, index: number): EmitterPhases {
	const random = phaseStream(seed, index);
	return { carrierRad: 2 * Math.PI * random.uniform(), modulationRad: 2 * Math.PI * random.uniform() };
}

const phaseStream = (seed: Seed, index: number) => new Random(seed, -1, `phase/${index}`);

/** What repeats at least this often against the filter's width is resolved as lines. */
const isFast = (periodS: number, rbwHz: number) => 1 / periodS >= rbwHz / 2;

export function arrivalOf(emitter: Emitter, index: number, rbwHz: number, seed: Seed): Arrival {
	const phases = emitterPhases(seed, index);
	const { modulationRad } = phases;
	const arrival: Arrival = { index, emitter, lines: [], trains: [], duty: 1, modulationRad };
	if (emitter.kind === 'dc') return arrival;
	const kind = kindOf(emitter);
	const behaviour = kind.behaviour(emitter, rbwHz);
	if (emitter.kind === 'noise') return { ...arrival, density: kind.density?.(emitter) };
	if (emitter.kind === 'cw' && emitter.phaseNoise) {
		arrival.phaseNoise = phaseNoiseSkirt(emitter.phaseNoise, `scene.emitters.${index}.phaseNoise`);
	}
	if (emitter.kind === 'pulsed') {
		arrival.lines = [lineOf(emitter.frequencyHz, kind.peakPowerMw(emitter), phases.carrierRad)];
	} else if (behaviour === 'density' || behaviour === 'envelope') {
		arrival.density = kind.density?.(emitter);
	} else if (emitter.kind === 'fm' || emitter.kind === 'pm') {
		arrival.lines = [lineOf(emitter.frequencyHz, kind.meanPowerMw(emitter), phases.carrierRad)];
		arrival.angle = emitter;
	} else {
		arrival.lines = kind.lines?.(emitter, phases) ?? [];
	}
	if ((behaviour === 'envelope' || behaviour === 'quasi-static') && isWaveform(emitter))
		arrival.waveform = emitter;
	return { ...arrival, ...timingOf(emitter, index, rbwHz, phases, arrival.waveform !== undefined, seed) };
}

const isWaveform = (emitter: Emitter): emitter is EmitterOf<'digital' | 'msk' | 'fm' | 'pm'> =>
	['digital', 'msk', 'fm', 'pm'].includes(emitter.kind);

/** Splits an emitter's comings and goings into what the filter follows and what it resolves. */
function timingOf(
	emitter: Carrier,
	index: number,
	rbwHz: number,
	phases: EmitterPhases,
	isFollowed: boolean,
	seed: Seed
): Pick<Arrival, 'timing' | 'trains' | 'duty'> {
	const timing: Timing = { emitter: index };
	const trains: Train[] = [];
	if (emitter.kind === 'pulsed') {
		const { widthS, periodS } = emitter;
		// The pulse is centred where 2πt/periodS + modulationRad is a whole turn, as the emitter's own lines have it.
		const centreS = (-phases.modulationRad / (2 * Math.PI)) * periodS;
		if (isFast(periodS, rbwHz)) trains.push({ onS: widthS, periodS, startS: centreS - widthS / 2 });
		else timing.pulse = { widthS, periodS };
	}
	if (emitter.gate) {
		const { onS, offS } = emitter.gate;
		const resolved = isFast(onS + offS, rbwHz) && !isFollowed && !timing.pulse;
		if (resolved) trains.push({ onS, periodS: onS + offS, startS: gateStartS(emitter.gate, index, seed) });
		else timing.gate = emitter.gate;
	}
	if (emitter.hop) timing.hop = emitter.hop;
	if (emitter.drift) timing.driftHzPerS = emitter.drift.hzPerS;
	const duty = trains.reduce((share, train) => (share * train.onS) / train.periodS, 1);
	return { trains, duty, timing: Object.keys(timing).length > 1 ? timing : undefined };
}

/** A gate without a stated start begins anywhere in its period. */
const gateStartS = (gate: Gate, index: number, seed: Seed) =>
	gate.startS ?? new Random(seed, -1, `schedule/${index}`).uniform() * (gate.onS + gate.offS);
