import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import type { Remark } from '$lib/measure/remark';
import type { ReadingRequest } from '$lib/measure/reading-request';
import type { TraceMode } from '$lib/schemas/settings';
import { sequelize } from '../connection';
import { SetUp } from './set-up';

/** A number the server took off a replayed trace, and what it takes to take it again. */
export class Reading extends Model<InferAttributes<Reading>, InferCreationAttributes<Reading>> {
	declare id: CreationOptional<number>;
	declare attemptId: number;
	/** The set-up that swept the last row. */
	declare setUpId: number;
	declare fromRow: number;
	declare toRow: number;
	/** 1 … 4 */
	declare trace: number;
	declare mode: TraceMode;
	/** Rows that make up the trace. */
	declare rowCount: number;
	declare request: ReadingRequest;
	declare kind: string;
	declare value: number;
	declare unit: string;
	/** One standard deviation, in `unit`. */
	declare spread: number;
	declare remarks: Remark[];
	declare parts: unknown;
	/** SHA-256 of the replayed trace as float32. */
	declare traceHash: string;
	declare engineVersion: number;
	declare takenAt: Date;
	declare setUp?: NonAttribute<SetUp>;
}

Reading.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		attemptId: DataTypes.BIGINT.UNSIGNED,
		setUpId: DataTypes.BIGINT.UNSIGNED,
		fromRow: DataTypes.INTEGER.UNSIGNED,
		toRow: DataTypes.INTEGER.UNSIGNED,
		trace: DataTypes.INTEGER.UNSIGNED,
		mode: DataTypes.STRING(16),
		rowCount: DataTypes.INTEGER.UNSIGNED,
		request: DataTypes.JSON,
		kind: DataTypes.STRING(40),
		value: DataTypes.DOUBLE,
		unit: DataTypes.STRING(16),
		spread: DataTypes.DOUBLE,
		remarks: DataTypes.JSON,
		parts: { type: DataTypes.JSON, allowNull: true },
		traceHash: DataTypes.CHAR(64),
		engineVersion: DataTypes.INTEGER.UNSIGNED,
		takenAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'readings', timestamps: false }
);
Reading.belongsTo(SetUp, { as: 'setUp', foreignKey: 'setUpId' });
