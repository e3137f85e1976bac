import type { Transaction } from 'sequelize';
import { SetUp } from '$lib/server/db/models/set-up';

/** An attempt's settings log, oldest first. */
export const setUpLog = (attemptId: number, transaction?: Transaction): Promise<SetUp[]> =>
	SetUp.findAll({ where: { attemptId }, order: [['number', 'ASC']], transaction });

/** The newest set-up; null before the first sweep. */
export const latestSetUp = (attemptId: number, transaction?: Transaction): Promise<SetUp | null> =>
	SetUp.findOne({ where: { attemptId }, order: [['number', 'DESC']], transaction });

/** The set-up that swept `row`: the last one to begin at or before it that was swept at all. */
export const setUpOfRow = (log: SetUp[], row: number): SetUp | undefined =>
	log.findLast((setUp) => !setUp.tripped && setUp.firstRow <= row);
