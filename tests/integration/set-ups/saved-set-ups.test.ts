import type { RequestEvent } from '@sveltejs/kit';
import { describe, expect, it } from 'vitest';
import { problemResponse } from '$lib/schemas/attempt';
import { mostSavedSetUps, savedSetUpsResponse, saveSetUpResponse } from '$lib/schemas/saved-set-up';
import { SavedSetUp } from '$lib/server/db/models/saved-set-up';
import type { Actor } from '$lib/server/domain/role';
import { listSavedSetUps } from '$lib/server/services/set-ups/list-saved-set-ups';
import { removeSetUp } from '$lib/server/services/set-ups/remove-set-up';
import { saveSetUp } from '$lib/server/services/set-ups/save-set-up';
import { createEvent } from '../../factories/event';
import { createUser } from '../../factories/user';
import { GET, POST } from '../../../src/routes/api/set-ups/+server';
import { DELETE } from '../../../src/routes/api/set-ups/[id]/+server';

const now = new Date('2026-03-02T10:00:00Z');
const settings = { centreHz: 450e6, spanHz: 1e6, correctionDb: [{ frequencyHz: 450e6, db: 3.2 }] };
type Handler = (event: RequestEvent) => Promise<Response>;
const post = (actor: Actor | null, body: unknown) =>
	(POST as unknown as Handler)(createEvent(actor, {}, { method: 'POST', body: JSON.stringify(body) }));
const namesOf = async (actor: Actor) => (await listSavedSetUps(actor)).setUps.map(({ name }) => name);

describe('saveSetUp(actor, {name, settings}, now)', () => {
	it('keeps a set-up under its name, and another in its place under the same name', async () => {
		const { actor } = await createUser('apprentice');
		const first = await saveSetUp(actor, { name: 'Harbour', settings }, now);
		expect(saveSetUpResponse.parse(first)).toMatchObject({ replaced: false, setUp: { settings } });
		await saveSetUp(actor, { name: 'Band', settings: {} }, now);
		const again = await saveSetUp(actor, { name: 'Harbour', settings: { rbwHz: 300 } }, now);
		expect(again).toMatchObject({ replaced: true, setUp: { id: first.setUp.id, settings: { rbwHz: 300 } } });
		expect(savedSetUpsResponse.parse(await listSavedSetUps(actor)).setUps).toHaveLength(2);
		expect(await namesOf(actor)).toEqual(['Band', 'Harbour']);
	});

	it('keeps no more than the limit, however many come at once', async () => {
		const { actor } = await createUser('apprentice');
		for (let i = 0; i < mostSavedSetUps - 2; i++) await saveSetUp(actor, { name: `${i}`, settings: {} }, now);
		const late = await Promise.allSettled(
			['a', 'b', 'c', 'd', 'e'].map((name) => saveSetUp(actor, { name, settings: {} }, now))
		);
		expect(late.filter(({ status }) => status === 'fulfilled')).toHaveLength(2);
		expect(await SavedSetUp.count({ where: { userId: actor.id } })).toBe(mostSavedSetUps);
		expect((await saveSetUp(actor, { name: '0', settings: { rbwHz: 1e3 } }, now)).replaced).toBe(true);
	});

	it('leaves the table unchanged when it fails late', async () => {
		const { actor } = await createUser('apprentice');
		SavedSetUp.addHook('afterCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(saveSetUp(actor, { name: 'x', settings: {} }, now)).rejects.toThrow('late');
		SavedSetUp.removeHook('afterCreate', 'fail late');
		expect(await namesOf(actor)).toEqual([]);
	});
});

describe('removeSetUp(actor, id)', () => {
	it('removes one’s own and nobody else’s', async () => {
		const { actor } = await createUser('apprentice');
		const { actor: stranger } = await createUser('administrator');
		const { setUp } = await saveSetUp(actor, { name: 'Harbour', settings }, now);
		await expect(removeSetUp(stranger, setUp.id)).rejects.toMatchObject({ code: 'not_found' });
		expect(await namesOf(actor)).toEqual(['Harbour']);
		await removeSetUp(actor, setUp.id);
		expect(await namesOf(actor)).toEqual([]);
		await expect(removeSetUp(actor, setUp.id)).rejects.toMatchObject({ code: 'not_found' });
	});
});

describe('/api/set-ups', () => {
	it.each([
		['no name', { name: ' ', settings }, 'name'],
		['a name of two lines', { name: 'a\nb', settings }, 'name'],
		['a name too long', { name: 'x'.repeat(61), settings }, 'name'],
		['a resolution below nothing', { name: 'a', settings: { rbwHz: -1 } }, 'settings.rbwHz'],
		['a field it doesn’t know', { name: 'a', settings: { colour: 1 } }, 'settings.colour'],
		['more than is asked for', { name: 'a', settings, userId: 1 }, 'userId'],
		[
			'a table too long',
			{
				name: 'a',
				settings: { correctionDb: Array.from({ length: 900 }, (_, i) => ({ frequencyHz: i + 1, db: 1 })) }
			},
			'settings'
		]
	])('refuses %s, naming the field, and keeps nothing', async (_, body, field) => {
		const { actor } = await createUser('apprentice');
		const response = await post(actor, body);
		expect(response.status).toBe(422);
		const problem = problemResponse.parse(await response.json());
		expect(problem.issues?.map((issue) => issue.field)).toEqual([field]);
		expect(await namesOf(actor)).toEqual([]);
	});

	it('is closed to whoever has not signed in, and to roles without a bench', async () => {
		expect((await post(null, { name: 'a', settings })).status).toBe(401);
		expect((await (GET as unknown as Handler)(createEvent(null, {}))).status).toBe(401);
		expect((await (DELETE as unknown as Handler)(createEvent(null, { id: '1' }))).status).toBe(401);
		const { actor: coordinator } = await createUser('coordinator');
		expect((await post(coordinator, { name: 'a', settings })).status).toBe(403);
	});

	it('saves, lists and removes', async () => {
		const { actor } = await createUser('instructor');
		const saved = saveSetUpResponse.parse(await (await post(actor, { name: 'Harbour', settings })).json());
		const listed = await (GET as unknown as Handler)(createEvent(actor, {}));
		expect(savedSetUpsResponse.parse(await listed.json()).setUps).toEqual([saved.setUp]);
		const remove = (id: string) => (DELETE as unknown as Handler)(createEvent(actor, { id }));
		expect((await remove(String(saved.setUp.id))).status).toBe(204);
		for (const id of ['x', '0', '999999999', String(saved.setUp.id)])
			expect((await remove(id)).status).toBe(404);
	});
});
