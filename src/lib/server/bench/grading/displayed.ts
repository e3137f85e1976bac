import { drawReceiverError } from '../receiver/receiver-error';
import type { Context } from './mistake';

/** Where this receiver shows what stands at `trueHz`. */
export const displayedHz = ({ drawn }: Pick<Context, 'drawn'>, trueHz: number): number =>
	trueHz * (1 + drawReceiverError(drawn.profile, drawn.seed).frequency);
