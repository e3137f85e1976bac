/** Questions about a channel beside a signal's own: which neighbour is asked for, and other readings of it. */
import type { RequestOf } from '$lib/measure/reading-request';
import { truth } from '../truth/truth';
import type { Context } from './mistake';

type Offset = RequestOf<'adjacent-channel'>['offsets'][number];
type Side = 'lower' | 'upper';

const quantityOf = ({ question: { quantity } }: Context) => {
	if (quantity.kind !== 'adjacent-channel') throw new Error('asks for no channel beside another');
	return quantity;
};

/** Offset and width of the channel asked for: the one of the part, else the first. */
export function askedOffset(context: Context): Offset {
	const { offsets } = quantityOf(context);
	const { part } = context.question;
	const wanted = typeof part === 'object' && 'offsetHz' in part ? part.offsetHz : offsets[0].offsetHz;
	return offsets.find(({ offsetHz }) => Math.abs(offsetHz / wanted - 1) < 0.01) ?? offsets[0];
}

/** The side asked for; where none is, the worse one. */
export function askedSide(context: Context): Side {
	const { part } = context.question;
	if (typeof part === 'object' && 'side' in part) return part.side;
	const { parts } = truth(context.drawn.scene, quantityOf(context));
	const sides = parts as { side: Side; dbc: number }[];
	return sides.reduce((worst, one) => (one.dbc > worst.dbc ? one : worst)).side;
}

/** Centre of the channel asked for, Hz. */
export const neighbourHz = (context: Context): number =>
	quantityOf(context).centreHz + (askedSide(context) === 'lower' ? -1 : 1) * askedOffset(context).offsetHz;

/** The reading asked for with another offset or width of the neighbour's. */
export function adjacentReading(context: Context, other: Partial<Offset>): RequestOf<'adjacent-channel'> {
	const { kind, centreHz, widthHz, rrcRollOff } = quantityOf(context);
	const offsets = [{ ...askedOffset(context), ...other }];
	return { kind, centreHz, widthHz, offsets, ...(rrcRollOff !== undefined && { rrcRollOff }) };
}
