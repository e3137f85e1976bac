import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** A file that an edition was made of. */
export class EditionFile extends Model<InferAttributes<EditionFile>, InferCreationAttributes<EditionFile>> {
	declare editionId: number;
	/** From the course's folder: "06-spread/lesson.md". */
	declare path: string;
	/** Of its content. */
	declare hash: string;
}

EditionFile.init(
	{
		editionId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		path: { type: DataTypes.STRING(200), primaryKey: true },
		hash: DataTypes.CHAR(64)
	},
	{ sequelize, tableName: 'edition_files', timestamps: false }
);
