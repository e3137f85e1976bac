/** "first", "second" … as a work order counts attempts; from eleven on, in figures. */
const words = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth', 'tenth'];

/** @param n from 1 */
export function ordinal(n: number): string {
	if (n <= words.length) return words[n - 1];
	const last = n % 100 >= 11 && n % 100 <= 13 ? 0 : n % 10;
	return `${n}${['th', 'st', 'nd', 'rd'][last] ?? 'th'}`;
}
