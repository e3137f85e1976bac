/** Mistakes about pulses: what theory says of each is what the bench gives when it is made there. */
import { promiseOfMistakes } from '../../../factories/promise-of-mistakes';

promiseOfMistakes([
	['radar-seen-from-afar', 2, 'level', 'pulse-desensitised 100000', 'low'],
	['lines-of-an-altimeter', 2, 'repetition', 'spikes-for-lines 300000', 'high'],
	['long-pulses-over-time', 2, 'width', 'narrow-for-pulse 3000', 'high'],
	['long-pulses-over-time', 2, 'level', 'pulse-desensitised 3000', 'low']
]);
