import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { TypedAnswers } from '$lib/schemas/answer';
import { sequelize } from '../connection';

/** What is typed in an attempt's answer fields so far, right or wrong. */
export class Draft extends Model<InferAttributes<Draft>, InferCreationAttributes<Draft>> {
	declare attemptId: number;
	/** By question id. */
	declare answers: TypedAnswers;
	declare savedAt: Date;
}

Draft.init(
	{
		attemptId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		answers: DataTypes.JSON,
		savedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'drafts', timestamps: false }
);
