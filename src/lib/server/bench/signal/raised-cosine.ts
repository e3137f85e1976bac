/**
 * Raised-cosine spectrum of unit height and unit area, frequency in symbol rates: the power spectrum behind a
 * root-raised-cosine pulse (Proakis, Digital Communications). 1 at 0, 1/2 at ±1/2, 0 beyond ±(1 + rollOff)/2.
 */
export function raisedCosine(frequencyPerRate: number, rollOff: number): number {
	const f = Math.abs(frequencyPerRate);
	const knee = (1 - rollOff) / 2;
	if (f <= knee) return 1;
	if (f >= (1 + rollOff) / 2) return 0;
	return 0.5 * (1 + Math.cos((Math.PI * (f - knee)) / rollOff));
}

/** Area of `raisedCosine` below `frequencyPerRate`: 0 to 1, 1/2 at 0. */
export function raisedCosineBelow(frequencyPerRate: number, rollOff: number): number {
	const f = Math.abs(frequencyPerRate);
	const knee = (1 - rollOff) / 2;
	let half = 0.5;
	if (f <= knee) half = f;
	else if (f < (1 + rollOff) / 2) {
		const beyond = f - knee;
		half = knee + 0.5 * (beyond + (rollOff / Math.PI) * Math.sin((Math.PI * beyond) / rollOff));
	}
	return frequencyPerRate >= 0 ? 0.5 + half : 0.5 - half;
}
