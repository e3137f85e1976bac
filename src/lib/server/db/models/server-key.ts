import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** A secret of the server's own, shared by all its processes. */
export class ServerKey extends Model<InferAttributes<ServerKey>, InferCreationAttributes<ServerKey>> {
	/** What the key seals. */
	declare purpose: string;
	/** 32 random bytes. */
	declare secret: Buffer;
	declare createdAt: Date;
}

ServerKey.init(
	{
		purpose: { type: DataTypes.STRING(40), primaryKey: true },
		secret: { type: DataTypes.BLOB, allowNull: false },
		createdAt: { type: DataTypes.DATE(3), allowNull: false }
	},
	{ sequelize, modelName: 'serverKey', tableName: 'server_keys', timestamps: false }
);
