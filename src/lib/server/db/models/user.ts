import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import { sequelize } from '../connection';
import type { UserRole } from './user-role';

/** A person with an account. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
	declare id: CreationOptional<number>;
	/** Normalised by `normaliseEmail`; unique. */
	declare email: string;
	declare displayName: string;
	/** argon2id in its usual text form, parameters and salt included. */
	declare passwordHash: string;
	/** Since when this person may not sign in; null while they may. */
	declare disabledAt: CreationOptional<Date | null>;
	/** Null before the first time. */
	declare lastSignInAt: CreationOptional<Date | null>;
	declare createdAt: CreationOptional<Date>;
	declare updatedAt: CreationOptional<Date>;

	declare userRoles?: NonAttribute<UserRole[]>;
}

User.init(
	{
		id: { type: DataTypes.INTEGER.UNSIGNED, autoIncrement: true, primaryKey: true },
		email: { type: DataTypes.STRING(254), allowNull: false },
		displayName: { type: DataTypes.STRING(120), allowNull: false },
		passwordHash: { type: DataTypes.STRING(255), allowNull: false },
		disabledAt: { type: DataTypes.DATE(3), defaultValue: null },
		lastSignInAt: { type: DataTypes.DATE(3), defaultValue: null },
		createdAt: DataTypes.DATE(3),
		updatedAt: DataTypes.DATE(3)
	},
	{ sequelize, modelName: 'user', tableName: 'users' }
);
