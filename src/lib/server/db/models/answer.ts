import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { TypedAnswer } from '$lib/schemas/answer';
import { sequelize } from '../connection';

/** An answer handed in, with the verdict on it. */
export class Answer extends Model<InferAttributes<Answer>, InferCreationAttributes<Answer>> {
	declare attemptId: number;
	/** The question's id in the exercise. */
	declare question: string;
	/** A number as typed, with the unit chosen beside it; null for any other answer. */
	declare text: string | null;
	declare unit: string | null;
	/** In the question's unit. */
	declare value: number | null;
	/** The reading handed in as evidence. */
	declare readingId: number | null;
	/** An answer that is no number, as handed in. */
	declare typed: TypedAnswer | null;
	declare verdict: string;
	/** Kinds of the mistakes matched. */
	declare mistakes: string[];
}

Answer.init(
	{
		attemptId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		question: { type: DataTypes.STRING(60), primaryKey: true },
		text: { type: DataTypes.STRING(60), allowNull: true },
		unit: { type: DataTypes.STRING(16), allowNull: true },
		value: { type: DataTypes.DOUBLE, allowNull: true },
		readingId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
		typed: { type: DataTypes.JSON, allowNull: true },
		verdict: DataTypes.STRING(20),
		mistakes: DataTypes.JSON
	},
	{ sequelize, tableName: 'answers', timestamps: false }
);
