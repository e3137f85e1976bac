import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { beforeAll, describe, expect, it } from 'vitest';
import {
	attemptResponse,
	findingResponse,
	hintResponse,
	problemResponse,
	readingResponse
} from '$lib/schemas/attempt';
import type { Actor } from '$lib/server/domain/role';
import { readStream, secretsOf } from '../../factories/attempt';
import { createCourse } from '../../factories/course';
import { createEvent } from '../../factories/event';
import { createUser } from '../../factories/user';
import { numberFindings } from '../../factories/number-findings';

import {
	checksums,
	createSweptAttempt,
	gets,
	post,
	posts,
	queries,
	refused,
	settings
} from './attempt-endpoints';

let actor: Actor;
let id: string;
beforeAll(async () => {
	({ actor, id } = await createSweptAttempt());
});

describe('endpoints of attempts', () => {
	it('name the field that is wrong', async () => {
		const fieldOf = async (name: string, body: unknown) => {
			const problem = problemResponse.parse(await (await post(name, actor, id, body)).json());
			return problem.issues?.map(({ field }) => field);
		};
		expect(await fieldOf('sweeps', { settings: { ...settings, rbwHz: -1 }, from: 0 })).toEqual([
			'settings.rbwHz'
		]);
		expect(await fieldOf('sweeps', { settings: { ...settings, rbwHz: 7 }, from: 0 })).toEqual([
			'settings.rbwHz'
		]);
		expect(await fieldOf('acknowledgements', { row: 'x' })).toEqual(['row']);
		expect(
			await fieldOf('readings', { rows: { from: 3, to: 1 }, trace: 1, request: { kind: 'peak' } })
		).toEqual(['rows.to']);
		expect(await fieldOf('answers', { answers: { power: { text: '3 GHz', unit: 'dBm' } } })).toEqual([
			'answers.power.text'
		]);
	});

	it('are closed to whoever has not signed in', async () => {
		for (const name of Object.keys(posts)) {
			expect((await post(name, null, id, posts[name].good())).status).toBe(401);
		}
		for (const [name, handler] of Object.entries(gets)) {
			const response = await handler(createEvent(null, { id }, { query: queries[name] }));
			expect(response.status).toBe(401);
		}
	});

	it('answer 404 alike for what is somebody else’s, what is not there and what is no id', async () => {
		const { actor: stranger } = await createUser('apprentice');
		const before = await checksums();
		const answers = new Set<string>();
		for (const asked of [id, '999999999', '0', '-1', '1e3', 'x', '9'.repeat(30), '1 OR 1=1', '../1', '']) {
			for (const name of Object.keys(posts).filter((key) => key !== 'start')) {
				const response = await post(name, stranger, asked, posts[name].good());
				expect(response.status).toBe(404);
				answers.add(await response.text());
			}
			for (const [name, handler] of Object.entries(gets)) {
				const response = await handler(createEvent(stranger, { id: asked }, { query: queries[name] }));
				expect(response.status).toBe(404);
				answers.add(await response.text());
			}
		}
		expect([...answers]).toEqual(['{"message":"There is no such attempt."}']);
		expect(await checksums()).toEqual(before);
	});

	it('doneRightRows: what is no step is refused', async () => {
		for (const query of ['', '?step=x', '?step=-1', '?step=60', '?step=0.5', '?step=0&x=1']) {
			await refused(await gets.doneRightRows(createEvent(actor, { id }, { query })));
		}
	});

	it('rows: bad ranges are refused', async () => {
		for (const query of [
			'',
			'?from=0',
			'?from=x&to=1',
			'?from=2&to=1',
			'?from=-1&to=1',
			'?from=0&to=1&x=1'
		]) {
			await refused(await gets.rows(createEvent(actor, { id }, { query })));
		}
	});
});

describe('an attempt over its endpoints', () => {
	it('goes from start to finding, and tells nothing of its signal before it is closed', async () => {
		const { actor: learner } = await createUser('apprentice');
		const { exercise } = await createCourse();
		const bodies: string[] = [];
		const send = async (name: string, asked: string, body: unknown, status: number) => {
			const response = await post(name, learner, asked, body);
			expect(response.status).toBe(status);
			const text = await response.text();
			bodies.push(text);
			return JSON.parse(text) as unknown;
		};
		const started = attemptResponse.parse(await send('start', '', { exercise: exercise.slug }, 201));
		await send('start', '', { exercise: exercise.slug }, 200);
		const own = String(started.attempt.id);
		const secrets = await secretsOf(started.attempt.id);
		const swept = await post('sweeps', learner, own, {
			settings: { ...settings, detector: 'average', scale: 'power', traces: [{ mode: 'average', count: 8 }] },
			from: 0,
			sweeps: 8
		});
		expect(swept.headers.get('content-type')).toBe('application/octet-stream');
		const [toRead, toKeep] = swept.body!.tee();
		bodies.push(Buffer.from(await new Response(toKeep).arrayBuffer()).toString('latin1'));
		expect((await readStream(toRead)).rows.size).toBe(8);
		await send('acknowledgements', own, { row: 7 }, 200);
		const request = { kind: 'channel-power', centreHz: 450e6, widthHz: 200e3 };
		const taken = readingResponse.parse(
			await send('readings', own, { rows: { from: 0, to: 7 }, trace: 1, request }, 201)
		);
		const power = { text: taken.reading.value.toFixed(1), unit: 'dBm', readingId: taken.reading.id };
		await send('drafts', own, { answers: { power } }, 200);
		const shown = await gets.hint(createEvent(learner, { id: own }, { method: 'POST' }));
		bodies.push(JSON.stringify(hintResponse.parse(await shown.json())));
		const early = await gets.finding(createEvent(learner, { id: own }));
		expect(early.status).toBe(409);
		bodies.push(await early.text());
		const seen = await gets.view(createEvent(learner, { id: own }));
		bodies.push(JSON.stringify(attemptResponse.parse(await seen.json())));

		expect(secrets.marks.length).toBeGreaterThan(4);
		const leaks = secrets.marks.filter((mark) => bodies.some((body) => body.includes(mark)));
		expect(leaks).toEqual([]);

		const found = findingResponse.parse(await send('answers', own, { answers: { power } }, 200));
		expect(numberFindings(found.finding)[0].true.value).toBe(numberQuestions(secrets.drawn)[0].truth);
		const kept = await gets.finding(createEvent(learner, { id: own }));
		expect(findingResponse.parse(await kept.json())).toEqual(found);
		await send('answers', own, { answers: { power } }, 409);
	});
});
