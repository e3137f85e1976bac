/** Mistakes about depth and deviation: what theory says of each is what the bench gives when it is made there. */
import { promiseOfMistakes } from '../../../factories/promise-of-mistakes';

promiseOfMistakes([
	['depth-of-a-village-transmitter', 2, 'depth', 'narrow-for-depth 1000', 'low'],
	['depth-of-a-village-transmitter', 2, 'depth', 'power-for-voltage', 'low'],
	['depth-of-a-village-transmitter', 2, 'carrier', 'crest-for-carrier 30000', 'high'],
	['deviation-of-a-harbour-channel', 2, 'deviation', 'small-index-rule', 'high'],
	['deviation-of-a-harbour-channel', 2, 'deviation', 'width-for-deviation', 'high'],
	['carrier-that-vanished', 2, 'deviation', 'other-null', 'low'],
	['carrier-that-vanished', 2, 'power', 'one-line-for-all', 'low']
]);
