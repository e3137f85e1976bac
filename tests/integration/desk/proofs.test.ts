import { beforeEach, describe, expect, it, vi } from 'vitest';
import { ExerciseProof } from '$lib/server/db/models/exercise-proof';
import { Job } from '$lib/server/db/models/job';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { claimJob, LEASE_MS } from '$lib/server/jobs/claim-job';
import { enqueueJob } from '$lib/server/jobs/enqueue-job';
import { runJob } from '$lib/server/jobs/run-job';
import { jobHandlers } from '$lib/server/services/background/background-work';
import { saveDraftFile } from '$lib/server/services/course-drafts/save-draft-file';
import { startDraft } from '$lib/server/services/course-drafts/start-draft';
import { askForProof, cancelProof, getProofState } from '$lib/server/services/proofs/ask-for-proof';
import { PROVE } from '$lib/server/services/proofs/prove-job';
import { createUser } from '../../factories/user';
import { createWrittenCourse } from '../../factories/written-course';

// Threads start from the sources here, and several of them.
vi.setConfig({ testTimeout: 120_000 });

const now = new Date('2026-03-03T09:00:00Z');
let author: Actor;
let course: Awaited<ReturnType<typeof createWrittenCourse>>;
const noWake = () => undefined;

beforeEach(async () => {
	author = (await createUser('instructor')).actor;
	course = await createWrittenCourse();
	await startDraft(author, course.slug, now);
	await Job.destroy({ where: {} });
});

const change = (from: string, to: string) =>
	saveDraftFile(
		author,
		course.slug,
		{ path: course.exercisePath, text: course.files[course.exercisePath].replace(from, to), revision: 1 },
		now
	);
const state = () => getProofState(author, course.slug, course.exercisePath);
/** The proof of the file as it is, over fewer seeds than an author gets. */
async function enqueueShort(hash: string, from = '', to = ''): Promise<void> {
	const text = course.files[course.exercisePath].replace(from, to);
	await inTransaction((transaction) =>
		enqueueJob(
			{ kind: PROVE, subject: hash, payload: { hash, text, seeds: 8 }, createdBy: author.id, now },
			transaction
		)
	);
}
const work = (time = now) => runJob(jobHandlers, () => time);

describe('askForProof(actor, slug, path, now, wake)', () => {
	it('is wanted for what is kept now, and forgotten with the next change', async () => {
		expect(await state()).toMatchObject({ shipped: true, job: null, result: null });
		await change('tries: 5', 'tries: 4');
		let woken = 0;
		const asked = await askForProof(author, course.slug, course.exercisePath, now, () => woken++);
		expect(asked).toMatchObject({ shipped: false, job: { state: 'waiting' }, result: null });
		expect(woken).toBe(1);
		expect(await cancelProof(author, course.slug, course.exercisePath, now)).toMatchObject({
			job: { state: 'cancelled' }
		});
		await saveDraftFile(
			author,
			course.slug,
			{ path: course.exercisePath, text: course.files[course.exercisePath], revision: 2 },
			now
		);
		expect(await state()).toMatchObject({ shipped: true, job: null });
	});

	it('refuses an exercise with faults, field by field', async () => {
		await change('order', 'order').catch(() => undefined);
		await change('receiver: field', 'receiver: grand');
		const asked = askForProof(author, course.slug, course.exercisePath, now, noWake);
		await expect(asked).rejects.toMatchObject({ code: 'invalid', issues: [{ field: 'receiver' }] });
		expect(await Job.count()).toBe(0);
	});
});

describe('the proof as a job', () => {
	it('shows each seed’s error of every way of doing it, and passes', async () => {
		const { hash } = await state();
		await enqueueShort(hash);
		await work();
		const { result, job } = await state();
		expect(job).toBeNull();
		expect(result).toMatchObject({ passed: true, seeds: 8, failures: [], advice: [] });
		expect(result!.rows.map(({ mistake }) => mistake)).toEqual([null, 'lead-left-out', 'lead-wrong-sign']);
		for (const { errors } of result!.rows) expect(errors).toHaveLength(8);
		expect(Math.max(...result!.rows[0].errors.map((error) => Math.abs(error!)))).toBeLessThan(1);
	});

	it('advises a tolerance that stops a mistake and lets the taught method through', async () => {
		const wide = ['absolute: 1.0', 'absolute: 5.2'] as const;
		await change(...wide);
		const { hash } = await state();
		await enqueueShort(hash, ...wide);
		await work();
		const { result } = await state();
		expect(result!.passed).toBe(false);
		const advice = result!.advice.find(({ says }) => says.includes('lands inside ±5.2 dB'));
		expect(advice!.tolerance).toBeGreaterThan(1);
		expect(advice!.tolerance).toBeLessThan(4.3 + 0.5);
	});

	it('is done by another process when the one that began it has died', async () => {
		const { hash } = await state();
		await enqueueShort(hash);
		await claimJob([PROVE], now);
		expect(await work()).toBe(false);
		expect(await work(new Date(now.getTime() + LEASE_MS + 1))).toBe(true);
		expect(await ExerciseProof.findByPk(hash)).toMatchObject({ passed: true });
		expect(await Job.findOne()).toMatchObject({ state: 'done', tries: 2 });
	});
});
