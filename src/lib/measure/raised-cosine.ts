/** Power response of a root-raised-cosine filter: flat, then a cosine roll-off around half the symbol rate. */

/**
 * Integral of the response from its centre to `offset`, both over the symbol rate; ±½ beyond the roll-off.
 * @param offset either sign
 * @param rollOff greater than 0, to 1
 */
export function raisedCosineIntegral(offset: number, rollOff: number): number {
	const flat = (1 - rollOff) / 2;
	const x = Math.min(Math.abs(offset), (1 + rollOff) / 2);
	const beyond = Math.max(0, x - flat);
	const integral =
		Math.min(x, flat) + (beyond + (rollOff / Math.PI) * Math.sin((Math.PI * beyond) / rollOff)) / 2;
	return Math.sign(offset) * integral;
}
