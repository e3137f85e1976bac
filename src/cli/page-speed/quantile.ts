/** The value that a share of `values` doesn't exceed; NaN of none. */
export function quantile(values: readonly number[], share: number): number {
	const rising = [...values].sort((a, b) => a - b);
	return rising[Math.min(rising.length - 1, Math.floor(share * rising.length))] ?? NaN;
}
