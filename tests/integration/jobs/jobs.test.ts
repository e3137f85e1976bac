import { beforeEach, describe, expect, it } from 'vitest';
import { Job } from '$lib/server/db/models/job';
import { inTransaction } from '$lib/server/db/transaction';
import { claimJob, endJob, LEASE_MS, MOST_TRIES, renewLease } from '$lib/server/jobs/claim-job';
import { cancelJob, enqueueJob } from '$lib/server/jobs/enqueue-job';
import { runJob, type JobHandler } from '$lib/server/jobs/run-job';

const KIND = 'count';
const start = Date.UTC(2026, 2, 3, 9);
const at = (ms: number) => new Date(start + ms);
const enqueue = (subject: string) =>
	inTransaction((transaction) =>
		enqueueJob({ kind: KIND, subject, payload: { subject }, createdBy: null, now: at(0) }, transaction)
	);
const run = (handler: JobHandler, ms = 1) => runJob({ [KIND]: handler }, () => at(ms));
const only = async () => (await Job.findAll())[0];

beforeEach(() => Job.destroy({ where: {} }));

describe('enqueueJob(job, transaction)', () => {
	it('asks once for what is asked for twice while it waits', async () => {
		await enqueue('a');
		await enqueue('a');
		await enqueue('b');
		expect((await Job.findAll()).map(({ subject }) => subject).sort()).toEqual(['a', 'b']);
	});

	it('leaves no job behind when the change that asks for it fails', async () => {
		const failing = inTransaction(async (transaction) => {
			await enqueueJob({ kind: KIND, subject: 'a', payload: {}, createdBy: null, now: at(0) }, transaction);
			throw new Error('late');
		});
		await expect(failing).rejects.toThrow('late');
		expect(await Job.count()).toBe(0);
	});
});

describe('claimJob(kinds, now)', () => {
	it('gives each job to one of many who ask at once', async () => {
		for (const subject of ['a', 'b', 'c']) await enqueue(subject);
		const claimed = await Promise.all(Array.from({ length: 6 }, () => claimJob([KIND], at(1))));
		const subjects = claimed.flatMap((job) => (job ? [job.subject] : []));
		expect(new Set(subjects).size).toBe(subjects.length);
		// One who asks while another is choosing may be told that there is none; none is lost by that.
		for (let job = await claimJob([KIND], at(1)); job; job = await claimJob([KIND], at(1)))
			subjects.push(job.subject);
		expect(subjects.sort()).toEqual(['a', 'b', 'c']);
	});

	it('gives no job to who can’t do it', async () => {
		await enqueue('a');
		expect(await claimJob(['other'], at(1))).toBeNull();
	});

	it('gives a job to another one when its runner has been silent, and lets the first end it no more', async () => {
		await enqueue('a');
		const dead = (await claimJob([KIND], at(0)))!;
		expect(await claimJob([KIND], at(LEASE_MS - 1))).toBeNull();
		const second = (await claimJob([KIND], at(LEASE_MS + 1)))!;
		expect(second.id).toBe(dead.id);
		expect(await renewLease(dead, { done: 9, total: 9 }, at(LEASE_MS + 2))).toBe(false);
		await endJob(dead, { state: 'done' }, at(LEASE_MS + 2));
		expect(await only()).toMatchObject({ state: 'running', tries: 2 });
		await endJob(second, { state: 'done' }, at(LEASE_MS + 3));
		expect(await only()).toMatchObject({ state: 'done', endedAt: at(LEASE_MS + 3) });
	});

	it('keeps a job with whoever renews its lease', async () => {
		await enqueue('a');
		const job = (await claimJob([KIND], at(0)))!;
		expect(await renewLease(job, { done: 1, total: 2 }, at(LEASE_MS - 1))).toBe(true);
		expect(await claimJob([KIND], at(LEASE_MS + 1))).toBeNull();
		expect(await only()).toMatchObject({ done: 1, total: 2 });
	});

	it('gives up a job that has ended its process three times', async () => {
		await enqueue('a');
		for (let n = 0; n < MOST_TRIES; n++)
			expect(await claimJob([KIND], at(n * 2 * LEASE_MS))).toMatchObject({ state: 'running' });
		expect(await run(() => Promise.resolve(), 20 * LEASE_MS)).toBe(true);
		expect(await only()).toMatchObject({ state: 'failed' });
		expect((await only()).problem).toContain('3 tries');
	});
});

describe('runJob(handlers, clock)', () => {
	it('does a job with its payload, notes how far it is, and ends it', async () => {
		await enqueue('a');
		const seen: unknown[] = [];
		const found = await run(async (payload, { progress }) => {
			seen.push(payload);
			await progress(3, 4);
			seen.push((await only()).done);
		});
		expect([found, seen]).toEqual([true, [{ subject: 'a' }, 3]]);
		expect(await only()).toMatchObject({ state: 'done', done: 3, total: 4 });
		expect(await run(() => Promise.resolve())).toBe(false);
	});

	it('stops at the next progress when the job is cancelled', async () => {
		await enqueue('a');
		let after = false;
		await run(async (_, { progress }) => {
			await progress(1, 4);
			await cancelJob(KIND, 'a', at(5));
			await progress(2, 4);
			after = true;
		});
		expect(after).toBe(false);
		expect(await only()).toMatchObject({ state: 'cancelled', done: 1 });
	});

	it('never begins a job that was cancelled while it waited', async () => {
		await enqueue('a');
		await cancelJob(KIND, 'a', at(1));
		expect(await run(() => Promise.reject(new Error('begun')))).toBe(false);
	});

	it('fails a job whose work throws, with what it said', async () => {
		await enqueue('a');
		await run(() => Promise.reject(new Error('no such scene')));
		expect(await only()).toMatchObject({ state: 'failed', problem: 'no such scene' });
	});
});
