import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { sequelize } from '../connection';

/** How many tries at signing in are counted against one account, address or known device. */
export class SignInBucket extends Model<
	InferAttributes<SignInBucket>,
	InferCreationAttributes<SignInBucket>
> {
	/** SHA-256 of what is limited. */
	declare id: Buffer;
	/** Tries that have not drained away yet at `updatedAt`. */
	declare level: number;
	declare updatedAt: Date;
}

SignInBucket.init(
	{
		id: { type: DataTypes.BLOB, primaryKey: true },
		level: { type: DataTypes.DOUBLE, allowNull: false },
		updatedAt: { type: DataTypes.DATE(3), allowNull: false }
	},
	{ sequelize, modelName: 'signInBucket', tableName: 'sign_in_buckets', timestamps: false }
);
