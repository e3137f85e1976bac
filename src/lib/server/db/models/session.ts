import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';

/** A sign-in that has not ended. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
	/** SHA-256 of the token in the cookie. */
	declare id: Buffer;
	declare userId: number;
	declare createdAt: Date;
	declare expiresAt: Date;
	/** What its owner ends it by; given by the database. */
	declare number: CreationOptional<number>;
	/** A DeviceKind, from what the browser said at signing in. */
	declare device: string;
	/** To within five minutes. */
	declare lastUsedAt: Date;
}

Session.init(
	{
		id: { type: DataTypes.BLOB, primaryKey: true },
		userId: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
		createdAt: { type: DataTypes.DATE(3), allowNull: false },
		expiresAt: { type: DataTypes.DATE(3), allowNull: false },
		number: DataTypes.BIGINT.UNSIGNED,
		device: { type: DataTypes.STRING(20), allowNull: false },
		lastUsedAt: { type: DataTypes.DATE(3), allowNull: false }
	},
	{ sequelize, modelName: 'session', tableName: 'sessions', timestamps: false }
);
