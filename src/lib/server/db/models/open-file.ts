import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** Somebody who has a draft's file open. */
export class OpenFile extends Model<InferAttributes<OpenFile>, InferCreationAttributes<OpenFile>> {
	declare fileId: number;
	declare userId: number;
	declare openedAt: Date;
	/** When their page last said so. */
	declare seenAt: Date;
}

OpenFile.init(
	{
		fileId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		userId: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true },
		openedAt: DataTypes.DATE(3),
		seenAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'open_files', timestamps: false }
);
