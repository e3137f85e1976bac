import type { Unit } from '$lib/units/unit';
import type { Scene } from '$lib/schemas/scene';
import type { QuantityKind, QuantityOf } from '$lib/schemas/quantity';
import type { PlacedEmitter } from './place-emitters';
import type { Spectrum } from './spectrum';

/** What a quantity is worked out from. */
export interface Subject {
	scene: Scene;
	emitters: PlacedEmitter[];
	/** Made when first asked for. */
	spectrum(): Spectrum;
}

export interface TruthValue {
	value: number;
	unit: Unit;
	parts?: object;
}

/** Works out one kind of quantity. Refuses with a BenchError naming the field where the scene has no such thing. */
export type TruthOf<K extends QuantityKind> = (subject: Subject, quantity: QuantityOf<K>) => TruthValue;
