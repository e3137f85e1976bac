/** A table of dB against frequency: frequencies rising, at least one point. */
export type TableDb = readonly { frequencyHz: number; db: number }[];

/** Value in dB at `frequencyHz`: straight in dB between the points over frequency, flat outside. */
export function tableDb(table: TableDb, frequencyHz: number): number {
	let above = 0;
	while (above < table.length && table[above].frequencyHz < frequencyHz) above++;
	if (above === 0) return table[0].db;
	if (above === table.length) return table[above - 1].db;
	const low = table[above - 1];
	const high = table[above];
	return (
		low.db + ((high.db - low.db) * (frequencyHz - low.frequencyHz)) / (high.frequencyHz - low.frequencyHz)
	);
}
