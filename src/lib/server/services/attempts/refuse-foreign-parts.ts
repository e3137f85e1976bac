import type { Transaction } from 'sequelize';
import type { TypedAnswer } from '$lib/schemas/attempt';
import type { Attempt } from '$lib/server/db/models/attempt';
import { Reading } from '$lib/server/db/models/reading';
import { DomainError, type Issue } from '$lib/server/errors';
import { exerciseOf } from './signal-source';

/** @throws DomainError `invalid` for answers to questions not asked here, or resting on readings not taken here */
export async function refuseForeignParts(
	attempt: Attempt,
	answers: Record<string, TypedAnswer>,
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
	const issues = Object.entries(answers).flatMap(([question, { readingId }]): Issue[] => {
		if (!asked.has(question))
			return [{ field: `answers.${question}`, message: 'this exercise asks no such question' }];
		if (readingId === undefined || readingId === null || taken.has(readingId)) return [];
		return [{ field: `answers.${question}.readingId`, message: 'no such reading was taken in this attempt' }];
	});
	if (issues.length > 0)
		throw new DomainError('invalid', 'Some of the answers don’t belong here.', { issues });
}
