import { describe, expect, it } from 'vitest';
import { stringify } from 'yaml';
import { figureState } from '$lib/schemas/figure-view';
import { allValues, startValues } from '$lib/server/bench/figure/choices';
import { computeFigure } from '$lib/server/bench/figure/compute-figure';
import { parseFigureText } from '$lib/server/bench/figure/parse-figure';
import { writtenFigure } from '../../factories/figure';

const figure = (over: Parameters<typeof writtenFigure>[0] = {}) =>
	parseFigureText(stringify(writtenFigure(over)));
const valueOf = (outcome: object): number => ('value' in outcome ? Number(outcome.value) : NaN);

describe('computeFigure(figure, values)', () => {
	it('gives what its schema says, the same each time', () => {
		const made = computeFigure(figure(), [300]);
		expect(figureState.parse(made)).toEqual(made);
		expect(computeFigure(figure(), [300])).toEqual(made);
		expect(made.traces).toHaveLength(1);
		expect(made.traces[0].levelsDbm).toHaveLength(201);
	});

	it('turns what the control says: the hump climbs with the filter, the channel’s power stays', () => {
		const [narrow, wide] = [[300], [3000]].map((values) => computeFigure(figure(), values));
		expect([narrow.resolved.rbwHz, wide.resolved.rbwHz]).toEqual([300, 3000]);
		const middle = (state: typeof narrow) => {
			const levels = state.traces[0].levelsDbm.slice(80, 121).map((level) => 10 ** (level / 10));
			return 10 * Math.log10(levels.reduce((sum, level) => sum + level, 0) / levels.length);
		};
		// Ten times the filter holds ten times the noise-like power: theory.
		expect(Math.abs(middle(wide) - middle(narrow) - 10)).toBeLessThan(1.5);
		expect(Math.abs(valueOf(wide.readings[0]) - valueOf(narrow.readings[0]))).toBeLessThan(1.5);
	});

	it('holds over all its sweeps when the trace does', () => {
		const held = figure({
			controls: [{ setting: 'traceMode', label: 'Trace', choices: ['live', 'max-hold', 'min-hold'] }],
			sweeps: 8
		});
		const [live, high, low] = allValues(held).map(
			(values) => computeFigure(held, values).traces[0].levelsDbm
		);
		expect(live.every((level, i) => low[i] <= level && level <= high[i])).toBe(true);
		expect(high).not.toEqual(live);
	});

	it('shows no trace and no reading when the input has protected itself, and says so', () => {
		const harmful = figure({
			scene: { emitters: [{ kind: 'cw', frequencyHz: 450e6, levelDbm: 40 }] },
			controls: [{ setting: 'padDb', label: 'Pad', choices: [0, 30] }]
		});
		expect(startValues(harmful)).toEqual([0]);
		const tripped = computeFigure(harmful, [0]);
		expect(tripped).toMatchObject({ traces: [], readings: [] });
		expect(tripped.flags.map(({ kind }) => kind)).toContain('input-protection');
		expect(computeFigure(harmful, [30]).traces).toHaveLength(1);
	});

	it('takes the scene off the input when the reader does', () => {
		const loose = figure({
			controls: [{ setting: 'connected', label: 'Input', choices: [true, false] }],
			readings: [{ kind: 'peak' }]
		});
		const [on, off] = [true, false].map((value) => valueOf(computeFigure(loose, [value]).readings[0]));
		expect(on - off).toBeGreaterThan(40);
	});
});
