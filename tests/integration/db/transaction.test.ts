import { DataTypes, QueryTypes, type Transaction } from 'sequelize';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { sequelize } from '$lib/server/db/connection';
import { inTransaction } from '$lib/server/db/transaction';

const slip = () => sequelize.getQueryInterface();
const all = (transaction?: Transaction) =>
	sequelize.query<{ id: number; word: string }>('SELECT * FROM slip', {
		type: QueryTypes.SELECT,
		transaction
	});

beforeAll(() =>
	slip().createTable('slip', { id: { type: DataTypes.INTEGER, primaryKey: true }, word: DataTypes.STRING(5) })
);
beforeEach(() => sequelize.query('DELETE FROM slip'));

describe('inTransaction(work)', () => {
	it('keeps what the work wrote and gives back what it returned', async () => {
		const given = await inTransaction(async (transaction) => {
			await slip().bulkInsert('slip', [{ id: 1, word: 'kept' }], { transaction });
			return 'given';
		});
		expect(given).toBe('given');
		expect(await all()).toEqual([{ id: 1, word: 'kept' }]);
	});

	it('leaves the table as it was when the work fails late', async () => {
		const failing = inTransaction(async (transaction) => {
			await slip().bulkInsert('slip', [{ id: 2, word: 'lost' }], { transaction });
			throw new Error('late');
		});
		await expect(failing).rejects.toThrow('late');
		expect(await all()).toEqual([]);
	});

	it('sees what others commit meanwhile (READ COMMITTED)', async () => {
		const count = async (transaction: Transaction) => (await all(transaction)).length;
		const seen = await inTransaction(async (transaction) => {
			const before = await count(transaction);
			await slip().bulkInsert('slip', [{ id: 3, word: 'other' }]);
			return [before, await count(transaction)];
		});
		expect(seen).toEqual([0, 1]);
	});
});

describe('the database the application talks to', () => {
	it('refuses a text that is too long instead of cutting it', async () => {
		await expect(slip().bulkInsert('slip', [{ id: 4, word: 'too long' }])).rejects.toThrow(/too long/i);
		expect(await all()).toEqual([]);
	});

	it('keeps its clock in UTC and its text in utf8mb4', async () => {
		const [{ zone, charset, collation }] = await sequelize.query<Record<string, string>>(
			`SELECT @@session.time_zone AS zone, @@character_set_connection AS charset, TABLE_COLLATION AS collation
			 FROM information_schema.tables WHERE table_schema = DATABASE() AND table_name = 'slip'`,
			{ type: QueryTypes.SELECT }
		);
		expect({ zone, charset, collation }).toEqual({
			zone: '+00:00',
			charset: 'utf8mb4',
			collation: 'utf8mb4_unicode_ci'
		});
	});
});
