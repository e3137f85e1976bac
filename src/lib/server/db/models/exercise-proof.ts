import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { ProofResult } from '$lib/schemas/proof-view';
import { sequelize } from '../connection';

/** What the proof of an exercise came to. The hash is that of its text under the engine's version, so nothing here grows old. */
export class ExerciseProof extends Model<
	InferAttributes<ExerciseProof>,
	InferCreationAttributes<ExerciseProof>
> {
	declare hash: string;
	declare seeds: number;
	declare passed: boolean;
	declare result: ProofResult;
	declare madeAt: Date;
	declare tookMs: number;
}

ExerciseProof.init(
	{
		hash: { type: DataTypes.CHAR(64), primaryKey: true },
		seeds: DataTypes.INTEGER.UNSIGNED,
		passed: DataTypes.BOOLEAN,
		result: DataTypes.JSON,
		madeAt: DataTypes.DATE(3),
		tookMs: DataTypes.INTEGER.UNSIGNED
	},
	{ sequelize, tableName: 'exercise_proofs', timestamps: false }
);
