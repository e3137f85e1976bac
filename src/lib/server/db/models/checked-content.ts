import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Exercise as ExerciseDefinition } from '$lib/schemas/exercise';
import { sequelize } from '../connection';

/** A folder or a file of content/ that has been checked, and what came of it. Only a cache: losing a row costs time. */
export class CheckedContent extends Model<
	InferAttributes<CheckedContent>,
	InferCreationAttributes<CheckedContent>
> {
	/** SHA-256 of the files, with the version of what checked them. */
	declare hash: string;
	/** Of a course: the edition that holds it. */
	declare editionId: number | null;
	/** Of an exercise's file: what it says. */
	declare definition: ExerciseDefinition | null;
	declare checkedAt: Date;
}

CheckedContent.init(
	{
		hash: { type: DataTypes.CHAR(64), primaryKey: true },
		editionId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
		definition: { type: DataTypes.JSON, allowNull: true },
		checkedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'checked_content', timestamps: false }
);
