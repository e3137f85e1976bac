import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import { sequelize } from '../connection';
import { Exercise } from './exercise';

/** One go of one person at one exercise. Rows of sweeps are never stored: seed, set-ups and counters give them again. */
export class Attempt extends Model<InferAttributes<Attempt>, InferCreationAttributes<Attempt>> {
	declare id: CreationOptional<number>;
	declare userId: number;
	declare editionId: number;
	declare exerciseId: number;
	/** 1, 2, … of this person at this exercise. */
	declare number: number;
	/** Takes no try and never counts. */
	declare practice: CreationOptional<boolean>;
	/** 128 random bits in hexadecimal. Leaves the server only when the attempt has closed. */
	declare seed: string;
	/** The sweep's arithmetic that this attempt was swept with. */
	declare engineVersion: number;
	/** The first row that nobody has begun to sweep. */
	declare nextRow: CreationOptional<number>;
	/** Receiver time used, s. */
	declare clockS: CreationOptional<number>;
	/** Bench clock when row nextRow − 1 ends, s: beyond clockS while it is being swept. */
	declare rowEndS: CreationOptional<number>;
	/** Names the one stream that may sweep. */
	declare streamToken: CreationOptional<string | null>;
	declare hintsRevealed: CreationOptional<number>;
	/** The input protection waits for a reset. */
	declare protectionTripped: CreationOptional<boolean>;
	/** How often it has tripped. */
	declare protectionTrips: CreationOptional<number>;
	declare startedAt: Date;
	declare closedAt: CreationOptional<Date | null>;
	declare exercise?: NonAttribute<Exercise>;
}

Attempt.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		userId: DataTypes.INTEGER.UNSIGNED,
		editionId: DataTypes.BIGINT.UNSIGNED,
		exerciseId: DataTypes.BIGINT.UNSIGNED,
		number: DataTypes.INTEGER.UNSIGNED,
		practice: { type: DataTypes.BOOLEAN, defaultValue: false },
		seed: DataTypes.CHAR(32),
		engineVersion: DataTypes.INTEGER.UNSIGNED,
		nextRow: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
		clockS: { type: DataTypes.DOUBLE, defaultValue: 0 },
		rowEndS: { type: DataTypes.DOUBLE, defaultValue: 0 },
		streamToken: { type: DataTypes.CHAR(32), allowNull: true },
		hintsRevealed: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
		protectionTripped: { type: DataTypes.BOOLEAN, defaultValue: false },
		protectionTrips: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
		startedAt: DataTypes.DATE(3),
		closedAt: { type: DataTypes.DATE(3), allowNull: true }
	},
	{ sequelize, tableName: 'attempts', timestamps: false }
);
Attempt.belongsTo(Exercise, { as: 'exercise', foreignKey: 'exerciseId' });
