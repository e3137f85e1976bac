/** A number of a proof in few characters, whatever its unit: two decimals, or three significant digits of what is great or small. */
export function brief(value: number): string {
	const size = Math.abs(value);
	if (size >= 1000) return value.toFixed(0);
	return size === 0 || size >= 0.01 ? value.toFixed(2) : value.toPrecision(2);
}
