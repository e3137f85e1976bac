import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';

/** How a version came about: the draft begun, typed, brought back, brought in as a zip, or an outline changed. */
export type VersionOrigin = 'begun' | 'typed' | 'restored' | 'zip' | 'outline';

/** What a draft's file held at some time. The last one is what it holds now. */
export class DraftFileVersion extends Model<
	InferAttributes<DraftFileVersion>,
	InferCreationAttributes<DraftFileVersion>
> {
	declare id: CreationOptional<number>;
	declare fileId: number;
	declare hash: string;
	/** The file's revision when it last held this. */
	declare revision: number;
	declare origin: VersionOrigin;
	/** Of one brought back: which one, in words. */
	declare note: CreationOptional<string | null>;
	declare changedBy: number;
	/** The first of the saves that it holds. */
	declare begunAt: Date;
	declare changedAt: Date;
}

DraftFileVersion.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		fileId: DataTypes.BIGINT.UNSIGNED,
		hash: DataTypes.CHAR(64),
		revision: DataTypes.INTEGER.UNSIGNED,
		origin: DataTypes.STRING(20),
		note: { type: DataTypes.STRING(200), allowNull: true },
		changedBy: DataTypes.INTEGER.UNSIGNED,
		begunAt: DataTypes.DATE(3),
		changedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'draft_file_versions', timestamps: false }
);
