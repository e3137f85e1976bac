import type { Transaction } from 'sequelize';
import { typedAnswers } from '$lib/schemas/answer';
import type { AttemptView, BenchView, DraftsView } from '$lib/schemas/attempt';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';
import type { Attempt } from '$lib/server/db/models/attempt';
import { AttemptMarkings } from '$lib/server/db/models/attempt-markings';
import { Draft } from '$lib/server/db/models/draft';
import { Reading } from '$lib/server/db/models/reading';
import { SetUp } from '$lib/server/db/models/set-up';
import { attemptsAtExercise } from '$lib/server/db/queries/attempts-at-exercise';
import type { PlacedExercise } from '$lib/server/db/queries/find-exercise';
import { presentAttempt, presentBench, presentFlag } from '$lib/server/present/attempt';
import { presentExercise } from '$lib/server/present/exercise';
import { triesLeft } from '$lib/server/present/progress';
import { presentReading } from '$lib/server/present/reading';
import { drawnFor, preparedBench, resolvedFor, type SignalSource } from './prepared-bench';
import { setUpLog } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';

/** Everything the bench page needs to stand exactly where the attempt stands. */
export async function viewAttempt(attempt: Attempt, transaction?: Transaction): Promise<AttemptView> {
	const exercise = await exerciseOf(attempt, transaction);
	const source = signalSource(attempt, exercise);
	const attempts = await attemptsAtExercise(attempt.userId, exercise, transaction);
	const readings = await Reading.findAll({
		where: { attemptId: attempt.id },
		include: [{ model: SetUp, as: 'setUp', attributes: ['number'] }],
		order: [['id', 'ASC']],
		transaction
	});
	return presentAttempt({
		attempt,
		triesLeft: triesLeft(exercise, attempts),
		exercise: viewExercise(exercise, source),
		hints: drawnFor(source).brief.hints,
		bench: await viewBench(attempt, source, transaction),
		readings: readings.map((reading) => presentReading(reading, reading.setUp?.number ?? 0)),
		drafts: await viewDrafts(attempt.id, transaction),
		markings: (await AttemptMarkings.findByPk(attempt.id, { transaction }))?.markings ?? null
	});
}

function viewExercise(exercise: PlacedExercise, source: SignalSource) {
	const { brief, profile, questions, parameters } = drawnFor(source);
	const { unit, edition, definition } = exercise;
	return presentExercise({
		course: { slug: edition.course.slug, title: edition.title },
		unit,
		exercise,
		client: definition.client,
		benchTimeS: definition.benchTimeS,
		situationHtml: fillText(exercise.situationHtml, parameters, 'situation'),
		brief,
		profile,
		questions,
		written: definition.questions
	});
}

async function viewBench(
	attempt: Attempt,
	source: SignalSource,
	transaction?: Transaction
): Promise<BenchView> {
	const log = await setUpLog(attempt.id, transaction);
	const setUp = log.at(-1) ?? null;
	const settings = setUp?.settings ?? drawnFor(source).brief.start;
	// Nobody sweeps a closed attempt, or one of an earlier engine: there is nothing to warn of.
	const live = setUp !== null && attempt.closedAt === null && attempt.engineVersion === ENGINE_VERSION;
	return presentBench({
		attempt,
		setUp,
		held: log.flatMap(({ drawnTo }) => drawnTo ?? []),
		settings,
		resolved: resolvedFor(source, settings),
		flags: live ? preparedBench(source, settings).plan.flags.map(presentFlag) : []
	});
}

async function viewDrafts(attemptId: number, transaction?: Transaction): Promise<DraftsView> {
	const draft = await Draft.findByPk(attemptId, { transaction });
	// Drafts kept before there were types of questions name none.
	return { answers: typedAnswers.parse(draft?.answers ?? {}), savedAt: draft?.savedAt.toISOString() ?? null };
}
