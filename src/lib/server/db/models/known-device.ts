import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** A browser with which a person has signed in before. */
export class KnownDevice extends Model<InferAttributes<KnownDevice>, InferCreationAttributes<KnownDevice>> {
	/** SHA-256 of the token in the device cookie. */
	declare id: Buffer;
	declare userId: number;
	declare createdAt: Date;
	declare lastUsedAt: Date;
}

KnownDevice.init(
	{
		id: { type: DataTypes.BLOB, primaryKey: true },
		userId: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
		createdAt: { type: DataTypes.DATE(3), allowNull: false },
		lastUsedAt: { type: DataTypes.DATE(3), allowNull: false }
	},
	{ sequelize, modelName: 'knownDevice', tableName: 'known_devices', timestamps: false }
);
