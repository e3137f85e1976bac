import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** What a file of a course holds, kept once however many editions and drafts name it. Never changed. */
export class FileContent extends Model<InferAttributes<FileContent>, InferCreationAttributes<FileContent>> {
	/** SHA-256 of the bytes. */
	declare hash: string;
	declare bytes: Buffer;
}

FileContent.init(
	{
		hash: { type: DataTypes.CHAR(64), primaryKey: true },
		bytes: DataTypes.BLOB('medium')
	},
	{ sequelize, tableName: 'file_contents', timestamps: false }
);
