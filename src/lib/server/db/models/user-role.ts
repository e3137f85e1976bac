import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';
import { User } from './user';

/** One role held by one person. */
export class UserRole extends Model<InferAttributes<UserRole>, InferCreationAttributes<UserRole>> {
	declare userId: number;
	/** One of `roles` in domain/role.ts; a word that the policy doesn't know permits nothing. */
	declare role: string;
	declare createdAt: CreationOptional<Date>;
}

UserRole.init(
	{
		userId: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true },
		role: { type: DataTypes.STRING(32), primaryKey: true },
		createdAt: DataTypes.DATE(3)
	},
	{ sequelize, modelName: 'userRole', tableName: 'user_roles', updatedAt: false }
);

User.hasMany(UserRole, { foreignKey: 'userId' });
UserRole.belongsTo(User, { foreignKey: 'userId' });
