/** The endpoints of an attempt, each with what it likes, and a way to ask there. */
import type { RequestEvent } from '@sveltejs/kit';
import { expect } from 'vitest';
import { QueryTypes } from 'sequelize';
import { problemResponse } from '$lib/schemas/attempt';
import { sequelize } from '$lib/server/db/connection';
import type { Actor } from '$lib/server/domain/role';
import { createAttempt, sweep } from '../../factories/attempt';
import { createEvent } from '../../factories/event';
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

export type Handler = (event: RequestEvent) => Promise<Response>;
export const settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };

/** Every endpoint that takes a body, with one it likes. */
export const posts: Record<string, { handler: Handler; good: () => unknown }> = {
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
export const gets = {
	view,
	hint,
	finding,
	rows,
	setUps,
	doneRight,
	doneRightRows,
	abandon
} as unknown as Record<string, Handler>;
/** What those of them ask for that ask for something. */
export const queries: Record<string, string> = { rows: '?from=0&to=1', doneRightRows: '?step=0' };

export const post = (name: string, actor: Actor | null, id: string, body: unknown) =>
	posts[name].handler(
		createEvent(
			actor,
			{ id },
			{ method: 'POST', body: typeof body === 'string' ? body : JSON.stringify(body) }
		)
	);

export async function checksums(): Promise<unknown> {
	const tables = 'attempts, set_ups, readings, drafts, markings, answers, findings';
	return sequelize.query(`CHECKSUM TABLE ${tables}`, { type: QueryTypes.SELECT });
}

/** Somebody's attempt with two rows swept. */
export async function createSweptAttempt(): Promise<{ actor: Actor; id: string }> {
	const { actor: owner, attempt } = await createAttempt();
	await sweep(owner, attempt.id, settings, { sweeps: 2 });
	return { actor: owner, id: String(attempt.id) };
}

export async function refused(response: Response): Promise<void> {
	expect(response.status).toBeGreaterThanOrEqual(400);
	expect(response.status).toBeLessThan(500);
	problemResponse.parse(await response.json());
}
