import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Finding as FindingDocument } from '$lib/schemas/finding';
import { sequelize } from '../connection';

/** What the grader said of a closed attempt, as it said it then. */
export class Finding extends Model<InferAttributes<Finding>, InferCreationAttributes<Finding>> {
	declare attemptId: number;
	declare passed: boolean;
	declare finding: FindingDocument;
	declare engineVersion: number;
	declare gradedAt: Date;
}

Finding.init(
	{
		attemptId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		passed: DataTypes.BOOLEAN,
		finding: DataTypes.JSON,
		engineVersion: DataTypes.INTEGER.UNSIGNED,
		gradedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'findings', timestamps: false }
);
