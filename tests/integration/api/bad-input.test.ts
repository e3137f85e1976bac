/** Every door of the table, asked by whoever may, with what no page of ours sends. */
import { QueryTypes } from 'sequelize';
import { beforeAll, describe, expect, it } from 'vitest';
import { sequelize } from '$lib/server/db/connection';
import type { Actor } from '$lib/server/domain/role';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { createCourse } from '../../factories/course';
import { createUser } from '../../factories/user';
import { badForms, bentBodies, notJson } from './bad-bodies';
import { askAt, type Answer, type Asked } from './doors';
import { REACH, type Reach } from './permissions';

let actor: Actor;
let params: Record<string, string>;
beforeAll(async () => {
	({ actor } = await createUser('administrator'));
	const { exercise } = await createCourse();
	const { attempt } = await startAttempt(actor, exercise.slug, new Date());
	params = {
		...{ id: String(attempt.id), slug: exercise.slug, unitId: String(exercise.unitId), figureId: 'hump' },
		...{ course: 'none', unit: '06-spread', file: 'lesson.md' }
	};
});

const rowsWhere = (fits: (reach: Reach) => unknown): [string, Reach][] =>
	Object.entries(REACH).filter(([, reach]) => fits(reach));
const json = { 'content-type': 'application/json' };

/** A checksum of every table but those that count tries and keep the server's own keys. */
async function stored(): Promise<unknown> {
	const tables = await sequelize.query<Record<string, string>>('SHOW TABLES', { type: QueryTypes.SELECT });
	const names = tables
		.flatMap((row) => Object.values(row))
		.filter((name) => !['sign_in_buckets', 'server_keys'].includes(name));
	return sequelize.query(`CHECKSUM TABLE ${names.join(', ')}`, { type: QueryTypes.SELECT });
}

async function expectRefused(door: string, asked: Asked, what: string): Promise<Answer> {
	const answer = await askAt(door, actor, { params, ...asked });
	expect(answer.status, what).toBeGreaterThanOrEqual(400);
	expect(answer.status, what).toBeLessThan(500);
	expect(answer.problem?.message, what).toMatch(/\S/);
	return answer;
}

/** A part of the body is named by itself, by what it is part of, or by a part of it. */
const names = ({ problem }: Answer, field: string): boolean =>
	(problem?.issues ?? []).some(
		(issue) =>
			`${issue.field}.`.startsWith(`${field}.`) ||
			(issue.field !== '' && `${field}.`.startsWith(`${issue.field}.`))
	);

describe.each(rowsWhere(({ body }) => body))('%s', (door, { body, query, longTexts = [] }) => {
	it('refuses what is no JSON, or far too long, and stores nothing', async () => {
		const before = await stored();
		for (const [what, text, type] of notJson(body)) {
			const headers: Record<string, string> = type ? { 'content-type': type } : {};
			const { status } = await expectRefused(door, { query, body: text, headers }, what);
			expect([400, 422], what).toContain(status);
		}
		expect(await stored()).toEqual(before);
	});

	it('refuses every part of its body bent out of shape, names it, and stores nothing', async () => {
		const before = await stored();
		for (const [field, what, text] of bentBodies(body)) {
			if (what === 'far too long' && longTexts.includes(field)) continue;
			const told = `${field}: ${what}`;
			const answer = await expectRefused(door, { query, body: text, headers: json }, told);
			expect(answer.status, told).toBe(422);
			expect(names(answer, field), `${told}, refused as ${JSON.stringify(answer.problem)}`).toBe(true);
		}
		expect(await stored()).toEqual(before);
	});
});

describe.each(rowsWhere(({ form }) => form))('%s', (door, { form = {} }) => {
	it('refuses what is no form, names each field that is wrong, and stores nothing', async () => {
		const before = await stored();
		for (const { what, body, headers, field } of badForms(form)) {
			const answer = await expectRefused(door, { body, headers }, what);
			if (field) expect(names(answer, field), what).toBe(true);
		}
		expect(await stored()).toEqual(before);
	});
});

describe.each(Object.keys(REACH).filter((door) => door.includes('[')))('%s', (door) => {
	const { body, query } = REACH[door];
	const strange = [
		'',
		'0',
		'-1',
		'1e3',
		'x',
		'9'.repeat(30),
		'999999999',
		'1 OR 1=1',
		'../1',
		'a\u0000b',
		'ÿ'
	];

	it.each([...door.matchAll(/\[(\w+)\]/g)].map(([, name]) => name))(
		'has nothing under a %s that nobody gave out',
		async (name) => {
			const before = await stored();
			for (const value of strange) {
				const form = door.startsWith('action');
				const asked = {
					params: { ...params, [name]: value },
					query,
					body: form ? new URLSearchParams() : JSON.stringify(body ?? {}),
					headers: form ? undefined : json
				};
				expect((await askAt(door, actor, asked)).status, value).toBe(404);
			}
			expect(await stored()).toEqual(before);
		}
	);
});

describe.each(rowsWhere(({ query }) => query))('%s', (door, { query = '' }) => {
	it('refuses every number of its query out of bounds or out of shape, and names it', async () => {
		const good = Object.fromEntries(new URLSearchParams(query));
		for (const name of Object.keys(good)) {
			for (const value of ['', 'x', '-1', '0.5', '1e999', 'NaN', '99999999999', '0x', '1,2', '\u0000']) {
				const asked = { query: `?${new URLSearchParams({ ...good, [name]: value })}` };
				const answer = await expectRefused(door, asked, `${name}=${value}`);
				expect(answer.status).toBe(422);
				expect(names(answer, name), `${name}=${value}`).toBe(true);
			}
		}
		const strange = await expectRefused(
			door,
			{ query: `${query}&strange=1` },
			'a name that it does not know'
		);
		expect(names(strange, 'strange')).toBe(true);
	});
});
