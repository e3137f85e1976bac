/** The tone that modulates what a question asks about, from the scene. */
import { partOf } from '$lib/schemas/part';
import { truth } from '../truth/truth';
import type { Source } from './evidence';
import { partsOf } from './asked';
import type { Context } from './mistake';

/** Frequency of the tone, Hz, and what else of the scene's truth is asked of it. */
export function toneOf({ drawn, question }: Context): { modulatingHz: number; value: number; index: number } {
	const { value, parts } = truth(drawn.scene, question.quantity);
	return {
		modulatingHz: partOf(parts, 'modulatingHz') ?? 0,
		value,
		index: partOf(parts, 'index') ?? 0
	};
}

/** The tone's frequency as a reading found it, Hz. */
export const toneReadHz = ({ reading }: Source): number | undefined =>
	partOf(partsOf(reading), 'modulatingHz');
