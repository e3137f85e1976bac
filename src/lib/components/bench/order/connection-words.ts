/** What to bear in mind about what is connected, and how the sketch shows it. */
import type { ChainPart } from '$lib/schemas/exercise';
import type { ResolvedSettings } from '$lib/schemas/settings';

type Input = ResolvedSettings['input'];

export function connectionCautions({
	input,
	correctionDb
}: Pick<ResolvedSettings, 'input' | 'correctionDb'>): string[] {
	const cautions = [];
	if (!input.connected) {
		cautions.push(
			'The lead is off: whatever shows now is the receiver’s own. Settle pad and DC block before it goes on.'
		);
	}
	if (input.padDb > 0 && input.connected && correctionDb === 0) {
		cautions.push(
			`The receiver doesn’t know of the pad: its ${input.padDb} dB are missing until Correction adds them back.`
		);
	}
	return cautions;
}

/**
 * The chain as it is now: the learner's pad and DC block in front of the receiver. A pad that the order draws without a
 * figure is the learner's own, and gets its figure.
 */
export function chainAsConnected(chain: readonly ChainPart[], { padDb, dcBlock }: Input): ChainPart[] {
	const own = chain.findIndex(({ part, label }) => part === 'pad' && !/\d/.test(label));
	const pad: ChainPart = { part: 'pad', label: padDb > 0 ? `${padDb} dB pad` : 'no pad' };
	const before = chain.slice(0, -1).map((part, i) => (i === own ? pad : part));
	const added: ChainPart[] = padDb > 0 && own < 0 ? [pad] : [];
	if (dcBlock) added.push({ part: 'pad', label: 'DC block' });
	return [...before, ...added, ...chain.slice(-1)];
}
