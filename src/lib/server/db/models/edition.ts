import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import type { GlossaryTerm } from '$lib/schemas/glossary';
import { sequelize } from '../connection';
import { Course } from './course';

/** A published version of a course. Never changed: attempts name theirs. */
export class Edition extends Model<InferAttributes<Edition>, InferCreationAttributes<Edition>> {
	declare id: CreationOptional<number>;
	declare courseId: number;
	/** 1, 2, … within the course. */
	declare number: number;
	declare title: string;
	declare summary: string;
	declare glossary: CreationOptional<GlossaryTerm[]>;
	/** SHA-256 of the content it was made of. */
	declare contentHash: string;
	declare createdAt: Date;
	/** Who published it at the desk; null where it came from content/. */
	declare publishedBy: CreationOptional<number | null>;
	declare course?: NonAttribute<Course>;
}

Edition.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		courseId: DataTypes.BIGINT.UNSIGNED,
		number: DataTypes.INTEGER.UNSIGNED,
		title: DataTypes.STRING(300),
		summary: DataTypes.STRING(300),
		glossary: { type: DataTypes.JSON, defaultValue: [] },
		contentHash: DataTypes.CHAR(64),
		createdAt: DataTypes.DATE(3),
		publishedBy: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true }
	},
	{ sequelize, tableName: 'editions', timestamps: false }
);
Edition.belongsTo(Course, { as: 'course', foreignKey: 'courseId' });
