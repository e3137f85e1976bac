import { Transaction } from 'sequelize';
import { sequelize } from './connection';

/**
 * Runs `work` in one transaction: committed when it returns, rolled back when it throws.
 * Every query inside must be given the transaction; one that isn't runs on another connection and stays.
 * READ COMMITTED, so that a row lock waits only for its own row and not for a gap beside it.
 */
export function inTransaction<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
	return sequelize.transaction({ isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED }, work);
}
