import { Answer } from '$lib/server/db/models/answer';
import { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import type { Actor } from '$lib/server/domain/role';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';

/**
 * An attempt that was handed in with these verdicts, as grading would have left it.
 * @param verdicts by question; a question left out is unanswered
 */
export async function createClosedAttempt(
	actor: Actor,
	slug: string,
	at: Date,
	{
		passed,
		verdicts = {},
		practice = false
	}: {
		passed: boolean;
		verdicts?: Record<string, string>;
		practice?: boolean;
	}
): Promise<number> {
	const { attempt } = await startAttempt(actor, slug, at, practice);
	await Attempt.update({ closedAt: at }, { where: { id: attempt.id } });
	const finding = { questions: [], log: [], doneRight: [], passed };
	await Finding.create({ attemptId: attempt.id, passed, finding, engineVersion: 1, gradedAt: at });
	const answers = Object.entries(verdicts).map(([question, verdict]) => ({
		...{ attemptId: attempt.id, question, verdict },
		...{ text: '-20', unit: 'dBm', value: -20, readingId: null, mistakes: [] }
	}));
	await Answer.bulkCreate(answers);
	return attempt.id;
}
