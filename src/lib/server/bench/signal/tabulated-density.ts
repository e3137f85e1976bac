import type { Density } from './emitter-kind';

/**
 * A density from its value at evenly spaced frequencies, mW/Hz, straight between them and zero one step outside.
 * The cumulative share is the exact integral of that.
 */
export function tabulatedDensity(
	table: { startHz: number; stepHz: number; values: Float64Array },
	shapeKey: string
): Density {
	const { startHz, stepHz, values } = table;
	const points = values.length;
	const below = new Float64Array(points + 1);
	// Area up to point i; before the first lies half a triangle.
	let sum = 0;
	for (let i = 0; i < points; i++) {
		sum += ((i > 0 ? values[i - 1] : 0) + values[i]) / 2;
		below[i] = sum;
	}
	sum += values[points - 1] / 2;
	below[points] = sum;
	const at = (i: number): number => (i >= 0 && i < points ? values[i] : 0);
	return {
		powerMw: sum * stepHz,
		startHz: startHz - stepHz,
		stopHz: startHz + points * stepHz,
		cumulative(frequencyHz) {
			const x = (frequencyHz - startHz) / stepHz;
			if (x <= -1) return 0;
			if (x >= points) return 1;
			const i = Math.floor(x);
			const share = x - i;
			const area = (i >= 0 ? below[i] : 0) + at(i) * share + ((at(i + 1) - at(i)) * share * share) / 2;
			return Math.min(1, area / sum);
		},
		densityMwPerHz(frequencyHz) {
			const x = (frequencyHz - startHz) / stepHz;
			const i = Math.floor(x);
			return at(i) + (at(i + 1) - at(i)) * (x - i);
		},
		kurtosis: 2,
		breaksHz: [startHz - stepHz, startHz + points * stepHz],
		shapeKey
	};
}
