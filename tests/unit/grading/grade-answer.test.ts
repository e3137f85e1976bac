import { numberFindings } from '../../factories/number-findings';
import { numberAnswers } from '$lib/server/bench/exercise/attempt-record';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { finding as findingSchema } from '$lib/schemas/finding';
import type { AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { judgeQuestion } from '$lib/server/bench/grading/judge-question';
import { withReading, withSettings } from '$lib/server/bench/grading/spoil';
import { watchedMistakes } from '$lib/server/bench/grading/watched-mistakes';
import { firstExercise } from '../../factories/first-exercise';

const drawn = drawExercise(firstExercise, 11);
const [power, density] = numberQuestions(drawn);
const taught = runMethod(drawn);
const lead = power.leadDb;

const grade = (record: AttemptRecord) => gradeAnswer({ drawn, ...record });
const answering = (record: AttemptRecord, value: number, readingId?: string): AttemptRecord => ({
	...record,
	answers: { ...record.answers, [power.id]: { value, readingId } }
});
/** The taught method with one mistake in it, made on the bench. */
const making = (id: string, question = power) => {
	const { mistake } = watchedMistakes(question).find((watched) => watched.id === id)!;
	return runMethod(drawn, mistake.make(drawn.method, { drawn, question })).record;
};
const named = (record: AttemptRecord, question = power) =>
	judgeQuestion(drawn, question, record).matched?.watched.map(({ id }) => id) ?? [];

describe('gradeAnswer on the taught method', () => {
	const finding = grade(taught.record);

	it('finds every answer right, by a method that can support it', () => {
		expect(finding.questions.map(({ verdict }) => verdict)).toEqual(['right', 'right']);
		expect(finding.questions.flatMap(({ mistakes }) => mistakes)).toEqual([]);
		expect(finding.log.flatMap(({ bad }) => bad ?? [])).toEqual([]);
		expect(finding.passed).toBe(true);
	});

	it('is the shape that crosses the wire', () =>
		expect(findingSchema.parse(JSON.parse(JSON.stringify(finding)))).toEqual(finding));

	it('says the same again from the same record', () =>
		expect(JSON.stringify(grade(taught.record))).toBe(JSON.stringify(finding)));

	it('plays the taught method on the learner’s own seed', () => {
		const readings = finding.doneRight.flatMap(({ value }) => value?.value ?? []);
		expect(readings).toContain(numberAnswers(taught.record)[power.id].value);
		expect(readings).toContain(numberAnswers(taught.record)[density.id].value);
	});

	it('draws the signal itself at the plane: a flat hump at its density times the noise bandwidth', () => {
		const { signal, band } = finding.questions[0].plot;
		const middle = signal!.levelsDbm[200];
		const symbolRateHz = drawn.parameters.symbolRateHz as number;
		// 10 lg(1.0645 × 300 Hz / symbol rate) under the carrier's power.
		expect(middle - power.truth).toBeCloseTo(10 * Math.log10((1.064467 * 300) / symbolRateHz), 1);
		expect(band).toMatchObject({ value: power.truth, unit: 'dBm' });
	});
});

describe.each(numberQuestions(drawn).map((question) => ({ question })))(
	'mistakes on $question.id',
	({ question }) => {
		it.each(watchedMistakes(question).map(({ id }) => id))(
			'%s: made on the bench, is wrong and named',
			(id) => {
				const record = making(id, question);
				const { questions, log, passed } = grade(record);
				const finding = questions.find((one) => one.id === question.id)!;
				expect(finding.verdict).toBe('wrong');
				expect(named(record, question)).toEqual([id]);
				expect(finding.mistakes).toHaveLength(1);
				expect(finding.mistakes[0].sum).toMatch(/\d/);
				expect(log.some(({ bad }) => bad?.startsWith('Here: '))).toBe(true);
				expect(passed).toBe(false);
			}
		);

		it.each(watchedMistakes(question).map(({ id }) => id))(
			'%s: the ladder leads from the answer to the truth',
			(id) => {
				const finding = numberFindings(grade(making(id, question))).find((one) => one.id === question.id)!;
				const { parts, yours } = finding.ladder!;
				const end = parts.reduce((level, { change }) => level + change, yours);
				expect(end).toBeCloseTo(question.truth, 6);
				expect(parts.at(-1)!.to).toBeCloseTo(question.truth, 6);
			}
		);

		it.each(watchedMistakes(question).map(({ id }) => id))(
			'%s: named without any reading, from the log alone',
			(id) => {
				const record = making(id, question);
				const { value } = numberAnswers(record)[question.id];
				expect(named({ ...record, readings: [], answers: { [question.id]: { value } } }, question)).toEqual([
					id
				]);
			}
		);
	}
);

describe('gradeAnswer on a marker read as the power', () => {
	const record = making('marker-as-power');
	const [finding] = numberFindings(grade(record));

	it('explains it with the learner’s own bandwidth', () => {
		const symbolRateHz = drawn.parameters.symbolRateHz as number;
		const missed = (10 * Math.log10(symbolRateHz / (1.064467 * 300))).toFixed(1);
		expect(finding.title).toBe('You read one point of the hump.');
		expect(finding.mistakes[0].text).toContain('300');
		expect(finding.mistakes[0].sum).toMatch(new RegExp(`^10 log \\(.+/319\\.3\\) = ${missed} dB$`));
	});

	it('names two mistakes when the lead is left out as well', () => {
		const { value, readingId } = numberAnswers(record)[power.id];
		const both = numberFindings(grade(answering(record, value - lead, readingId)))[0];
		expect(both.title).toBe('You read one point of the hump, and left the lead out.');
		expect(both.mistakes.map(({ kind }) => kind)).toEqual(['marker-as-power', 'lead-left-out']);
		expect(both.ladder!.parts.map(({ change }) => change)[1]).toBeCloseTo(lead, 9);
	});

	it('is named with the lead left out when it was copied off the screen, whatever vague set-ups were swept before', () => {
		// a set-up in passing, one sweep of a coarse filter: many mistakes would give almost any number there
		const wide = { ...drawn.brief.start, rbwHz: 30e3, detector: 'positive-peak' as const };
		const log = [
			{ settings: wide, firstRow: 0, sweeps: 1, clockS: 0 },
			...record.log.map((entry) => ({ ...entry, firstRow: entry.firstRow + 1 }))
		];
		const { value } = numberAnswers(record)[power.id];
		expect(named({ log, readings: [], answers: { [power.id]: { value: value - lead } } })).toEqual([
			'marker-as-power',
			'lead-left-out'
		]);
	});

	it('is ruled out for whoever read channel power', () => {
		const marked = numberAnswers(record)[power.id].value;
		const attached = numberAnswers(taught.record)[power.id].readingId;
		expect(named(answering(taught.record, marked, attached))).not.toContain('marker-as-power');
	});

	it('marks the step of the log where it was read', () => {
		const bad = grade(record).log.filter((step) => step.bad);
		expect(bad).toHaveLength(1);
		expect(bad[0].text).toMatch(/^Reading: marker/);
	});

	it('shows on the number line what each mistake would have given', () => {
		const { marks } = finding.numberLine;
		const matched = marks.filter((mark) => mark.matched);
		expect(matched.map(({ label }) => label)).toEqual(['one point']);
		expect(matched[0].value).toBeCloseTo(finding.yours!.value, 6);
		expect(marks.find(({ role }) => role === 'true')!.value).toBe(power.truth);
		expect(marks.filter(({ role }) => role === 'mistake')).toHaveLength(watchedMistakes(power).length);
	});
});

describe('gradeAnswer on the lead', () => {
	const uncorrected = runMethod(drawn, withSettings(drawn.method, { correctionDb: 0 })).record;
	const { value, readingId } = numberAnswers(uncorrected)[power.id];

	it('takes a loss added by hand for as good as one set as Correction', () =>
		expect(grade(answering(uncorrected, value + lead, readingId)).questions[0].verdict).toBe('right'));

	it('names the loss left out, and says what Correction was', () => {
		const [finding] = numberFindings(grade(answering(uncorrected, value, readingId)));
		expect(finding.title).toBe('You left the lead out.');
		expect(finding.mistakes[0].text).toContain('Correction was still at 0 dB');
	});

	it('names the loss taken off by hand', () =>
		expect(named(answering(uncorrected, value - lead, readingId))).toEqual(['lead-wrong-sign']));
});

describe('the lead added twice', () => {
	const question = { ...power, mistakes: [{ kind: 'lead-twice' }] };
	const [twice] = watchedMistakes(question);

	it('is named when Correction holds the loss and it is added by hand once more', () => {
		const record = runMethod(drawn, twice.mistake.make(drawn.method, { drawn, question })).record;
		expect(numberAnswers(record)[power.id].value - numberAnswers(taught.record)[power.id].value).toBeCloseTo(
			lead,
			9
		);
		expect(judgeQuestion(drawn, question, record).matched?.watched.map(({ id }) => id)).toEqual([
			'lead-twice'
		]);
	});
});

describe('gradeAnswer on density', () => {
	it('names a marker on an average of decibels, divided by the resolution bandwidth', () => {
		const careful = withSettings(drawn.method, {
			scale: 'log',
			traces: [{ mode: 'average', count: 120 }]
		}).map((step) => (step.do === 'sweep' ? { ...step, sweeps: 120 } : step));
		const marker = { kind: 'marker', atHz: density.frequencyHz } as const;
		const divided = (value: number) => value - 10 * Math.log10(300);
		const record = runMethod(drawn, withReading(careful, density.id, marker, divided)).record;
		expect(named(record, density)).toEqual(['log-density']);
		expect(grade(record).questions[1].mistakes[0].sum).toContain(' + 2.51 − 0.27 = ');
	});
});

describe('gradeAnswer on a right number', () => {
	it('says so when it rests on decibels averaged', () => {
		const record = making('log-average');
		const { readingId } = numberAnswers(record)[power.id];
		// The level error of this receiver and half a decibel of luck bring it within the tolerance.
		const lucky = answering(record, power.truth - 0.9, readingId);
		const [finding] = numberFindings(grade(lucky));
		expect(finding.verdict).toBe('right-but-method');
	});

	it('says so when the reading attached is of something else', () => {
		const record = making('marker-as-power');
		const [finding] = numberFindings(
			grade(answering(record, power.truth, numberAnswers(record)[power.id].readingId))
		);
		expect(finding.verdict).toBe('right-but-method');
		expect(finding.remarks.map(({ code }) => code)).toContain('not-from-evidence');
	});

	it('says so when nothing was read at all', () => {
		const [finding] = numberFindings(
			grade({
				...taught.record,
				readings: [],
				answers: { [power.id]: { value: power.truth } }
			})
		);
		expect(finding.verdict).toBe('right-but-method');
		expect(finding.remarks.map(({ code }) => code)).toEqual(['no-evidence']);
	});

	it('finds the reading itself when none was attached', () => {
		const { value } = numberAnswers(taught.record)[power.id];
		expect(grade(answering(taught.record, value)).questions[0].verdict).toBe('right');
	});
});

describe('gradeAnswer on everything else', () => {
	it('leaves a question without an answer unanswered', () => {
		const finding = grade({ ...taught.record, answers: {} });
		expect(finding.questions.map(({ verdict }) => verdict)).toEqual(['unanswered', 'unanswered']);
		expect(finding.passed).toBe(false);
	});

	it('names nothing when no mistake gives the number', () => {
		const [finding] = numberFindings(grade(answering(taught.record, power.truth + 30, undefined)));
		expect(finding.verdict).toBe('wrong');
		expect(finding.mistakes).toEqual([]);
		expect(finding.title).toContain('30.0 dB too high');
		expect(finding.ladder!.parts).toEqual([
			expect.objectContaining({ from: power.truth + 30, to: power.truth, text: 'not explained' })
		]);
	});

	it('takes no reading of rows that nobody swept for evidence', () => {
		const [finding] = numberFindings(grade({ ...taught.record, log: [] }));
		expect(finding.remarks.map(({ code }) => code)).toEqual(['no-evidence']);
	});

	it('judges an attempt in which nothing was swept', () => {
		const finding = grade({ log: [], readings: [], answers: { [power.id]: { value: -50 } } });
		expect(finding.questions[0].verdict).toBe('wrong');
		expect(finding.questions[0].plot.signal).toBeNull();
	});
});
