/** A question asked of another carrier than the one meant. */
import { partOf } from '$lib/schemas/part';
import type { Quantity } from '$lib/schemas/quantity';
import { BenchError } from '../bench-error';
import { truth } from '../truth/truth';
import type { Context } from './mistake';

/** What a question asks, with another carrier at the place of the one it means; of a delta, its second marker. */
export function quantityAt(quantity: Quantity, atHz: number): Quantity {
	switch (quantity.kind) {
		case 'marker':
		case 'count':
			return { ...quantity, atHz };
		case 'delta':
			return { ...quantity, toHz: atHz };
		default:
			throw new BenchError('mistakes', `${quantity.kind} asks of no single carrier`);
	}
}

/** What the question would be answered with, if it asked of the carrier at `atHz`. */
export function truthAt({ drawn, question }: Context, atHz: number): number {
	const whole = truth(drawn.scene, quantityAt(question.quantity, atHz));
	return (question.part === undefined ? undefined : partOf(whole.parts, question.part)) ?? whole.value;
}

/** Level of the carrier at `atHz` at the reference plane, dBm. */
export const lineDbm = ({ drawn }: Pick<Context, 'drawn'>, atHz: number): number =>
	truth(drawn.scene, { kind: 'marker', atHz }).value;
