/** Noise that a reading holds and its question doesn't ask for: the receiver's own, and beside a line the scene's too. */
import { dbToPowerRatio, dbmToMilliwatts, milliwattsToDbm } from '$lib/units/decibel';
import { floorDensity } from '../receiver/front-end/floor';
import { placeEmitters } from '../truth/place-emitters';
import { densityAt, spectrumOf } from '../truth/spectrum';
import type { Source } from './evidence';
import { familyOf, type Family } from './family';
import {
	averagesDecibels,
	bandSpreadDb,
	LOG_AVERAGE_DB,
	NOISE_BANDWIDTH,
	pointSpreadDb,
	shownPower
} from './noise-law';
import type { Context, SetUp } from './mistake';
import { widthHzOf } from './read-width';
import { skirtTakenOff } from './own-phase-noise';
import { setUpOf } from './set-up-of';

/** Density of the receiver's own noise where a question asks, mW/Hz brought to the reference plane through pad and lead. */
export const ownDensityMwPerHz = ({ drawn, question }: Context, { resolved }: SetUp): number =>
	floorDensity(drawn.profile, resolved)(question.frequencyHz) *
	dbToPowerRatio(question.leadDb + resolved.input.padDb);

/** Density of the scene's noise where a question asks, mW/Hz at the reference plane: 0 where its quantity counts noise in. */
function sceneDensityMwPerHz({ drawn, question }: Context): number {
	if (familyOf(question.quantity.kind) !== 'point') return 0;
	const noises = drawn.scene.emitters.flatMap(({ kind }, i) => (kind === 'noise' ? [i] : []));
	if (noises.length === 0) return 0;
	const { frequencyHz } = question;
	const placed = placeEmitters(drawn.scene, { kind: 'noise-density', atHz: frequencyHz, emitters: noises });
	return densityAt(spectrumOf(placed, drawn.scene.device), frequencyHz);
}

/** What one hertz of noise comes to in a reading: a point holds a filter full of it, a band its width, a density one. */
function widthOf(family: Family, { resolved }: SetUp, bandHz: number): number {
	if (family === 'point') return NOISE_BANDWIDTH * resolved.rbwHz;
	return family === 'band' ? bandHz : 1;
}

/** Mean power of that noise, in what a question asks for or in a reading of another family: mW, of a density mW/Hz. */
export function noiseMw(
	context: Context,
	setUp: SetUp,
	family: Family = familyOf(context.question.quantity.kind),
	bandHz: number = widthHzOf(context.question.quantity) ?? 0
): number {
	const scene = setUp.resolved.input.connected ? sceneDensityMwPerHz(context) : 0;
	return (ownDensityMwPerHz(context, setUp) + scene) * widthOf(family, setUp, bandHz);
}

/**
 * Whether a set-up is deaf to the signal: more noise in it than signal, and at least twice the receiver's own of the taught set-up.
 * What is read then is the receiver's floor.
 */
export function isDeaf(context: Context, setUp: SetUp): boolean {
	const { drawn, question } = context;
	if (noiseMw(context, setUp) < dbmToMilliwatts(question.truth)) return false;
	const taught = setUpOf(drawn, drawn.method, question.id);
	return ownDensityMwPerHz(context, setUp) > 2 * ownDensityMwPerHz(context, taught);
}

/** What a question's signal comes to with the noise that a set-up lets in, at the reference plane. */
export const withNoiseDbm = (context: Context, setUp: SetUp): number =>
	milliwattsToDbm(dbmToMilliwatts(context.question.truth) + noiseMw(context, setUp));

/**
 * A reading with its noise taken off as power, as detector, trace and scale show it: what someone reports who has read that noise in the
 * same set-up. NaN where nothing is left: the signal wasn't connected, or stands no way out of the noise.
 * @param errorDb the receiver's own error, which is in the noise it shows too
 */
export function noiseTakenOff(
	context: Context,
	{ request, family, setUp, planeValue }: Omit<Source, 'cleanValue'>,
	errorDb: number
): number {
	if (!setUp.resolved.input.connected) return NaN;
	if (request.kind === 'phase-noise') return skirtTakenOff(context, setUp, planeValue);
	const averagedDb = averagesDecibels(setUp) && request.kind !== 'noise-density' ? LOG_AVERAGE_DB : 0;
	const shown = shownPower(setUp) * dbToPowerRatio(errorDb - averagedDb);
	const noise = shown * noiseMw(context, setUp, family, widthHzOf(request));
	return milliwattsToDbm(dbmToMilliwatts(planeValue) - noise);
}

/** A noise density is read over 5 % of the span. */
const DENSITY_SHARE = 0.05;

/** Standard deviation in dB of noise, read with a set-up as a question asks: at a point, over its band, as a density. */
export function noiseSpreadDb({ question }: Context, setUp: SetUp): number {
	if (familyOf(question.quantity.kind) === 'point') return pointSpreadDb(setUp);
	return bandSpreadDb(setUp, widthHzOf(question.quantity) ?? DENSITY_SHARE * setUp.resolved.spanHz);
}

/** Standard deviation in dB of a signal's level as a set-up reads it in this noise: of a line, through what beats with it. */
export function readSpreadDb(context: Context, setUp: SetUp): number {
	const ratio = noiseMw(context, setUp) / dbmToMilliwatts(context.question.truth);
	const isLine = familyOf(context.question.quantity.kind) === 'point';
	const share = isLine ? Math.sqrt(2 * ratio + ratio ** 2) : Math.hypot(1 + ratio, ratio);
	return noiseSpreadDb(context, setUp) * share;
}
