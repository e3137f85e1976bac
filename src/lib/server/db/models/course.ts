import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';

/** A course by its slug, whatever its edition. */
export class Course extends Model<InferAttributes<Course>, InferCreationAttributes<Course>> {
	declare id: CreationOptional<number>;
	declare slug: string;
	declare createdAt: Date;
}

Course.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		slug: DataTypes.STRING(80),
		createdAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'courses', timestamps: false }
);
