import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** An answer handed in, with the verdict on it. */
export class Answer extends Model<InferAttributes<Answer>, InferCreationAttributes<Answer>> {
	declare attemptId: number;
	/** The question's id in the exercise. */
	declare question: string;
	/** As typed, with the unit chosen beside it. */
	declare text: string;
	declare unit: string;
	/** In the question's unit. */
	declare value: number;
	/** The reading handed in as evidence. */
	declare readingId: number | null;
	declare verdict: string;
	/** Kinds of the mistakes matched. */
	declare mistakes: string[];
}

Answer.init(
	{
		attemptId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		question: { type: DataTypes.STRING(60), primaryKey: true },
		text: DataTypes.STRING(60),
		unit: DataTypes.STRING(16),
		value: DataTypes.DOUBLE,
		readingId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
		verdict: DataTypes.STRING(20),
		mistakes: DataTypes.JSON
	},
	{ sequelize, tableName: 'answers', timestamps: false }
);
