/** What to do about an overloaded mixer. */
import type { ReceiverView } from '$lib/schemas/exercise-view';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';

export interface Remedy {
	words: string;
	changes: Partial<Settings>;
}

export const padsDb = [0, 10, 20, 30] as const;

/** The attenuator's next step of 10 dB or more, a preamplifier off, or the next pad; undefined when all are in. */
export function overloadRemedy(
	{ attenuationDb, preamp, input }: Pick<ResolvedSettings, 'attenuationDb' | 'preamp' | 'input'>,
	receiver: Pick<ReceiverView, 'attenuatorDb'>
): Remedy | undefined {
	if (preamp) return { words: 'Preamplifier off', changes: { preamp: false } };
	const step = receiver.attenuatorDb.find((db) => db >= attenuationDb + 10);
	if (step !== undefined) {
		return { words: `Attenuate ${step - attenuationDb} dB more`, changes: { attenuationDb: step } };
	}
	const pad = padsDb.find((db) => db > input.padDb);
	if (pad === undefined) return undefined;
	const { connected, dcBlock } = input;
	return { words: `Put in a ${pad} dB pad`, changes: { input: { connected, dcBlock, padDb: pad } } };
}
