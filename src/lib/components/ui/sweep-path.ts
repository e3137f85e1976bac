/**
 * The w of the wordmark: one sweep over two shoulders and a carrier, as Gaussians of x in 0…1 across the letter,
 * y = X (g(0) + g(1)) + 1.34 X g(½), standard deviations 0.125 and 0.098, where X is the height of a shoulder.
 */
export const SWEEP_WIDTH = 104;
export const SWEEP_HEIGHT = 88;
export const SWEEP_STROKE = 13.5;

const SHOULDER_HEIGHT = 64;
const STEPS = 48;

const gaussian = (x: number, centre: number, deviation: number): number =>
	Math.exp(-0.5 * ((x - centre) / deviation) ** 2);

const heightAt = (x: number): number =>
	SHOULDER_HEIGHT * (gaussian(x, 0, 0.125) + gaussian(x, 1, 0.125) + 1.34 * gaussian(x, 0.5, 0.098));

/** SVG path of the w's centre line in a box of SWEEP_WIDTH × SWEEP_HEIGHT, stroke included; coordinates to 0.01. */
export function sweepPath(): string {
	const margin = SWEEP_STROKE / 2;
	const heights = Array.from({ length: STEPS + 1 }, (_, i) => heightAt(i / STEPS));
	const lowest = Math.min(...heights);
	return heights
		.map((height, i) => {
			const x = margin + (i / STEPS) * (SWEEP_WIDTH - SWEEP_STROKE);
			const y = SWEEP_HEIGHT - margin - (height - lowest);
			return `${i === 0 ? 'M' : 'L'}${x.toFixed(2)} ${y.toFixed(2)}`;
		})
		.join('');
}
