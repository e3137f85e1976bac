/** What of a reading beside a strong signal is the receiver's own: its mixer's products, its noise. */
import type { ReadingRequest } from '$lib/measure/reading-request';
import type { Context, SetUp } from './mistake';
import { shownReading } from './shown-reading';

/** So little noise that nothing shows of it. */
const SILENT = [{ frequencyHz: 1e9, db: -100 }];

export interface OwnShare {
	/** What the reading shows over what it would show if the mixer were straight, in the question's unit. */
	productsUp: number;
	/** What that would show over what it would without any noise of its own. */
	noiseUp: number;
}

/** Null where the set-up shows no such number. */
export function ownShare(context: Context, setUp: SetUp, request: ReadingRequest): OwnShare | null {
	const { profile } = context.drawn;
	const straight = { ...profile, name: `straight ${profile.name}`, toiDbm: null, shiDbm: null };
	const quiet = { ...straight, name: `quiet ${profile.name}`, noiseFigureDb: SILENT, preamp: null };
	const [shown, unbent, noiseless] = [profile, straight, quiet].map((one) =>
		shownReading(context, setUp, request, one)
	);
	if (shown === null || unbent === null || noiseless === null) return null;
	return { productsUp: shown - unbent, noiseUp: unbent - noiseless };
}
