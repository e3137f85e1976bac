/** Traces with known contents, for tests of readings. */
import seedrandom from 'seedrandom';
import { combineRows } from '$lib/measure/combine-rows';
import { filterLossDb, noiseBandwidthHz } from '$lib/measure/resolution-filter';
import type { Trace } from '$lib/measure/trace';

type Setup = Partial<Omit<Trace, 'levelsDbm'>> & { points?: number };

const toMw = (db: number) => 10 ** (db / 10);
const toDb = (mw: number) => 10 * Math.log10(mw);

/** A clean trace, 1 MHz wide at 100 MHz unless told otherwise, of what `levelOf` says at each frequency (or, in span 0, time). */
export function buildTrace(setup: Setup, levelOf: (place: number) => number): Trace {
	const { points = 1001, ...rest } = setup;
	const trace: Trace = {
		startHz: 99.5e6,
		stopHz: 100.5e6,
		rbwHz: 10e3,
		detector: 'sample',
		scale: 'log',
		...rest,
		levelsDbm: []
	};
	const zeroSpan = trace.startHz === trace.stopHz;
	const step = zeroSpan ? trace.sweepTimeS! / (points - 1) : (trace.stopHz - trace.startHz) / (points - 1);
	const from = zeroSpan ? 0 : trace.startHz;
	return { ...trace, levelsDbm: Array.from({ length: points }, (_, i) => levelOf(from + i * step)) };
}

/** Lines through the Gaussian filter, powers added, over a floor. */
export function buildLines(
	setup: Setup & { rbwHz: number },
	lines: { frequencyHz: number; levelDbm: number }[],
	floorDbm = -120
): Trace {
	return buildTrace(setup, (frequencyHz) =>
		toDb(
			lines.reduce(
				(sum, line) => sum + toMw(line.levelDbm - filterLossDb(frequencyHz - line.frequencyHz, setup.rbwHz)),
				toMw(floorDbm)
			)
		)
	);
}

/** A density of `totalDbm` with shape `shape` (∫ shape df = 1) seen through the Gaussian filter, by quadrature. */
export function buildDensity(
	setup: Setup & { rbwHz: number },
	totalDbm: number,
	shape: (frequencyHz: number) => number,
	floorDbm = -160
): Trace {
	const { rbwHz } = setup;
	const stepHz = rbwHz / 40;
	return buildTrace(setup, (frequencyHz) => {
		let seen = 0;
		for (let k = -120; k <= 120; k++)
			seen += shape(frequencyHz + k * stepHz) * 2 ** -((k / 20) ** 2) * stepHz;
		return toDb(toMw(totalDbm) * seen + toMw(floorDbm));
	});
}

/** Root-raised-cosine spectrum about `centreHz`, integral 1. */
export function raisedCosineDensity(centreHz: number, symbolRateHz: number, rollOff: number) {
	return (frequencyHz: number): number => {
		const x = Math.abs(frequencyHz - centreHz) / symbolRateHz;
		const flat = (1 - rollOff) / 2;
		if (x <= flat) return 1 / symbolRateHz;
		if (x >= (1 + rollOff) / 2) return 0;
		return (1 + Math.cos((Math.PI * (x - flat)) / rollOff)) / 2 / symbolRateHz;
	};
}

/** Independent values in a bucket of B·Δt = 4: 1.5054 · 4. */
const BUCKET_VALUES = 6;

/** What a detector makes of the powers in the bucket of point `index`. */
function detect(detector: Trace['detector'], powers: number[], index: number): number {
	if (detector === 'average') return powers.reduce((a, b) => a + b, 0) / powers.length;
	if (detector === 'sample') return powers[0];
	const peak = detector === 'positive-peak' || (detector === 'rise-fall' && index % 2 === 0);
	return peak ? Math.max(...powers) : Math.min(...powers);
}

/**
 * Noise of `densityDbmPerHz`, points far enough apart in time (B·Δt = 4) to know nothing of each other: exponentials of the mean
 * power, six to a bucket (the average detector on the power scale); `extraDbm` adds power that fluctuates alike.
 */
export function buildNoise(
	seed: string,
	setup: Setup & { rbwHz: number; rows?: number },
	densityDbmPerHz: number,
	extraDbm: (frequencyHz: number) => number = () => -300
): Trace {
	const { rows: rowCount = 1, ...rest } = setup;
	const draw = seedrandom(seed);
	const meanDbm = densityDbmPerHz + toDb(noiseBandwidthHz(setup.rbwHz));
	const points = setup.points ?? 1001;
	const sweepTimeS = (4 * (points - 1)) / setup.rbwHz;
	const clean = buildTrace({ sweepTimeS, ...rest }, (frequencyHz) =>
		toDb(toMw(meanDbm) + toMw(extraDbm(frequencyHz)))
	);
	const bucketValues = clean.detector === 'sample' ? 1 : BUCKET_VALUES;
	const bucket = () => Array.from({ length: bucketValues }, () => -Math.log(1 - draw()));
	const rows = Array.from({ length: rowCount }, () =>
		Array.from(clean.levelsDbm, (levelDbm, i) => levelDbm + toDb(detect(clean.detector, bucket(), i)))
	);
	const mode = rest.mode ?? (rowCount > 1 ? 'average' : 'live');
	return { ...clean, mode, count: rowCount, levelsDbm: combineRows(rows, mode, rowCount, clean.scale) };
}

/** Mean and standard deviation of what `take` gives for many seeds. */
export function overSeeds(
	count: number,
	take: (seed: string) => number
): { mean: number; deviation: number } {
	const values = Array.from({ length: count }, (_, i) => take(`seed ${i}`));
	const mean = values.reduce((a, b) => a + b, 0) / count;
	const deviation = Math.sqrt(values.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (count - 1));
	return { mean, deviation };
}
