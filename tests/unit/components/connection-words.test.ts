import { describe, expect, it } from 'vitest';
import { chainAsConnected, connectionCautions } from '$lib/components/bench/order/connection-words';
import { overloadRemedy } from '$lib/components/bench/state/overload-remedy';
import type { ChainPart } from '$lib/schemas/exercise';

const input = { connected: true, padDb: 0, dcBlock: false };
const chain: ChainPart[] = [
	{ part: 'box', label: 'Transmitter' },
	{ part: 'lead', label: '5.0 dB lead' },
	{ part: 'box', label: 'Receiver' }
];
const labels = (parts: ChainPart[]) => parts.map(({ label }) => label);

describe('chainAsConnected(chain, input)', () => {
	it('puts pad and DC block in front of the receiver', () => {
		expect(labels(chainAsConnected(chain, { ...input, padDb: 20, dcBlock: true }))).toEqual([
			'Transmitter',
			'5.0 dB lead',
			'20 dB pad',
			'DC block',
			'Receiver'
		]);
	});
	it('gives the learner’s own pad of the order its figure, and leaves one with a figure alone', () => {
		const own: ChainPart[] = [chain[0], { part: 'pad', label: 'your pad' }, chain[2]];
		expect(labels(chainAsConnected(own, { ...input, padDb: 20 }))).toEqual([
			'Transmitter',
			'20 dB pad',
			'Receiver'
		]);
		const fixed: ChainPart[] = [chain[0], { part: 'pad', label: '6 dB pad' }, chain[2]];
		expect(labels(chainAsConnected(fixed, { ...input, padDb: 10 }))).toEqual([
			'Transmitter',
			'6 dB pad',
			'10 dB pad',
			'Receiver'
		]);
	});
});

describe('connectionCautions(set-up)', () => {
	it('says that a pad is missing in the figures until something is added back', () => {
		const padded = { ...input, padDb: 20 };
		expect(connectionCautions({ input: padded, correctionDb: 0 })).toHaveLength(1);
		expect(connectionCautions({ input: padded, correctionDb: 20 })).toEqual([]);
	});
	it('says that nothing of the signal shows while the load is on', () => {
		expect(connectionCautions({ input: { ...input, connected: false }, correctionDb: 0 })[0]).toMatch(
			/lead is off/
		);
	});
});

describe('overloadRemedy(set-up, receiver)', () => {
	const receiver = { attenuatorDb: [0, 5, 10, 15, 20, 30] };
	const remedy = (attenuationDb: number, padDb = 0, preamp = false) =>
		overloadRemedy({ attenuationDb, preamp, input: { ...input, padDb } }, receiver)?.words;
	it('goes from the preamplifier over the attenuator to the pads, and ends there', () => {
		expect(remedy(10, 0, true)).toBe('Preamplifier off');
		expect(remedy(5)).toBe('Attenuate 10 dB more');
		expect(remedy(15)).toBe('Attenuate 15 dB more');
		expect(remedy(30)).toBe('Put in a 10 dB pad');
		expect(remedy(30, 30)).toBeUndefined();
	});
});
