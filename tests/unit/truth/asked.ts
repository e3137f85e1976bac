/** Scenes on paper, and what is asked of them. */
import type { Quantity } from '$lib/schemas/quantity';
import { quantity as quantitySchema } from '$lib/schemas/quantity';
import type { Emitter, EmitterOf, Scene } from '$lib/schemas/scene';
import { truth } from '$lib/server/bench/truth/truth';

export const cw = (frequencyHz: number, levelDbm: number, more: Partial<EmitterOf<'cw'>> = {}): Emitter => ({
	kind: 'cw',
	frequencyHz,
	levelDbm,
	...more
});
export const noise = (densityDbmPerHz: number, startHz: number, stopHz: number): Emitter => ({
	kind: 'noise',
	densityDbmPerHz,
	startHz,
	stopHz
});
export const qpsk: Emitter = {
	kind: 'digital',
	frequencyHz: 1e9,
	levelDbm: -20,
	symbolRateHz: 1e6,
	rollOff: 0.22,
	order: 4
};
export const scene = (...emitters: Emitter[]): Scene => ({ emitters });
/** Through the schema, as everything that asks goes. */
export const ask = (of: Scene, asked: Quantity) => truth(of, quantitySchema.parse(asked));
export const refusal = (of: Scene, asked: Quantity) => {
	try {
		ask(of, asked);
	} catch (error) {
		return (error as { field?: string }).field;
	}
	return undefined;
};
