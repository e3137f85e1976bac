/** The lowest point of a smooth valley. */

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Golden-section search between two bounds; `f` must have one valley there. To 1e-7 of the interval. */
export function minimise(f: (x: number) => number, low: number, high: number): number {
	let [a, b] = [low, high];
	let [c, d] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)];
	let [fc, fd] = [f(c), f(d)];
	for (let i = 0; i < 34; i++) {
		if (fc < fd) {
			[b, d, fd] = [d, c, fc];
			c = b - GOLDEN * (b - a);
			fc = f(c);
		} else {
			[a, c, fc] = [c, d, fd];
			d = a + GOLDEN * (b - a);
			fd = f(d);
		}
	}
	return (a + b) / 2;
}
