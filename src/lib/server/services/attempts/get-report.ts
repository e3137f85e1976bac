import type { ReportView } from '$lib/schemas/report';
import { readingMark } from '$lib/server/bench/grading/reading-mark';
import { Answer } from '$lib/server/db/models/answer';
import { Finding } from '$lib/server/db/models/finding';
import { User } from '$lib/server/db/models/user';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getAttempt } from './get-attempt';
import { resolvedFor } from './prepared-bench';
import { reportPicture } from './report-picture';
import { setUpLog, setUpOfRow } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';
import { viewAttempt } from './view-attempt';

/**
 * The measurement report of a closed attempt: the set-up and picture that its first answer rests on, every reading, the
 * answers with their verdicts, who and when. No truths.
 * @throws DomainError `conflict` while the attempt is open
 */
export async function getReport(actor: Actor, attemptId: number): Promise<ReportView> {
	const attempt = await getAttempt(actor, 'attempt.read', attemptId);
	const stored = attempt.closedAt ? await Finding.findByPk(attemptId) : null;
	if (!attempt.closedAt || !stored)
		throw new DomainError('conflict', 'This attempt has not been handed in yet.');
	const { exercise, readings } = await viewAttempt(attempt);
	const person = await User.findByPk(attempt.userId, { attributes: ['displayName'], rejectOnEmpty: true });
	const given = await Answer.findAll({ where: { attemptId } });
	const restsOn = (question: string) =>
		given.find((answer) => answer.question === question)?.readingId ?? null;
	const attached = exercise.questions.flatMap(({ id }) => readings.filter((one) => one.id === restsOn(id)));

	const source = signalSource(attempt, await exerciseOf(attempt));
	const log = await setUpLog(attemptId);
	const swept = [...attached, ...readings.toReversed()].find(({ trace }) => trace !== null);
	const row = swept?.rows.to ?? log.findLast(({ drawnTo }) => drawnTo !== null)?.drawnTo ?? null;
	const setUp = row === null ? undefined : setUpOfRow(log, row);
	const resolved = setUp ? resolvedFor(source, setUp.settings) : null;
	const picture = row !== null && resolved ? await reportPicture(source, log, row, resolved) : null;
	const marks = attached.flatMap(({ id, request, parts, trace, value, unit, setUp: number }) => {
		const mark = number === setUp?.number && trace !== null ? readingMark(request, parts) : null;
		return mark && trace !== null ? [{ readingId: id, trace, mark, value, unit }] : [];
	});
	return {
		attemptId,
		number: attempt.number,
		person: person.displayName,
		startedAt: attempt.startedAt.toISOString(),
		closedAt: attempt.closedAt.toISOString(),
		benchTimeUsedS: attempt.clockS,
		exercise,
		setUp: resolved,
		picture: picture && { ...picture, marks },
		readings,
		answers: stored.finding.questions.map((found) => ({
			id: found.id,
			text: found.text,
			yours: found.type === 'number' ? found.yours : null,
			answer: found.answer,
			verdict: found.verdict,
			toleranceText: exercise.questions.find(({ id }) => id === found.id)?.toleranceText ?? '',
			readingId: restsOn(found.id)
		})),
		passed: stored.passed
	};
}
