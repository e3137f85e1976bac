import type { Emitter, Scene } from '$lib/schemas/scene';
import type { Quantity } from '$lib/schemas/quantity';
import { BenchError } from '../bench-error';

/** An emitter where it stands when it is looked at, on, and its place in the scene. */
export interface PlacedEmitter {
	index: number;
	emitter: Emitter;
}

/**
 * The emitters that count, each at its frequency at `atS`: a drifting one moved, a hopping one on the channel nearest to
 * what is asked (its first, where nothing in the question has a frequency).
 * @throws BenchError naming `emitters` for an index that isn't in the scene
 */
export function placeEmitters(scene: Scene, quantity: Quantity): PlacedEmitter[] {
	const indices = quantity.emitters ?? scene.emitters.map((_, i) => i);
	return indices.map((index, i) => {
		const emitter = scene.emitters[index];
		if (!emitter)
			throw new BenchError(
				`emitters.${i}`,
				`emitters.${i}: the scene has ${scene.emitters.length} emitters, ${index} is not one of them`
			);
		return { index, emitter: placed(emitter, quantity) };
	});
}

function placed(emitter: Emitter, quantity: Quantity): Emitter {
	if (emitter.kind === 'noise' || emitter.kind === 'dc') return emitter;
	let { frequencyHz } = emitter;
	if (emitter.hop) {
		const nearHz = frequencyAsked(quantity) ?? emitter.hop.channelsHz[0];
		const distance = (channelHz: number) => Math.abs(channelHz - nearHz);
		frequencyHz = emitter.hop.channelsHz.reduce((a, b) => (distance(b) < distance(a) ? b : a));
	}
	if (emitter.drift) frequencyHz += emitter.drift.hzPerS * lookedAtS(quantity);
	return { ...emitter, frequencyHz };
}

/** A count lasts: what it finds of a drifting carrier is where that stands halfway through the gate. */
const lookedAtS = (quantity: Quantity): number =>
	(quantity.atS ?? 0) + (quantity.kind === 'count' ? (quantity.gateS ?? 0) / 2 : 0);

/** How far the farthest drifting of the emitters has gone when it is looked at, Hz. */
export const farthestDriftHz = (emitters: PlacedEmitter[], quantity: Quantity): number =>
	emitters.reduce((farthest, { emitter }) => {
		const hzPerS = 'drift' in emitter && emitter.drift ? emitter.drift.hzPerS : 0;
		return Math.max(farthest, Math.abs(hzPerS) * lookedAtS(quantity));
	}, 0);

function frequencyAsked(quantity: Quantity): number | undefined {
	const fields = quantity as Record<string, unknown>;
	const named = ['atHz', 'carrierHz', 'centreHz', 'fundamentalHz', 'fromHz', 'lowerHz', 'startHz'];
	return named.map((name) => fields[name]).find((value) => typeof value === 'number');
}
