import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import type { BenchRequest } from '$lib/schemas/reading';
import type { TraceMode } from '$lib/schemas/settings';
import { sequelize } from '../connection';
import { SetUp } from './set-up';

/** A number the server took, off a replayed trace or by counting, and what it takes to take it again. */
export class Reading extends Model<InferAttributes<Reading>, InferCreationAttributes<Reading>> {
	declare id: CreationOptional<number>;
	declare attemptId: number;
	/** The set-up that swept the last row, or that counted. */
	declare setUpId: number;
	/** A count has a row number of its own. */
	declare fromRow: number;
	declare toRow: number;
	/** 1 … 4; null for a count, as all that tells of a trace. */
	declare trace: number | null;
	declare mode: TraceMode | null;
	/** Rows that make up the trace; 1 for a count. */
	declare rowCount: number;
	declare request: BenchRequest;
	declare kind: string;
	declare value: number;
	declare unit: string;
	/** One standard deviation, in `unit`. */
	declare spread: number;
	declare remarks: { code: string; text: string }[];
	declare parts: unknown;
	/** SHA-256 of the replayed trace as float32; null for a count. */
	declare traceHash: string | null;
	/** Bench clock when a count began, s; null for a reading off a trace. */
	declare clockS: CreationOptional<number | null>;
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
		trace: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
		mode: { type: DataTypes.STRING(16), allowNull: true },
		rowCount: DataTypes.INTEGER.UNSIGNED,
		request: DataTypes.JSON,
		kind: DataTypes.STRING(40),
		value: DataTypes.DOUBLE,
		unit: DataTypes.STRING(16),
		spread: DataTypes.DOUBLE,
		remarks: DataTypes.JSON,
		parts: { type: DataTypes.JSON, allowNull: true },
		traceHash: { type: DataTypes.CHAR(64), allowNull: true },
		clockS: { type: DataTypes.DOUBLE, allowNull: true },
		engineVersion: DataTypes.INTEGER.UNSIGNED,
		takenAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'readings', timestamps: false }
);
Reading.belongsTo(SetUp, { as: 'setUp', foreignKey: 'setUpId' });
