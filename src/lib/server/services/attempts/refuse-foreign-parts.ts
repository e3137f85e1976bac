import type { Transaction } from 'sequelize';
import type { TypedAnswer, TypedAnswers } from '$lib/schemas/answer';
import type { Attempt } from '$lib/server/db/models/attempt';
import { Reading } from '$lib/server/db/models/reading';
import { DomainError, type Issue } from '$lib/server/errors';
import { setUpLog } from './set-up-log';
import { exerciseOf } from './signal-source';

/** @throws DomainError `invalid` for answers to questions not asked here, or resting on what was not read or swept here */
export async function refuseForeignParts(
	attempt: Attempt,
	answers: TypedAnswers,
	transaction: Transaction
): Promise<void> {
	const { definition } = await exerciseOf(attempt, transaction);
	const asked = new Set(definition.questions.map(({ id }) => id));
	const readings = await Reading.findAll({
		where: { attemptId: attempt.id },
		attributes: ['id'],
		transaction
	});
	const taken = new Set(readings.map(({ id }) => id));
	const log = await setUpLog(attempt.id, transaction);
	const swept = new Set(log.filter(({ tripped }) => !tripped).map(({ number }) => number));
	const issues = Object.entries(answers).flatMap(([question, answer]): Issue[] => {
		if (!asked.has(question))
			return [{ field: `answers.${question}`, message: 'this exercise asks no such question' }];
		const stranger = strangerIn(answer, taken, swept);
		return stranger ? [{ ...stranger, field: `answers.${question}.${stranger.field}` }] : [];
	});
	if (issues.length > 0)
		throw new DomainError('invalid', 'Some of the answers don’t belong here.', { issues });
}

/** What an answer rests on that is not of this attempt. */
function strangerIn(
	answer: TypedAnswer,
	taken: ReadonlySet<number>,
	swept: ReadonlySet<number>
): Issue | undefined {
	const isBacked = answer.type === 'number' || answer.type === 'uncertainty';
	if (isBacked && answer.readingId && !taken.has(answer.readingId)) {
		return { field: 'readingId', message: 'no such reading was taken in this attempt' };
	}
	if (answer.type === 'set-up' && answer.setUp !== null && !swept.has(answer.setUp)) {
		return { field: 'setUp', message: 'no such set-up was swept in this attempt' };
	}
	return undefined;
}
