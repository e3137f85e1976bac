import { inflateSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { entryView, logbookFilter, logbookView, mostEntries, mostInDocument } from '$lib/schemas/logbook';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { LogbookEntry } from '$lib/server/db/models/logbook-entry';
import type { Actor } from '$lib/server/domain/role';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import { exportLogbookCsv } from '$lib/server/services/logbook/export-csv';
import { exportLogbookPdf } from '$lib/server/services/logbook/export-pdf';
import { keepInLogbook } from '$lib/server/services/logbook/keep-in-logbook';
import { listLogbook } from '$lib/server/services/logbook/list-logbook';
import { getEntry, noteEntry, removeEntry } from '$lib/server/services/logbook/own-entry';
import { createAttempt, secretsOf, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 10e3, points: 101 };
const all = logbookFilter.parse({});

/** An open attempt with five sweeps drawn and a reading taken. */
async function createMeasured() {
	const { actor, attempt, slug } = await createAttempt();
	const { rows } = await sweep(actor, attempt.id, settings);
	await acknowledgeRows(actor, attempt.id, { row: 4 });
	const request = { kind: 'channel-power' as const, centreHz: 450e6, widthHz: 200e3 };
	const { reading } = await takeReading(
		actor,
		attempt.id,
		{ rows: { from: 4, to: 4 }, trace: 1, request },
		now
	);
	return { actor, attemptId: attempt.id, slug, reading, rows };
}
const keepPicture = (actor: Actor, attemptId: number, note = '') =>
	keepInLogbook(actor, attemptId, { kind: 'picture', row: 4, note }, now);

describe('keepInLogbook(actor, attemptId, request, now)', () => {
	it('keeps a reading once, as the server took it', async () => {
		const { actor, attemptId, reading } = await createMeasured();
		const request = { kind: 'reading' as const, readingId: reading.id, note: 'First try' };
		const first = await keepInLogbook(actor, attemptId, request, now);
		expect(first).toMatchObject({
			created: true,
			entry: { what: 'channel power, 200\u00a0kHz', note: 'First try' }
		});
		const again = await Promise.all([1, 2, 3].map(() => keepInLogbook(actor, attemptId, request, now)));
		expect(again.every(({ created, entry }) => !created && entry.id === first.entry.id)).toBe(true);
		const entry = await getEntry(actor, first.entry.id);
		expect(entryView.parse(entry)).toEqual(entry);
		expect(Number(entry.value?.figure.replace('−', '-'))).toBeCloseTo(reading.value, 1);
		expect(entry.setUp[0].text).toContain('span 1');
	});

	it('draws a picture from the rows that were swept, and keeps it when they can’t be made again', async () => {
		const { actor, attemptId, rows } = await createMeasured();
		const { entry } = await keepPicture(actor, attemptId);
		await Attempt.update({ engineVersion: 0 }, { where: { id: attemptId } });
		const { picture, what } = await getEntry(actor, entry.id);
		expect(what).toBe('picture, sweep 5');
		expect(picture?.traces[0].levelsDbm[50]).toBeCloseTo(rows.get(4)![50], 2);
		await expect(keepPicture(actor, attemptId)).rejects.toMatchObject({ code: 'conflict' });
	});

	it('refuses a sweep that was not drawn, a set-up before any sweep, and what isn’t one’s own', async () => {
		const { actor, attemptId, reading } = await createMeasured();
		const beyond = keepInLogbook(actor, attemptId, { kind: 'picture', row: 90, note: '' }, now);
		await expect(beyond).rejects.toMatchObject({ code: 'conflict' });
		const fresh = await createAttempt();
		const early = keepInLogbook(fresh.actor, fresh.attempt.id, { kind: 'set-up', note: '' }, now);
		await expect(early).rejects.toMatchObject({ code: 'conflict' });
		const foreign = { kind: 'reading' as const, readingId: reading.id, note: '' };
		await expect(keepInLogbook(fresh.actor, fresh.attempt.id, foreign, now)).rejects.toMatchObject({
			code: 'not_found'
		});
		await expect(keepPicture(fresh.actor, attemptId)).rejects.toMatchObject({ code: 'not_found' });
		const { actor: coordinator } = await createUser('coordinator');
		await expect(keepPicture(coordinator, attemptId)).rejects.toMatchObject({ code: 'forbidden' });
		expect(await LogbookEntry.count({ where: { userId: [actor.id, fresh.actor.id] } })).toBe(0);
	});

	it('tells nothing of the signal but what was measured', async () => {
		const { actor, attemptId } = await createMeasured();
		const { entry } = await keepPicture(actor, attemptId);
		const { marks } = await secretsOf(attemptId);
		const text = JSON.stringify(await getEntry(actor, entry.id));
		expect(marks.filter((mark) => text.includes(mark))).toEqual([]);
	});

	it('holds so many entries and no more', async () => {
		const { actor, attemptId } = await createMeasured();
		await keepPicture(actor, attemptId);
		const { dataValues } = (await LogbookEntry.findOne({ where: { userId: actor.id } })) as LogbookEntry;
		const { id: _, ...copy } = dataValues;
		await LogbookEntry.bulkCreate(Array.from({ length: mostEntries - 1 }, () => ({ ...copy })));
		await expect(keepPicture(actor, attemptId)).rejects.toMatchObject({ code: 'conflict' });
	}, 60_000);
});

describe('the logbook', () => {
	it('is searched by words, exercise, kind and day, and shows only one’s own', async () => {
		const { actor, attemptId, slug, reading } = await createMeasured();
		await keepPicture(actor, attemptId, '100 % odd_shoulder');
		await keepInLogbook(actor, attemptId, { kind: 'reading', readingId: reading.id, note: '' }, now);
		await keepInLogbook(actor, attemptId, { kind: 'set-up', note: '' }, new Date('2026-03-05T23:59:59Z'));
		const { actor: other } = await createUser('apprentice');
		const kinds = async (over: Record<string, string>, who = actor) => {
			const view = await listLogbook(who, logbookFilter.parse(over));
			expect(logbookView.parse(view)).toEqual(view);
			return view.entries.map(({ kind }) => kind);
		};
		expect(await kinds({})).toEqual(['set-up', 'reading', 'picture']);
		expect(await kinds({}, other)).toEqual([]);
		expect(await kinds({ q: 'shoulder odd' })).toEqual(['picture']);
		expect(await kinds({ q: '%' })).toEqual(['picture']);
		expect(await kinds({ q: 'oddXshoulder' })).toEqual([]);
		expect(await kinds({ q: 'CHANNEL' })).toEqual(['reading']);
		expect(await kinds({ exercise: slug, kind: 'reading' })).toEqual(['reading']);
		expect(await kinds({ exercise: 'another' })).toEqual([]);
		expect(await kinds({ from: '2026-03-03', to: '2026-03-05' })).toEqual(['set-up']);
		expect(await kinds({ to: '2026-03-02' })).toEqual(['reading', 'picture']);
	});

	it('lets its owner write notes and take entries out, and nobody else', async () => {
		const { actor, attemptId } = await createMeasured();
		const { entry } = await keepPicture(actor, attemptId);
		const { actor: other } = await createUser('administrator');
		const asks = [getEntry, removeEntry, (who: Actor, id: number) => noteEntry(who, id, 'x')];
		for (const ask of asks) await expect(ask(other, entry.id)).rejects.toMatchObject({ code: 'not_found' });
		await noteEntry(actor, entry.id, 'Pad was in.');
		expect(await getEntry(actor, entry.id)).toMatchObject({ note: 'Pad was in.' });
		await removeEntry(actor, entry.id);
		await expect(getEntry(actor, entry.id)).rejects.toMatchObject({ code: 'not_found' });
	});

	it('goes out as a table in which no note is a formula', async () => {
		const { actor, attemptId, reading } = await createMeasured();
		await keepInLogbook(
			actor,
			attemptId,
			{ kind: 'reading', readingId: reading.id, note: '=HYPERLINK("x")' },
			now
		);
		const [head, line] = (await exportLogbookCsv(actor, all)).replace('\uFEFF', '').split('\r\n');
		expect(head.split(',')).toHaveLength(15);
		expect(line).toContain(`,${reading.value},dBm,`);
		expect(line.endsWith(`,"'=HYPERLINK(""x"")"`)).toBe(true);
	});

	it('goes out as a document of the entries chosen, with the type embedded and nobody else’s in it', async () => {
		const { actor, attemptId, reading } = await createMeasured();
		const { entry: picture } = await keepPicture(actor, attemptId, 'Ž and Ω, 😀');
		const request = { kind: 'reading' as const, readingId: reading.id, note: '' };
		const { entry } = await keepInLogbook(actor, attemptId, request, now);
		const pdf = await exportLogbookPdf(actor, [picture.id, entry.id], now);
		expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
		const text = pdf.toString('latin1');
		expect(text.match(/\/FontFile[23] /g)?.length).toBeGreaterThanOrEqual(2);
		expect(text).not.toMatch(/\/BaseFont \/Helvetica/);
		// The picture's lines: a hundred stretches of its trace.
		expect(drawn(pdf).match(/ l\n/g)?.length).toBeGreaterThan(100);
		const { actor: other } = await createUser('apprentice');
		await expect(exportLogbookPdf(other, [entry.id], now)).rejects.toMatchObject({ code: 'not_found' });
		await expect(exportLogbookPdf(actor, [], now)).rejects.toMatchObject({ code: 'invalid' });
		const many = Array.from({ length: mostInDocument + 1 }, (_, i) => i + 1);
		await expect(exportLogbookPdf(actor, many, now)).rejects.toMatchObject({ code: 'invalid' });
	});
});

/** What a document draws: its streams that are packed as text. */
function drawn(pdf: Buffer): string {
	const text = pdf.toString('latin1');
	const streams = [...text.matchAll(/\/Filter \/FlateDecode\n>>\nstream\n/g)].map(({ index, 0: head }) => {
		const from = index + head.length;
		return pdf.subarray(from, text.indexOf('\nendstream', from));
	});
	return streams.map((stream) => inflateSync(stream).toString('latin1')).join('\n');
}
