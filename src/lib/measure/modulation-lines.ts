/** The lines of a carrier modulated by one tone: carrier and pairs at multiples of the modulating frequency. */
import { findLine, type SpectralLine } from './find-line';
import { lineSpacing } from './line-spacing';
import { linesOf } from './line-spectrum';
import { needsSpan, noNumber, type NoNumber, outsideTrace } from './reader';
import { covers, isZeroSpan, stepHz, type Trace } from './trace';

export interface ModulationLines {
	carrierHz: number;
	modulatingHz: number;
	/** Deviation of the modulating frequency, from how far apart the points stand. */
	modulatingSpreadHz: number;
	/** At carrier ± n·modulating frequency, n from 0; undefined beyond the trace. */
	pairs: { lower?: SpectralLine; upper?: SpectralLine }[];
	/** Highest n at which a line stands out of the noise. */
	lastFound: number;
}

/** Lines are taken from the strongest down to the weakest that still keep to one spacing: noise does not. */
const REACHES_DB = [50, 40, 30, 20];

export function modulationLines(trace: Trace, carrierHz: number): ModulationLines | NoNumber {
	if (isZeroSpan(trace)) return needsSpan();
	if (!covers(trace, carrierHz)) return outsideTrace('The carrier');
	const toleranceHz = Math.max(stepHz(trace), trace.rbwHz / 10);
	for (const reachDb of REACHES_DB) {
		const lines = linesOf(trace, reachDb);
		const grid = lines.length < 2 ? null : lineSpacing(lines, carrierHz, toleranceHz);
		if (grid) return collect(trace, lines, grid.carrierHz, grid.spacingHz);
	}
	return noNumber(
		'No sidebands stand apart around the carrier.',
		'a resolution bandwidth below half the modulating frequency, and a span that holds the sidebands'
	);
}

function collect(
	trace: Trace,
	lines: SpectralLine[],
	carrierHz: number,
	modulatingHz: number
): ModulationLines {
	const numbers = lines.map(({ frequencyHz }) => Math.round((frequencyHz - carrierHz) / modulatingHz));
	const lastFound = Math.max(...numbers.map(Math.abs));
	const reachHz = Math.min(modulatingHz / 4, Math.max(stepHz(trace), trace.rbwHz / 4));
	const at = (frequencyHz: number) =>
		covers(trace, frequencyHz) ? findLine(trace, frequencyHz, reachHz) : undefined;
	const pairs: ModulationLines['pairs'] = [];
	// Two more than were found: that there is nothing says as much as a line.
	for (let n = 0; n <= lastFound + 2; n++) {
		const pair = { lower: at(carrierHz - n * modulatingHz), upper: at(carrierHz + n * modulatingHz) };
		if (!pair.lower && !pair.upper) break;
		pairs.push(pair);
	}
	const mean = numbers.reduce((a, b) => a + b, 0) / numbers.length;
	const lever = Math.hypot(...numbers.map((n) => n - mean));
	return {
		carrierHz,
		modulatingHz,
		modulatingSpreadHz: stepHz(trace) / Math.sqrt(12) / lever,
		pairs,
		lastFound
	};
}
