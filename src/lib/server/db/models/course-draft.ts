import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import { sequelize } from '../connection';
import { Course } from './course';

/** The draft of a course's next edition. A course has at most one; it stays when an edition is published from it. */
export class CourseDraft extends Model<InferAttributes<CourseDraft>, InferCreationAttributes<CourseDraft>> {
	declare id: CreationOptional<number>;
	declare courseId: number;
	/** The edition it was begun from; null for a course that was new. */
	declare editionId: number | null;
	declare createdBy: number;
	declare createdAt: Date;
	declare course?: NonAttribute<Course>;
}

CourseDraft.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		courseId: DataTypes.BIGINT.UNSIGNED,
		editionId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
		createdBy: DataTypes.INTEGER.UNSIGNED,
		createdAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'course_drafts', timestamps: false }
);
CourseDraft.belongsTo(Course, { as: 'course', foreignKey: 'courseId' });
