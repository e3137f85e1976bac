import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';

export const jobStates = ['waiting', 'running', 'done', 'failed', 'cancelled'] as const;
export type JobState = (typeof jobStates)[number];

/** A piece of work that outlasts a request. `server/jobs` claims and ends it. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
	declare id: CreationOptional<number>;
	declare kind: string;
	/** What it is about: of one kind and subject, one job at most waits or runs. */
	declare subject: string;
	declare payload: unknown;
	declare state: CreationOptional<JobState>;
	/** How often it has been claimed. */
	declare tries: CreationOptional<number>;
	declare runAfter: Date;
	/** Whoever runs it holds this token until then, and renews it; a job whose lease is over is claimed again. */
	declare leaseToken: CreationOptional<string | null>;
	declare leaseUntil: CreationOptional<Date | null>;
	declare done: CreationOptional<number>;
	declare total: CreationOptional<number>;
	/** Why it failed. */
	declare problem: CreationOptional<string | null>;
	declare createdBy: number | null;
	declare createdAt: Date;
	declare endedAt: CreationOptional<Date | null>;
}

Job.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		kind: DataTypes.STRING(40),
		subject: DataTypes.STRING(100),
		payload: DataTypes.JSON,
		state: { type: DataTypes.ENUM(...jobStates), defaultValue: 'waiting' },
		tries: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
		runAfter: DataTypes.DATE(3),
		leaseToken: { type: DataTypes.CHAR(32), allowNull: true },
		leaseUntil: { type: DataTypes.DATE(3), allowNull: true },
		done: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
		total: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
		problem: { type: DataTypes.STRING(2000), allowNull: true },
		createdBy: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
		createdAt: DataTypes.DATE(3),
		endedAt: { type: DataTypes.DATE(3), allowNull: true }
	},
	{ sequelize, tableName: 'jobs', timestamps: false }
);
