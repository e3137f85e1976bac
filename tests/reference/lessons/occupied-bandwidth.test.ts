/** The numbers worked out in the lesson "Occupied bandwidth", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { takeReading } from '$lib/measure/take-reading';
import type { ReadingRequest } from '$lib/measure/reading-request';
import type { Emitter } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { shownTrace } from '$lib/server/bench/grading/shown-trace';
import { floorDensity } from '$lib/server/bench/receiver/front-end/floor';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { truth } from '$lib/server/bench/truth/truth';
import { milliwattsToDbm } from '$lib/units/decibel';

const carrierHz = 450.0125e6;
const carrier = (levelDbm: number, frequencyHz = carrierHz): Emitter => ({
	kind: 'digital',
	frequencyHz,
	levelDbm,
	symbolRateHz: 10e3,
	rollOff: 0.25,
	order: 4
});
const ninetyNine = { kind: 'occupied-bandwidth', percent: 99 } as const;
const inChannel = { ...ninetyNine, centreHz: carrierHz, widthHz: 25e3 };

/** What the field receiver shows on average, read. */
function shown(emitters: Emitter[], settings: Settings, request: ReadingRequest): number {
	const resolved = resolveSettings({ centreHz: carrierHz, points: 1001, rbwHz: 300, ...settings }, field);
	const reading = takeReading(shownTrace({ scene: { emitters }, seed: 1 }, field, resolved), request);
	return 'value' in reading ? reading.value : NaN;
}
const floorDbmPerHz = (attenuationDb: number): number =>
	milliwattsToDbm(floorDensity(field, { attenuationDb, preamp: false })(450e6));

describe('the lesson on occupied bandwidth', () => {
	it.each([
		[{ kind: 'x-db-bandwidth', db: 3.0103 }, 1.0],
		[ninetyNine, 1.103],
		[{ kind: 'x-db-bandwidth', db: 26 }, 1.234],
		[{ kind: 'x-db-bandwidth', db: 120 }, 1.25]
	] as const)('%o of roll-off 0.25 is %d symbol rates wide', (quantity, rates) =>
		expect(truth({ emitters: [carrier(0)] }, quantity).value / 10e3).toBeCloseTo(rates, 3)
	);

	it.each([
		[300, 11.07],
		[1000, 11.5],
		[3000, 13.9]
	])('a resolution of %d Hz shows %d kHz', (rbwHz, widthKHz) => {
		const settings = { spanHz: 40e3, rbwHz, points: 401 };
		const digits = widthKHz === 11.07 ? 2 : 1;
		expect(shown([carrier(-20)], settings, inChannel) / 1e3).toBeCloseTo(widthKHz, digits);
	});

	it('with a neighbour 8 dB stronger in view, 99 % reach over both: about 35 kHz', () => {
		const both = [carrier(-20), carrier(-12, carrierHz + 25e3)];
		expect(shown(both, { spanHz: 100e3 }, ninetyNine) / 1e3).toBeCloseTo(35.3, 1);
		expect(shown(both, { spanHz: 100e3 }, inChannel) / 1e3).toBeCloseTo(11.1, 1);
	});

	it('the floor is −151.3 dBm/Hz, behind 40 dB −111.3: in 100 kHz 2.3 % of what is in view', () => {
		expect(floorDbmPerHz(0)).toBeCloseTo(-151.3, 1);
		const noiseDbm = floorDbmPerHz(40) + 50;
		expect(noiseDbm).toBeCloseTo(-61.3, 1);
		const share = 10 ** (noiseDbm / 10) / (10 ** (noiseDbm / 10) + 10 ** -4.5);
		expect(100 * share).toBeCloseTo(2.3, 1);
	});

	it('that reads 57 kHz; without attenuation, in a 25 kHz window, 11.1 kHz', () => {
		const careless = { spanHz: 100e3, attenuationDb: 40 };
		expect(shown([carrier(-45)], careless, ninetyNine) / 1e3).toBeCloseTo(57, 0);
		expect(floorDbmPerHz(0) + 10 * Math.log10(25e3)).toBeCloseTo(-107.3, 1);
		expect(shown([carrier(-45)], { spanHz: 40e3, attenuationDb: 0 }, inChannel) / 1e3).toBeCloseTo(11.1, 1);
	});

	it('11.0 kHz wide and 1.5 kHz off reaches 7.0 kHz above the centre', () => {
		const { parts } = truth({ emitters: [carrier(0, carrierHz + 1500)] }, inChannel);
		expect(((parts as { upperHz: number }).upperHz - carrierHz) / 1e3).toBeCloseTo(7.0, 1);
	});
});
