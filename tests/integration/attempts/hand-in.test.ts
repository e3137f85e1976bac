import { numberFindings } from '../../factories/number-findings';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { finding as findingSchema } from '$lib/schemas/finding';
import type { Settings } from '$lib/schemas/settings';
import { Answer } from '$lib/server/db/models/answer';
import { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import type { Actor } from '$lib/server/domain/role';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { getFinding } from '$lib/server/services/attempts/get-finding';
import { handIn } from '$lib/server/services/attempts/hand-in';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import { createAttempt, secretsOf, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = {
	centreHz: 450e6,
	spanHz: 1e6,
	rbwHz: 10e3,
	points: 501,
	detector: 'average',
	scale: 'power',
	traces: [{ mode: 'average', count: 16 }]
};
const counts = async (attemptId: number) => [
	await Answer.count({ where: { attemptId } }),
	await Finding.count({ where: { attemptId } })
];

/** Sweeps as taught and reads the channel's power. */
async function readPower(actor: Actor, attemptId: number, correctionDb: number) {
	await sweep(actor, attemptId, { ...settings, correctionDb }, { sweeps: 16 });
	await acknowledgeRows(actor, attemptId, { row: 15 });
	const request = { kind: 'channel-power' as const, centreHz: 450e6, widthHz: 200e3 };
	const asked = { rows: { from: 0, to: 15 }, trace: 1, request };
	return (await takeReading(actor, attemptId, asked, now)).reading;
}
/** Starts to watch; the longest time that nothing else could be done on this thread, ms, once asked. */
function longestStandstill(): () => number {
	let last = performance.now();
	let longest = 0;
	const timer = setInterval(() => {
		longest = Math.max(longest, performance.now() - last);
		last = performance.now();
	}, 5);
	return () => {
		clearInterval(timer);
		return longest;
	};
}
const typed = (text: string, unit = 'dBm', readingId?: number) => ({
	type: 'number' as const,
	text,
	unit,
	readingId
});

describe('handIn(actor, attemptId, {answers}, now)', () => {
	it('finds a right answer right, keeps what it found, and closes the attempt', async () => {
		const { actor, attempt } = await createAttempt();
		const { drawn } = await secretsOf(attempt.id);
		const { id, value } = await readPower(actor, attempt.id, numberQuestions(drawn)[0].leadDb);
		const power = typed(`${value.toFixed(2)} dBm`, 'dBm', id);
		const { finding } = await handIn(actor, attempt.id, { answers: { power } }, now);
		expect(findingSchema.parse(finding)).toEqual(finding);
		expect(finding.questions[0]).toMatchObject({ id: 'power', verdict: 'right' });
		expect(numberFindings(finding)[0].true.value).toBe(numberQuestions(drawn)[0].truth);
		expect(finding.questions[1]).toMatchObject({ id: 'width', verdict: 'unanswered' });
		expect(await Attempt.findByPk(attempt.id)).toMatchObject({ closedAt: now, streamToken: null });
		const [answer] = await Answer.findAll({ where: { attemptId: attempt.id } });
		expect(answer).toMatchObject({ question: 'power', text: power.text, readingId: id, verdict: 'right' });
		expect(await getFinding(actor, attempt.id)).toEqual({ finding });
	});

	it('names the mistake that was made', async () => {
		const { actor, attempt } = await createAttempt();
		const { id, value } = await readPower(actor, attempt.id, 0);
		const answers = { power: typed(value.toFixed(1), 'dBm', id) };
		const { finding } = await handIn(actor, attempt.id, { answers }, now);
		expect(finding.questions[0].verdict).toBe('wrong');
		expect(finding.questions[0].mistakes.map(({ kind }) => kind)).toEqual(['lead-left-out']);
		expect(finding.passed).toBe(false);
		const [answer] = await Answer.findAll({ where: { attemptId: attempt.id } });
		expect(answer.mistakes).toEqual(['lead-left-out']);
	});

	it.each([
		['−23,6', 'dBm', -23.6],
		['-23.6 dBm', 'dBm', -23.6],
		['4.365 µW', 'dBm', -23.6],
		['4.365', 'µW', -23.6],
		['83.39 dBµV', 'dBm', -23.6]
	])('reads %s (%s) as people mean it', async (text, unit, value) => {
		const { actor, attempt } = await createAttempt();
		await handIn(actor, attempt.id, { answers: { power: typed(text, unit) } }, now);
		const answer = await Answer.findOne({ where: { attemptId: attempt.id }, rejectOnEmpty: true });
		expect(answer.value).toBeCloseTo(value, 2);
	});

	it.each([
		['a frequency for a level', { power: typed('450 MHz') }, 'answers.power.text'],
		['a unit of another kind', { power: typed('-23.6', 'Hz') }, 'answers.power.unit'],
		['words', { power: typed('about ten') }, 'answers.power.text'],
		[
			'one bad answer among good ones',
			{ power: typed('-23'), width: typed('3 dBm', 'kHz') },
			'answers.width.text'
		],
		['an answer to a question not asked', { colour: typed('-23') }, 'answers.colour'],
		['a reading not taken here', { power: typed('-23', 'dBm', 987_654) }, 'answers.power.readingId'],
		['nothing at all', {}, 'answers'],
		['nothing but blanks', { power: typed('  ') }, 'answers']
	])('refuses %s, naming the question, and keeps nothing', async (_, answers, field) => {
		const { actor, attempt } = await createAttempt();
		await expect(handIn(actor, attempt.id, { answers }, now)).rejects.toMatchObject({
			code: 'invalid',
			issues: [{ field }]
		});
		expect(await counts(attempt.id)).toEqual([0, 0]);
		expect(await Attempt.findByPk(attempt.id)).toMatchObject({ closedAt: null });
	});

	it('takes one of many that come at once', async () => {
		const { actor, attempt } = await createAttempt();
		const answers = { power: typed('-23') };
		const all = await Promise.allSettled(
			Array.from({ length: 10 }, () => handIn(actor, attempt.id, { answers }, now))
		);
		expect(all.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
		expect(await counts(attempt.id)).toEqual([1, 1]);
	});

	it('grades thirty at once in threads of their own, while the server goes on answering', async () => {
		const attempts = await Promise.all(Array.from({ length: 30 }, () => createAttempt()));
		const answers = { power: typed('-23') };
		const stoodStillMs = longestStandstill();
		const all = await Promise.all(
			attempts.map(({ actor, attempt }) => handIn(actor, attempt.id, { answers }, now))
		);
		expect(all.map(({ finding }) => numberFindings(finding)[0].yours?.value)).toEqual(
			attempts.map(() => -23)
		);
		const truths = await Promise.all(attempts.map(({ attempt }) => secretsOf(attempt.id)));
		expect(all.map(({ finding }) => numberFindings(finding)[0].true.value)).toEqual(
			truths.map(({ drawn }) => numberQuestions(drawn)[0].truth)
		);
		expect(await Answer.count({ where: { attemptId: attempts.map(({ attempt }) => attempt.id) } })).toBe(30);
		// One grading alone takes some hundred milliseconds: thirty on this thread would stand still for seconds.
		expect(stoodStillMs()).toBeLessThan(1500);
	});

	it('grades what was read meanwhile, and nothing that is no longer so', async () => {
		const { actor, attempt } = await createAttempt();
		const { drawn } = await secretsOf(attempt.id);
		const correctionDb = numberQuestions(drawn)[0].leadDb;
		await sweep(actor, attempt.id, { ...settings, correctionDb }, { sweeps: 16 });
		await acknowledgeRows(actor, attempt.id, { row: 15 });
		const answers = { power: typed(numberQuestions(drawn)[0].truth.toFixed(2)) };
		const request = { kind: 'channel-power' as const, centreHz: 450e6, widthHz: 200e3 };
		const handing = handIn(actor, attempt.id, { answers }, now);
		const reading = takeReading(actor, attempt.id, { rows: { from: 0, to: 15 }, trace: 1, request }, now);
		const [handed, read] = await Promise.allSettled([handing, reading]);
		if (handed.status === 'rejected') throw handed.reason;
		const seen = handed.value.finding.log.some(({ text }) => text.startsWith('Reading: channel power'));
		// Either it came before the end, and then it was graded with the rest, or it came too late.
		expect(seen).toBe(read.status === 'fulfilled');
	});

	it('leaves the tables unchanged when it fails late', async () => {
		const { actor, attempt } = await createAttempt();
		Finding.addHook('afterCreate', 'fail late', () => {
			throw new Error('late');
		});
		const failed = handIn(actor, attempt.id, { answers: { power: typed('-23') } }, now);
		await expect(failed).rejects.toThrow('late');
		Finding.removeHook('afterCreate', 'fail late');
		expect(await counts(attempt.id)).toEqual([0, 0]);
		expect(await Attempt.findByPk(attempt.id)).toMatchObject({ closedAt: null });
	});

	it('is not there for anybody else', async () => {
		const { attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		const answers = { power: typed('-23') };
		await expect(handIn(stranger, attempt.id, { answers }, now)).rejects.toMatchObject({ code: 'not_found' });
	});
});

describe('getFinding(actor, attemptId)', () => {
	it('says nothing while the attempt is open', async () => {
		const { actor, attempt } = await createAttempt();
		await expect(getFinding(actor, attempt.id)).rejects.toMatchObject({ code: 'conflict' });
	});

	it('is not there for anybody else', async () => {
		const { actor, attempt } = await createAttempt();
		await handIn(actor, attempt.id, { answers: { power: typed('-23') } }, now);
		const { actor: stranger } = await createUser('apprentice');
		await expect(getFinding(stranger, attempt.id)).rejects.toMatchObject({ code: 'not_found' });
	});
});
