import { numberFindings } from '../../factories/number-findings';
import { numberAnswers } from '$lib/server/bench/exercise/attempt-record';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { finding as findingSchema } from '$lib/schemas/finding';
import type { BenchRequest } from '$lib/schemas/reading';
import type { Settings } from '$lib/schemas/settings';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import type { FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { copyingReach, copyingSpread, modelSpread, shownDigits } from '$lib/server/bench/grading/spreads';
import { drawReceiverError } from '$lib/server/bench/receiver/receiver-error';
import { twoCarriers } from '../../factories/two-carriers';

// Every mistake of these questions changes nothing: no draw keeps them apart from one another, and none is needed.
const drawn = drawExercise(twoCarriers, 3);
const { lowHz, highHz, apartHz } = drawn.parameters as Record<string, number>;
const played = runMethod(drawn);
const question = (id: string) => numberQuestions(drawn).find((one) => one.id === id)!;

/** The verdict on `value` for a question, from one reading taken with the taught set-up and these changes. */
function verdict(
	id: string,
	request: BenchRequest,
	value: (read: number) => number,
	settings: Settings = {}
) {
	const steps: FilledStep[] = [
		...drawn.method.filter(({ do: what }) => what === 'set'),
		{ do: 'set', settings },
		{ do: 'sweep', sweeps: 8 },
		{
			do: 'read',
			reading: request,
			part: request.kind === 'delta' ? 'frequencyHz' : undefined,
			trace: 1,
			as: 'x'
		},
		{ do: 'answer', question: id, value: ({ x }) => value(x as number), reading: 'x' }
	];
	const { record } = runMethod(drawn, steps);
	return gradeAnswer({ drawn, ...record }).questions.find((one) => one.id === id)!.verdict;
}

describe('a question about a part', () => {
	it('has the part as its truth, in the part’s unit', () => {
		expect(question('apart')).toMatchObject({ unit: 'Hz', truth: apartHz });
		expect(question('beside').unit).toBe('dBc');
	});

	it('is answered by the taught method, count and all', () => {
		const { questions } = gradeAnswer({ drawn, ...played.record });
		expect(questions.map(({ id, verdict }) => [id, verdict])).toEqual(
			['apart', 'where', 'beside', 'occupied'].map((id) => [id, 'right'])
		);
	});

	it('takes a distance read downwards for the same', () =>
		expect(verdict('apart', { kind: 'delta', fromHz: highHz, toHz: lowHz }, Math.abs)).toBe('right'));

	it('is not carried by a delta to somewhere else', () =>
		expect(verdict('apart', { kind: 'delta', fromHz: lowHz, toHz: 450.2e6 }, () => apartHz)).toBe(
			'right-but-method'
		));

	it('is not carried by points too far apart for its tolerance', () =>
		expect(
			verdict('apart', { kind: 'delta', fromHz: lowHz, toHz: highHz }, () => apartHz, { points: 101 })
		).toBe('right-but-method'));
});

describe('a question about a frequency', () => {
	const marker: BenchRequest = { kind: 'marker', atHz: lowHz };

	it('is off by the receiver’s own reference when counted: true × (1 + ε)', () => {
		const { value } = numberAnswers(played.record).where;
		const { frequency } = drawReceiverError(drawn.profile, drawn.seed);
		expect(value).toBeCloseTo(lowHz * (1 + frequency), 0);
	});

	it('is carried by a marker where the points are near enough', () =>
		expect(verdict('where', marker, () => lowHz)).toBe('right'));

	it('is not carried by a marker where they aren’t', () =>
		expect(verdict('where', marker, () => lowHz, { spanHz: 2e6 })).toBe('right-but-method'));

	it('is not carried by a count of the other carrier', () =>
		expect(verdict('where', { kind: 'count', atHz: highHz, gateS: 0.1 }, () => lowHz)).toBe(
			'right-but-method'
		));
});

describe('a question about a width', () => {
	const asked = { kind: 'occupied-bandwidth', centreHz: 450.2e6, widthHz: 40e3, percent: 99 } as const;
	const { truth } = question('occupied');

	it('is copied with three significant digits', () =>
		expect(verdict('occupied', asked, (read) => Number(read.toPrecision(3)))).toBe('right'));

	it('is not carried by another percentage', () =>
		expect(verdict('occupied', { ...asked, percent: 90 }, () => truth)).toBe('right-but-method'));

	it('is not carried by a window that doesn’t hold it', () =>
		expect(verdict('occupied', { ...asked, centreHz: 450e6 }, () => truth)).toBe('right-but-method'));
});

describe('a question about one neighbouring channel', () => {
	const asked = { kind: 'adjacent-channel', centreHz: 450.2e6, widthHz: 16e3 } as const;
	const offset = { offsetHz: 25e3, widthHz: 16e3 };
	const besideOf = (offsets: (typeof offset)[]) => verdict('beside', { ...asked, offsets }, (read) => read);

	it('may be read with others beside it', () =>
		expect(besideOf([offset, { offsetHz: 50e3, widthHz: 16e3 }])).toMatch(/^right/));

	it('is not carried by a reading of other offsets', () =>
		expect(besideOf([{ offsetHz: 50e3, widthHz: 16e3 }])).toBe('right-but-method'));
});

describe('a count on the bench', () => {
	it('takes a row number of its own and the time of its gate', () => {
		const counted = played.record.readings.at(-1)!;
		expect(counted).toMatchObject({ request: { kind: 'count' }, rows: { from: 8, to: 8 }, trace: 1 });
		const again = runMethod(drawn, [...drawn.method, { do: 'sweep', sweeps: 1 }]).record.log.at(-1)!;
		const entry = played.record.log.at(-1)!;
		expect(again.firstRow).toBe(9);
		expect(again.clockS - entry.clockS).toBeCloseTo(0.1, 9);
	});

	it('is a step of what was done, with its gate', () => {
		const { log } = gradeAnswer({ drawn, ...played.record });
		const steps = log.map(({ text }) => text);
		expect(steps.filter((text) => text.startsWith('Reading: frequency count, at '))).toHaveLength(1);
		expect(steps.find((text) => text.startsWith('Reading: frequency count'))).toContain('gate 100');
		expect(steps).not.toContain('Swept again');
	});
});

describe('gradeAnswer on what isn’t a level', () => {
	const finding = gradeAnswer({
		drawn,
		...played.record,
		answers: { ...played.record.answers, apart: { value: 55e3 } }
	});

	it('is the shape that crosses the wire', () =>
		expect(findingSchema.parse(JSON.parse(JSON.stringify(finding)))).toEqual(finding));

	it('says how far off in the unit that suits it', () =>
		expect(finding.questions[0].title).toMatch(/^Your number is \d\d(\.\d+)?\u00a0kHz too high/));

	it('shows no digit that the tolerance swallows', () =>
		// 600 Hz allowed: tens of hertz.
		expect(numberFindings(finding)[0].true.digits).toBe(-1));
});

describe('spreads of a question', () => {
	const level = { unit: 'dBm', digits: 1, tolerance: 1, truth: -20 } as const;
	const width = { unit: 'Hz', digits: 0, tolerance: 500, truth: 20e3 } as const;

	it('are tenths of a decibel for levels', () => {
		expect(modelSpread(level)).toBe(0.1);
		expect(copyingReach(level)).toBe(0.55);
	});

	it('let three significant digits through, within three spreads', () => {
		// 20.05 kHz typed as 20.1 kHz
		expect(copyingReach(width)).toBeGreaterThan(50);
		expect(3 * copyingSpread(width)).toBeGreaterThan(50);
	});

	it('don’t let three digits of a carrier’s frequency pass for a count', () => {
		const counted = { unit: 'Hz', digits: 0, tolerance: 10, truth: 450e6 } as const;
		expect(copyingReach(counted)).toBeLessThan(10);
		expect(shownDigits(counted)).toBe(0);
	});
});
