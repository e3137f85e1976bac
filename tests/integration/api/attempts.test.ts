import fc from 'fast-check';
import type { RequestEvent } from '@sveltejs/kit';
import { beforeAll, describe, expect, it } from 'vitest';
import { QueryTypes } from 'sequelize';
import {
	attemptResponse,
	findingResponse,
	hintResponse,
	problemResponse,
	readingResponse
} from '$lib/schemas/attempt';
import { sequelize } from '$lib/server/db/connection';
import type { Actor } from '$lib/server/domain/role';
import { createAttempt, readStream, secretsOf, sweep } from '../../factories/attempt';
import { createCourse } from '../../factories/course';
import { createEvent } from '../../factories/event';
import { createUser } from '../../factories/user';
import { POST as start } from '../../../src/routes/api/attempts/+server';
import { GET as view } from '../../../src/routes/api/attempts/[id]/+server';
import { POST as abandon } from '../../../src/routes/api/attempts/[id]/abandonment/+server';
import { POST as acknowledge } from '../../../src/routes/api/attempts/[id]/acknowledgements/+server';
import { POST as answer } from '../../../src/routes/api/attempts/[id]/answers/+server';
import { GET as doneRight } from '../../../src/routes/api/attempts/[id]/done-right/+server';
import { GET as doneRightRows } from '../../../src/routes/api/attempts/[id]/done-right/rows/+server';
import { PUT as draft } from '../../../src/routes/api/attempts/[id]/drafts/+server';
import { GET as finding } from '../../../src/routes/api/attempts/[id]/finding/+server';
import { POST as hint } from '../../../src/routes/api/attempts/[id]/hints/+server';
import { PUT as markings } from '../../../src/routes/api/attempts/[id]/markings/+server';
import { POST as reading } from '../../../src/routes/api/attempts/[id]/readings/+server';
import { GET as rows } from '../../../src/routes/api/attempts/[id]/rows/+server';
import { GET as setUps } from '../../../src/routes/api/attempts/[id]/set-ups/+server';
import { POST as sweeps } from '../../../src/routes/api/attempts/[id]/sweeps/+server';

type Handler = (event: RequestEvent) => Promise<Response>;
const settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };

/** Every endpoint that takes a body, with one it likes. */
const posts: Record<string, { handler: Handler; good: () => unknown }> = {
	start: { handler: start as unknown as Handler, good: () => ({ exercise: 'spread-carrier-1' }) },
	sweeps: { handler: sweeps as unknown as Handler, good: () => ({ settings, from: 0, sweeps: 2 }) },
	acknowledgements: { handler: acknowledge as unknown as Handler, good: () => ({ row: 0 }) },
	readings: {
		handler: reading as unknown as Handler,
		good: () => ({ rows: { from: 0, to: 1 }, trace: 1, request: { kind: 'peak' } })
	},
	drafts: {
		handler: draft as unknown as Handler,
		good: () => ({ answers: { power: { text: '-23', unit: 'dBm', readingId: null } } })
	},
	counts: {
		handler: reading as unknown as Handler,
		good: () => ({ request: { kind: 'count', atHz: 450e6, gateS: 0.1 } })
	},
	markings: {
		handler: markings as unknown as Handler,
		good: () => ({
			markings: {
				markers: [{ letter: 'A', at: 450e6, trace: 1 }],
				selected: 'A',
				readings: [{ request: { kind: 'peak' }, trace: 1, values: { centreHz: 450e6 } }],
				levelUnit: 'dBm',
				antenna: [{ frequencyHz: 450e6, dbPerM: 18.4 }]
			}
		})
	},
	answers: {
		handler: answer as unknown as Handler,
		good: () => ({ answers: { power: { text: '-23', unit: 'dBm' } } })
	}
};
/** Every endpoint that takes no body. */
const gets = { view, hint, finding, rows, setUps, doneRight, doneRightRows, abandon } as unknown as Record<
	string,
	Handler
>;
/** What those of them ask for that ask for something. */
const queries: Record<string, string> = { rows: '?from=0&to=1', doneRightRows: '?step=0' };

const post = (name: string, actor: Actor | null, id: string, body: unknown) =>
	posts[name].handler(
		createEvent(
			actor,
			{ id },
			{ method: 'POST', body: typeof body === 'string' ? body : JSON.stringify(body) }
		)
	);

async function checksums(): Promise<unknown> {
	const tables = 'attempts, set_ups, readings, drafts, markings, answers, findings';
	return sequelize.query(`CHECKSUM TABLE ${tables}`, { type: QueryTypes.SELECT });
}

/** Somebody's attempt with two rows swept. */
async function createSweptAttempt(): Promise<{ actor: Actor; id: string }> {
	const { actor: owner, attempt } = await createAttempt();
	await sweep(owner, attempt.id, settings, { sweeps: 2 });
	return { actor: owner, id: String(attempt.id) };
}

let actor: Actor;
let id: string;
beforeAll(async () => {
	({ actor, id } = await createSweptAttempt());
});

/** Any JSON, or a body it likes with one part of it bent. */
const bent = (good: unknown) =>
	fc.oneof(
		fc.jsonValue(),
		fc.tuple(fc.nat(), hostile).map(([place, value]) => withPart(structuredClone(good), place, value))
	);
const hostile = fc.oneof(
	fc.jsonValue({ maxDepth: 2 }),
	fc.constantFrom<unknown>(
		-1,
		1e308,
		-0,
		2 ** 53,
		0.5,
		null,
		true,
		[],
		{},
		'',
		'\u0000',
		'a'.repeat(5000),
		'=1+1',
		'__proto__',
		{ $ne: null },
		[1, 2],
		"'; DROP TABLE attempts; --"
	)
);

/** `value` put in the place of the n-th part of a structure (or beside it, under a strange name). */
function withPart(whole: unknown, n: number, value: unknown): unknown {
	const places: [Record<string, unknown>, string][] = [];
	const visit = (part: unknown): void => {
		if (typeof part !== 'object' || part === null) return;
		for (const key of Object.keys(part)) {
			places.push([part as Record<string, unknown>, key]);
			visit((part as Record<string, unknown>)[key]);
		}
		places.push([part as Record<string, unknown>, 'constructor']);
	};
	visit(whole);
	const [holder, key] = places[n % places.length];
	holder[key] = value;
	return whole;
}

async function refused(response: Response): Promise<void> {
	expect(response.status).toBeGreaterThanOrEqual(400);
	expect(response.status).toBeLessThan(500);
	problemResponse.parse(await response.json());
}

describe('endpoints of attempts', () => {
	it.each(Object.keys(posts))(
		'%s: bad input is refused with a reason, changes nothing and never gives 500',
		async (name) => {
			const own = await createSweptAttempt();
			let before = await checksums();
			let refusals = 0;
			await fc.assert(
				fc.asyncProperty(bent(posts[name].good()), async (body) => {
					const response = await post(name, own.actor, own.id, body);
					expect(response.status).toBeLessThan(500);
					if (response.ok) {
						// Bent, and yet what it asks for: a lower row, a draft in other words.
						await response.body?.cancel();
						before = await checksums();
						return;
					}
					refusals += 1;
					await refused(response);
					expect(await checksums()).toEqual(before);
				}),
				{ numRuns: 500 }
			);
			expect(refusals).toBeGreaterThan(300);
		},
		180_000
	);

	it.each(Object.keys(posts))('%s: what is no JSON, or too long, is refused', async (name) => {
		for (const body of ['', '{', 'null', '[]', '"x"', 'ÿþ', `{"a":"${'x'.repeat(70_000)}"}`]) {
			const response = await post(name, actor, id, body);
			expect([400, 422]).toContain(response.status);
			await refused(response);
		}
	});

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
		expect(found.finding.questions[0].true.value).toBe(secrets.drawn.questions[0].truth);
		const kept = await gets.finding(createEvent(learner, { id: own }));
		expect(findingResponse.parse(await kept.json())).toEqual(found);
		await send('answers', own, { answers: { power } }, 409);
	});
});
