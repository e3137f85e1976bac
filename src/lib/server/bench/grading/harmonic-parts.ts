/** Harmonics as a reading or a truth lists them. */
import { truth } from '../truth/truth';
import type { Source } from './evidence';
import { partsOf } from './asked';
import type { Context } from './mistake';

interface Harmonic {
	n: number;
	dbc: number;
	levelDbm: number;
}

const listed = (parts: unknown): Harmonic[] => (Array.isArray(parts) ? (parts as Harmonic[]) : []);

/** Of the reading taken where it lists them, else of the scene. */
export function harmonicsOf({ drawn, question }: Context, source?: Source): Harmonic[] {
	const read = listed(source && partsOf(source.reading));
	return read.length > 0 ? read : listed(truth(drawn.scene, question.quantity).parts);
}
