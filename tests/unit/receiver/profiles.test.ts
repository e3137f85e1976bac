import { describe, expect, it } from 'vitest';
import { receiverProfile } from '$lib/schemas/receiver';
import { field, modest, profileNamed } from '$lib/server/bench/receiver/profiles';
import { tableDb } from '$lib/server/bench/receiver/table-db';

describe('the receivers that ship', () => {
	it.each([field, modest])('$name is a valid profile', (profile) =>
		expect(receiverProfile.safeParse(profile).error).toBeUndefined()
	);
	it('are found by name', () =>
		expect([profileNamed('field'), profileNamed('modest')]).toEqual([field, modest]));
	it('are refused by name when unknown', () =>
		expect(() => profileNamed('golden')).toThrow('must be a profile or one of field, modest; given golden'));
	it('leave the modest one worse in every way that a learner can measure', () => {
		expect(tableDb(modest.noiseFigureDb, 1e9)).toBeGreaterThan(tableDb(field.noiseFigureDb, 1e9) + 5);
		expect(modest.toiDbm).toBeLessThan(field.toiDbm as number);
		expect(modest.shiDbm).toBeLessThan(field.shiDbm as number);
	});
});

describe('tableDb(table, frequencyHz)', () => {
	const table = [
		{ frequencyHz: 1e9, db: 3 },
		{ frequencyHz: 3e9, db: 5 }
	];
	it('is straight in dB between points', () => expect(tableDb(table, 1.5e9)).toBeCloseTo(3.5, 12));
	it('is flat outside', () => expect([tableDb(table, 0), tableDb(table, 9e9)]).toEqual([3, 5]));
	it('passes through its points', () => expect([tableDb(table, 1e9), tableDb(table, 3e9)]).toEqual([3, 5]));
});
