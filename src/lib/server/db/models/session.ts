import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** A sign-in that has not ended. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
	/** SHA-256 of the token in the cookie. */
	declare id: Buffer;
	declare userId: number;
	declare createdAt: Date;
	declare expiresAt: Date;
}

Session.init(
	{
		id: { type: DataTypes.BLOB, primaryKey: true },
		userId: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
		createdAt: { type: DataTypes.DATE(3), allowNull: false },
		expiresAt: { type: DataTypes.DATE(3), allowNull: false }
	},
	{ sequelize, modelName: 'session', tableName: 'sessions', timestamps: false }
);
