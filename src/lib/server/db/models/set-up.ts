import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import type { Settings } from '$lib/schemas/settings';
import { sequelize } from '../connection';

/** An entry of an attempt's settings log: what was set, and from which row and bench clock on. */
export class SetUp extends Model<InferAttributes<SetUp>, InferCreationAttributes<SetUp>> {
	declare id: CreationOptional<number>;
	declare attemptId: number;
	/** 0, 1, … within the attempt. */
	declare number: number;
	/** As typed. */
	declare settings: Settings;
	declare firstRow: number;
	/** Bench clock when `firstRow` began, s. */
	declare clockS: number;
	/** Where holds and averages start: in this set-up, or in an earlier one that differs in traces and reference alone. */
	declare restartRow: number;
	/** One more than its last whole row, once another set-up has followed; null while it is the newest. */
	declare endRow: CreationOptional<number | null>;
	/** The last row that the page said it drew; null before the first. Only these are evidence. */
	declare drawnTo: CreationOptional<number | null>;
	/** The input protection tripped with it, so it was never swept. */
	declare tripped: CreationOptional<boolean>;
	declare loggedAt: Date;
}

SetUp.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		attemptId: DataTypes.BIGINT.UNSIGNED,
		number: DataTypes.INTEGER.UNSIGNED,
		settings: DataTypes.JSON,
		firstRow: DataTypes.INTEGER.UNSIGNED,
		clockS: DataTypes.DOUBLE,
		restartRow: DataTypes.INTEGER.UNSIGNED,
		endRow: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
		drawnTo: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
		tripped: { type: DataTypes.BOOLEAN, defaultValue: false },
		loggedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'set_ups', timestamps: false }
);
