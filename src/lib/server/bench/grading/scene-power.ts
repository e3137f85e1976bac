import { dbToPowerRatio } from '$lib/units/decibel';
import { truth } from '../truth/truth';
import type { NumberQuestion } from '../exercise/drawn-exercise';
import type { Context } from './mistake';

/** Power in a channel of the scene, dBm at the reference plane. */
export const channelDbm = ({ drawn }: Context, centreHz: number, widthHz: number): number =>
	truth(drawn.scene, { kind: 'channel-power', centreHz, widthHz }).value;

/** Power density in the middle of what a question asks, dBm/Hz at the reference plane: as a filter of `widthHz` sees it. */
export const densityDbmPerHz = ({ drawn, question }: Context, widthHz: number): number =>
	truth(drawn.scene, { kind: 'power-density', centreHz: question.frequencyHz, widthHz }).value;

/** Width that the signal would have if it were flat at its middle density: its power over that density, Hz. */
export function flatWidthHz(context: Context, widthHz: number): number {
	const power = channelDbm(context, context.question.frequencyHz, widthHz);
	return dbToPowerRatio(power - densityDbmPerHz(context, widthHz / 50));
}

/** Width the question asks over; for one that names none, what its mistakes are told. */
export const askedWidthHz = (question: NumberQuestion): number | undefined =>
	(question.quantity as { widthHz?: number }).widthHz;
