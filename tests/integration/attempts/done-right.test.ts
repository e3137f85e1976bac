import { describe, expect, it } from 'vitest';
import { combineRows } from '$lib/measure/combine-rows';
import { doneRightResponse } from '$lib/schemas/done-right';
import { FrameDecoder, type PieceFrame } from '$lib/schemas/frames';
import { Attempt } from '$lib/server/db/models/attempt';
import type { Actor } from '$lib/server/domain/role';
import { abandonAttempt } from '$lib/server/services/attempts/abandon-attempt';
import { getDoneRight } from '$lib/server/services/attempts/get-done-right';
import { streamDoneRightRows } from '$lib/server/services/attempts/stream-done-right-rows';
import { createAttempt } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');

async function createClosed() {
	const { actor, attempt } = await createAttempt();
	const { finding } = await abandonAttempt(actor, attempt.id, now);
	return { actor, attempt, finding };
}

async function rowsOf(actor: Actor, attemptId: number, step: number): Promise<PieceFrame[]> {
	const decoder = new FrameDecoder();
	const stream = await streamDoneRightRows(actor, attemptId, step);
	const bytes = new Uint8Array(await new Response(stream).arrayBuffer());
	return decoder.push(bytes).filter((frame) => frame.type === 'piece');
}

describe('getDoneRight(actor, attemptId)', () => {
	it('plays the taught method on the attempt’s own signal, as the finding says it', async () => {
		const { actor, attempt, finding } = await createClosed();
		const { steps } = doneRightResponse.parse(await getDoneRight(actor, attempt.id));
		expect(steps.map(({ text, value, why }) => ({ text, value, why }))).toEqual(
			finding.doneRight.map(({ text, value, why }) => ({ text, value, why }))
		);
		expect(steps.map((step) => step.do)).toEqual(['set', 'sweep', 'read', 'answer', 'read', 'answer']);
		expect(steps[0]).toMatchObject({ rows: null, resolved: { detector: 'average', points: 501 } });
		expect(steps[1].rows).toEqual({ from: 0, to: 19 });
		expect(steps[2].reading?.mark).toEqual({ startHz: 449.9e6, stopHz: 450.1e6 });
		const width = steps[4].reading?.mark as { startHz: number; stopHz: number };
		expect(width.stopHz - width.startHz).toBeCloseTo(steps[4].value!.value, 3);
	});

	it('sends the rows that its readings were taken off', async () => {
		const { actor, attempt } = await createClosed();
		const { steps } = await getDoneRight(actor, attempt.id);
		const pieces = await rowsOf(actor, attempt.id, 2);
		expect(pieces.map(({ row }) => row)).toEqual(Array.from({ length: 20 }, (_, i) => i));
		const { startHz, stopHz, rbwHz } = steps[2].resolved;
		const levels = combineRows([pieces[19].levelsDbm], 'live', 1, 'power');
		const cell = (stopHz - startHz) / 500;
		const milliwatts = levels.reduce((sum, level, i) => {
			const atHz = startHz + i * cell;
			return Math.abs(atHz - 450e6) < 100e3 ? sum + 10 ** (level / 10) : sum;
		}, 0);
		const powerDbm = 10 * Math.log10((milliwatts * cell) / (1.0645 * rbwHz));
		expect(powerDbm).toBeCloseTo(steps[2].value!.value, 1);
	});

	it('shows a set-up before its first sweep by the sweep that comes next', async () => {
		const { actor, attempt } = await createClosed();
		const [preview, ...more] = await rowsOf(actor, attempt.id, 0);
		expect(more).toEqual([]);
		expect(preview.levelsDbm).toEqual((await rowsOf(actor, attempt.id, 1))[0].levelsDbm);
	});

	it('has no rows for a step that the method hasn’t, naming the field', async () => {
		const { actor, attempt } = await createClosed();
		await expect(rowsOf(actor, attempt.id, 6)).rejects.toMatchObject({
			code: 'invalid',
			issues: [{ field: 'step' }]
		});
	});

	it('says nothing while the attempt is open, to its owner or to anybody', async () => {
		const { actor, attempt } = await createAttempt();
		const { actor: administrator } = await createUser('administrator');
		for (const who of [actor, administrator]) {
			await expect(getDoneRight(who, attempt.id)).rejects.toMatchObject({ code: 'conflict' });
			const asked = streamDoneRightRows(who, attempt.id, 0);
			await expect(asked).rejects.toMatchObject({ code: 'conflict' });
		}
	});

	it('is not there for a stranger, and refused to a role that is shown no truths', async () => {
		const { actor, attempt } = await createClosed();
		const { actor: stranger } = await createUser('apprentice');
		await expect(getDoneRight(stranger, attempt.id)).rejects.toMatchObject({ code: 'not_found' });
		const coordinator: Actor = { id: actor.id, roles: ['coordinator'] };
		await expect(getDoneRight(coordinator, attempt.id)).rejects.toMatchObject({ code: 'forbidden' });
	});

	it('is refused for an attempt of an earlier engine, whose rows can’t be made again', async () => {
		const { actor, attempt } = await createClosed();
		await Attempt.update({ engineVersion: 0 }, { where: { id: attempt.id } });
		await expect(getDoneRight(actor, attempt.id)).rejects.toMatchObject({ code: 'conflict' });
	});
});
