import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';

/** A file of a draft as it stands. */
export class DraftFile extends Model<InferAttributes<DraftFile>, InferCreationAttributes<DraftFile>> {
	declare id: CreationOptional<number>;
	declare draftId: number;
	/** From the course's folder: "06-spread/lesson.md"; under "archive/" what was taken out of the course. */
	declare path: string;
	/** Of its content. */
	declare hash: string;
	/** 1, 2, …: a save names the one it was made from. */
	declare revision: number;
	declare changedBy: number;
	declare changedAt: Date;
}

DraftFile.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		draftId: DataTypes.BIGINT.UNSIGNED,
		path: DataTypes.STRING(200),
		hash: DataTypes.CHAR(64),
		revision: DataTypes.INTEGER.UNSIGNED,
		changedBy: DataTypes.INTEGER.UNSIGNED,
		changedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'draft_files', timestamps: false }
);
