import type { RequestEvent } from '@sveltejs/kit';
import { beforeAll, describe, expect, it } from 'vitest';
import { figureState, type FigureState } from '$lib/schemas/figure-view';
import { Unit } from '$lib/server/db/models/unit';
import type { Actor } from '$lib/server/domain/role';
import { FIGURE_LIMIT, turnFigure } from '$lib/server/services/figures/turn-figure';
import { createCourse } from '../../factories/course';
import { createEvent } from '../../factories/event';
import { createUser } from '../../factories/user';
import { POST } from '../../../src/routes/api/figures/[unitId]/[figureId]/+server';

const handler = POST as unknown as (event: RequestEvent) => Promise<Response>;
const now = new Date('2026-03-02T10:00:00Z');
let actor: Actor;
let unitId: number;

beforeAll(async () => {
	({ actor } = await createUser('apprentice'));
	unitId = (await createCourse()).exercise.unitId;
});

const post = (body: unknown, { who = actor as Actor | null, unit = String(unitId), figure = 'hump' } = {}) =>
	handler(
		createEvent(
			who,
			{ unitId: unit, figureId: figure },
			{ method: 'POST', body: typeof body === 'string' ? body : JSON.stringify(body) }
		)
	);
const refused = async (response: Response) => ({
	status: response.status,
	...((await response.json()) as { message: string; issues?: { field: string; message: string }[] })
});

describe('POST /api/figures/[unitId]/[figureId]', () => {
	it('answers with the figure at the choice asked for, and nothing of its scene', async () => {
		const response = await post({ values: { rbwHz: 1000 } });
		expect(response.status).toBe(200);
		const state = (await response.json()) as FigureState;
		expect(figureState.parse(state)).toEqual(state);
		expect(state).toMatchObject({ values: [1000], resolved: { rbwHz: 1000 } });
		expect(state.readings[0]).toMatchObject({ kind: 'channel-power', unit: 'dBm' });
		expect(JSON.stringify(state)).not.toMatch(/emitters|symbolRateHz|seed/);
	});

	it('is open to instructors, and closed to strangers and to those who learn nothing here', async () => {
		const values = { values: { rbwHz: 300 } };
		const as = async (role: Parameters<typeof createUser>[0]) => (await createUser(role)).actor;
		expect((await post(values, { who: await as('instructor') })).status).toBe(200);
		expect((await post(values, { who: await as('coordinator') })).status).toBe(403);
		expect((await post(values, { who: await as('company-contact') })).status).toBe(403);
		expect((await post(values, { who: null })).status).toBe(401);
	});

	it.each<[string, unknown, number, string]>([
		['a value that is no choice', { values: { rbwHz: 500 } }, 422, 'values.rbwHz'],
		['a choice as a word', { values: { rbwHz: '300' } }, 422, 'values.rbwHz'],
		['a control left out', { values: {} }, 422, 'values.rbwHz'],
		['a control that isn’t there', { values: { rbwHz: 300, spanHz: 1e9 } }, 422, 'values.spanHz'],
		['a list for a value', { values: { rbwHz: [300] } }, 422, 'values.rbwHz'],
		['no values', {}, 422, 'values'],
		['settings of one’s own', { values: { rbwHz: 300 }, settings: {} }, 422, 'settings']
	])('refuses %s with 4xx, naming the control', async (_, body, status, field) => {
		const refusal = await refused(await post(body));
		expect(refusal.status).toBe(status);
		expect(refusal.issues?.map((issue) => issue.field)).toContain(field);
	});

	it.each([
		['no JSON', '{', {}, 400],
		['a figure that isn’t there', { values: { rbwHz: 300 } }, { figure: 'nothing' }, 404],
		['a unit that isn’t there', { values: { rbwHz: 300 } }, { unit: '999999' }, 404],
		['a unit that is no number', { values: { rbwHz: 300 } }, { unit: '1 OR 1' }, 404]
	])('refuses %s', async (_, body, place, status) => {
		expect((await post(body, place)).status).toBe(status);
	});
});

describe('turnFigure(actor, place, request, now)', () => {
	const turn = (place: { unitId: number; address: string }, at = now) =>
		turnFigure(actor, { figureId: 'hump', ...place }, { values: { rbwHz: 3000 } }, at);

	it('gives the same rows for the same choice, made once', async () => {
		const { exercise } = await createCourse();
		const first = await turn({ unitId: exercise.unitId, address: '192.0.2.9' });
		expect(await turn({ unitId: exercise.unitId, address: '192.0.2.9' })).toBe(first);
	});

	it('makes so many figures for one address and no more, until some time has passed; what is made costs nothing', async () => {
		const { exercise } = await createCourse();
		const unit = await Unit.findByPk(exercise.unitId);
		if (!unit) throw new Error('no unit');
		const { figures, lesson, editionId } = unit;
		// As many units as the limit and one more, each with a figure of its own to make.
		const points = { ...figures[0].settings, points: 101 };
		const quick = [{ ...figures[0], sweeps: 1, settings: points }];
		const units = await Unit.bulkCreate(
			Array.from({ length: FIGURE_LIMIT.capacity + 1 }, (_, i) => ({
				...{ editionId, number: 100 + i, slug: `unit-${i}`, title: 'Unit', summary: 'x' },
				lesson,
				figures: quick
			}))
		);
		const last = units[units.length - 1];
		const address = '192.0.2.10';
		for (const { id } of units.slice(0, -1)) await turn({ unitId: id, address });
		await turn({ unitId: units[0].id, address });
		await expect(turn({ unitId: last.id, address })).rejects.toMatchObject({
			code: 'too_many',
			retryAfterS: 1
		});
		await turn({ unitId: units[1].id, address });
		await turn({ unitId: last.id, address: '192.0.2.11' });
		const later = await Unit.create({ ...unit.get(), id: undefined, number: 99, slug: 'later' });
		await turn({ unitId: later.id, address }, new Date(now.getTime() + 1000));
	});
});
