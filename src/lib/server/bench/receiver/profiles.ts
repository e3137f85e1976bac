/** The two receivers that ship. Both are invented; the figures are theirs alone. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { BenchError } from '../bench-error';

const attenuatorDb = [0, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50];
const rbwHz = [1, 3, 10, 30, 100, 300, 1e3, 3e3, 10e3, 30e3, 100e3, 300e3, 1e6, 3e6];

/** A good portable receiver, to be carried up a mast. */
export const field: ReceiverProfile = {
	name: 'field',
	startHz: 20e3,
	stopHz: 8.2e9,
	noiseFigureDb: [
		{ frequencyHz: 20e3, db: 30.7 },
		{ frequencyHz: 2.4e6, db: 24.3 },
		{ frequencyHz: 85e6, db: 22.6 },
		{ frequencyHz: 1.1e9, db: 22.9 },
		{ frequencyHz: 3.3e9, db: 23.8 },
		{ frequencyHz: 6.2e9, db: 25.4 },
		{ frequencyHz: 8.2e9, db: 27.3 }
	],
	preamp: {
		gainDb: 18.3,
		noiseFigureDb: [
			{ frequencyHz: 2.4e6, db: 7.4 },
			{ frequencyHz: 85e6, db: 5.7 },
			{ frequencyHz: 1.1e9, db: 5.9 },
			{ frequencyHz: 3.3e9, db: 6.6 },
			{ frequencyHz: 8.2e9, db: 8.8 }
		]
	},
	attenuatorDb,
	maxSafeInputDbm: 27,
	toiDbm: 11.4,
	shiDbm: 43.3,
	phaseNoise: [
		{ offsetHz: 100, dbcPerHz: -73.6 },
		{ offsetHz: 1e3, dbcPerHz: -89.1 },
		{ offsetHz: 10e3, dbcPerHz: -97.2 },
		{ offsetHz: 100e3, dbcPerHz: -104.8 },
		{ offsetHz: 1e6, dbcPerHz: -122.7 },
		{ offsetHz: 10e6, dbcPerHz: -140.9 }
	],
	residuals: [
		{ frequencyHz: 48.37e6, levelDbm: -108.6 },
		{ frequencyHz: 391.68e6, levelDbm: -104.9 },
		{ frequencyHz: 1.9531e9, levelDbm: -106.3 },
		{ frequencyHz: 5.4613e9, levelDbm: -101.7 }
	],
	loFeedthroughDbm: -31.5,
	referencePpm: 0.7,
	levelErrorDb: 0.7,
	rbwHz
};

/** A cheap receiver: noisier, easier to overload, no preamplifier. */
export const modest: ReceiverProfile = {
	name: 'modest',
	startHz: 100e3,
	stopHz: 2.7e9,
	noiseFigureDb: [
		{ frequencyHz: 100e3, db: 36.2 },
		{ frequencyHz: 7.5e6, db: 32.4 },
		{ frequencyHz: 240e6, db: 30.6 },
		{ frequencyHz: 1.3e9, db: 31.3 },
		{ frequencyHz: 2.7e9, db: 33.9 }
	],
	preamp: null,
	attenuatorDb,
	maxSafeInputDbm: 23.5,
	toiDbm: -1.2,
	shiDbm: 27.8,
	phaseNoise: [
		{ offsetHz: 100, dbcPerHz: -58.3 },
		{ offsetHz: 1e3, dbcPerHz: -71.9 },
		{ offsetHz: 10e3, dbcPerHz: -81.4 },
		{ offsetHz: 100e3, dbcPerHz: -93.8 },
		{ offsetHz: 1e6, dbcPerHz: -114.6 },
		{ offsetHz: 10e6, dbcPerHz: -131.2 }
	],
	residuals: [
		{ frequencyHz: 27.14e6, levelDbm: -96.8 },
		{ frequencyHz: 162.85e6, levelDbm: -92.7 },
		{ frequencyHz: 733.19e6, levelDbm: -94.1 },
		{ frequencyHz: 1.4662e9, levelDbm: -90.4 },
		{ frequencyHz: 2.1994e9, levelDbm: -93.5 }
	],
	loFeedthroughDbm: -22.6,
	referencePpm: 2.5,
	levelErrorDb: 1.6,
	rbwHz
};

const profiles = [field, modest];

/** @throws BenchError naming `receiver` when no receiver that ships has this name */
export function profileNamed(name: string): ReceiverProfile {
	const found = profiles.find((profile) => profile.name === name);
	if (!found) {
		const known = profiles.map((profile) => profile.name).join(', ');
		throw new BenchError('receiver', `must be a profile or one of ${known}; given ${name}`);
	}
	return found;
}
