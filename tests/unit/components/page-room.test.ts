import { describe, expect, it } from 'vitest';
import { pageRoom } from '$lib/components/report/page-room';
import type { ReportView } from '$lib/schemas/report';

type Reading = ReportView['readings'][number];
const remark = 'A peak detector shows the crests of noise, several dB above its power.';
const reading = (id: number, remarks = 0) =>
	({
		id,
		request: { kind: 'channel-power', centreHz: 450e6, widthHz: 25e3 },
		remarks: Array.from({ length: remarks }, (_, i) => ({ code: `remark-${i}`, text: remark }))
	}) as unknown as Reading;
const answer = (readingId: number | null) =>
	({
		id: 'a',
		text: 'Channel power at the coupler’s port, in 25 kHz',
		readingId
	}) as ReportView['answers'][number];
const room = (readings: Reading[], answers = [answer(null)]) =>
	pageRoom({ readings, answers }, ['centre 450 MHz', 'resolution 300 Hz'], ['Transmitter – Receiver']);
const ids = ({ readings }: ReturnType<typeof room>) => readings.map(({ reading: { id } }) => id);

describe('pageRoom(report)', () => {
	it('has room for a few readings with all their remarks, in the order taken', () => {
		const page = room([reading(1, 1), reading(2), reading(3, 2)]);
		expect([ids(page), page.left, page.unremarked]).toEqual([[1, 2, 3], 0, 0]);
	});

	it('leaves out readings that no answer rests on, and says how many', () => {
		const page = room(Array.from({ length: 40 }, (_, i) => reading(i + 1)));
		expect(page.left).toBeGreaterThan(10);
		expect(page.readings.length + page.left).toBe(40);
	});

	it('holds fewer readings the more is said of each', () => {
		const many = (remarks: number) => room(Array.from({ length: 40 }, (_, i) => reading(i + 1, remarks)));
		expect(many(4).readings.length).toBeLessThan(many(0).readings.length / 2);
	});

	it('always shows what an answer rests on, if need be without its remarks', () => {
		const readings = Array.from({ length: 40 }, (_, i) => reading(i + 1, 6));
		const page = room(readings, [answer(40), answer(39), answer(38), answer(37)]);
		expect(ids(page)).toEqual([37, 38, 39, 40]);
		expect(page.unremarked).toBeGreaterThan(0);
	});
});
