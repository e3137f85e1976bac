/** The lessons of units 4 and 5: their length, and that turning a figure's controls shows what its caption says. */
import { describe, expect, it } from 'vitest';
import { computeFigure } from '$lib/server/bench/figure/compute-figure';
import type { FigureChoice } from '$lib/schemas/figure';
import { readContent } from '$lib/server/content/read-content';

const units = readContent('content').flatMap((course) => course.units);
const unit = (slug: string) => units.find((one) => one.slug === slug)!;
const figureOf = (slug: string, id: string) => unit(slug).figures.find((figure) => figure.id === id)!;
/** First reading of a figure with its controls turned, in order. */
const reads = (slug: string, id: string, values: FigureChoice[], nth = 0): number => {
	const reading = computeFigure(figureOf(slug, id), values).readings[nth];
	if (!('value' in reading)) throw new Error(`${id}: no number`);
	return reading.value;
};

describe.each(['the-floor', 'detectors-and-traces'])('%s', (slug) => {
	const prose = unit(slug).lessonMarkdown.replace(/```[\s\S]*?```/g, '');

	it('is 400 to 900 words long', () => {
		const words = prose.split(/\s+/).filter((word) => /\w/.test(word)).length;
		expect(words).toBeGreaterThanOrEqual(400);
		expect(words).toBeLessThanOrEqual(900);
	});

	it('has at least two live figures', () => expect(unit(slug).figures.length).toBeGreaterThanOrEqual(2));
});

describe('floor-attenuator-preamplifier', () => {
	const at = (...values: FigureChoice[]) => reads('the-floor', 'floor-attenuator-preamplifier', values, 1);

	it('climbs 10 dB for 10 dB of attenuation, and falls 14.5 dB with the preamplifier', () => {
		expect(at(10, false, 1000) - at(0, false, 1000)).toBeCloseTo(10, 0);
		expect(Math.abs(at(0, true, 1000) - at(0, false, 1000) + 14.5)).toBeLessThan(0.4);
	});
});

describe('whose-noise', () => {
	it('falls when the load takes the antenna’s place, by what the antenna adds', () => {
		const noise = (connected: boolean) => reads('the-floor', 'whose-noise', [connected, 1000, 'power']);
		// −163.5 beside −165.9 dBm/Hz: 10 lg(1 + 10^0.24) = 4.4 dB.
		expect(Math.abs(noise(true) - noise(false) - 4.4)).toBeLessThan(0.8);
	});
});

describe('detectors-on-noise', () => {
	const power = (detector: string, mode: string) =>
		reads('detectors-and-traces', 'detectors-on-noise', [detector, mode, 'power']);

	it('reads −112 dBm/Hz over 1.2 MHz when it averages, more and less when it doesn’t', () => {
		const mean = -112 + 10 * Math.log10(1.2e6);
		// The receiver of a figure has a level error of its own, 0.7 dB at most.
		expect(Math.abs(power('average', 'average') - mean)).toBeLessThan(0.9);
		expect(power('positive-peak', 'max-hold') - power('average', 'average')).toBeGreaterThan(6);
		expect(power('negative-peak', 'min-hold') - power('average', 'average')).toBeLessThan(-10);
	});
});

describe('burst-over-a-steady-carrier', () => {
	const level = (mode: string) =>
		reads('detectors-and-traces', 'burst-over-a-steady-carrier', [mode, 'auto']);

	it('finds the burst with a held maximum and the carrier with a held minimum, 30 dB beneath', () =>
		expect(Math.abs(level('max-hold') - level('min-hold') - 30)).toBeLessThan(1.5));

	it('shows neither with an average over both', () => {
		expect(level('average')).toBeLessThan(level('max-hold') - 10);
		expect(level('average')).toBeGreaterThan(level('min-hold') + 10);
	});
});
