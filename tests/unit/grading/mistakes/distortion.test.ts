/** Mistakes about harmonics and intermodulation: what theory says of each is what the bench gives when it is made there. */
import { promiseOfMistakes } from '../../../factories/promise-of-mistakes';

promiseOfMistakes([
	['harmonics-of-a-harbour-transmitter', 2, 'second', 'untested-products 0', 'high'],
	['harmonics-of-a-harbour-transmitter', 2, 'second', 'other-harmonic 3', 'low'],
	['harmonics-of-a-harbour-transmitter', 2, 'second', 'harmonic-level-for-ratio', 'low'],
	['harmonics-of-a-harbour-transmitter', 2, 'distortion', 'power-for-voltage', 'low'],
	['harmonics-of-a-harbour-transmitter', 2, 'distortion', 'strongest-alone', 'low'],
	['intercept-of-a-mast-amplifier', 3, 'intercept', 'untested-products 20', 'low'],
	['intercept-of-a-mast-amplifier', 3, 'intercept', 'difference-not-halved', 'high'],
	['intercept-of-a-mast-amplifier', 3, 'product', 'untested-products 20', 'high']
]);
