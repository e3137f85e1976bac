import type { FilledQuantity } from './drawn-exercise';

const ONE = ['centreHz', 'atHz', 'carrierHz', 'fundamentalHz', 'toHz'] as const;
const TWO = [
	['startHz', 'stopHz'],
	['lowerHz', 'upperHz']
] as const;

/** Where in frequency a question asks: its centre, or the middle of its band; 0 when it asks over everything. */
export function quantityFrequencyHz(quantity: FilledQuantity): number {
	const single = ONE.find((key) => typeof quantity[key] === 'number');
	if (single) return quantity[single] as number;
	const pair = TWO.find(
		([low, high]) => typeof quantity[low] === 'number' && typeof quantity[high] === 'number'
	);
	return pair ? ((quantity[pair[0]] as number) + (quantity[pair[1]] as number)) / 2 : 0;
}
