const ONE = ['centreHz', 'atHz', 'carrierHz', 'fundamentalHz', 'toHz'];
const TWO = [
	['startHz', 'stopHz'],
	['lowerHz', 'upperHz']
];

/** Where in frequency a question (or reading) asks: its centre, or the middle of its band; 0 when it asks over everything. */
export function quantityFrequencyHz(asked: { kind: string }): number {
	const fields = asked as unknown as Record<string, unknown>;
	const numberAt = (key: string) => (typeof fields[key] === 'number' ? fields[key] : undefined);
	const single = ONE.map(numberAt).find((value) => value !== undefined);
	if (single !== undefined) return single;
	const pair = TWO.map((keys) => keys.map(numberAt)).find(
		([low, high]) => low !== undefined && high !== undefined
	);
	return pair ? (pair[0]! + pair[1]!) / 2 : 0;
}
