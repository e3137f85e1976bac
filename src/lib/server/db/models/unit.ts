import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import { sequelize } from '../connection';

/** A unit of an edition, with its lesson as sanitised HTML. */
export class Unit extends Model<InferAttributes<Unit>, InferCreationAttributes<Unit>> {
	declare id: CreationOptional<number>;
	declare editionId: number;
	/** As the author numbers it: unit 6 may be the only one there is. */
	declare number: number;
	declare slug: string;
	declare title: string;
	declare summary: string;
	declare lessonHtml: string;
}

Unit.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		editionId: DataTypes.BIGINT.UNSIGNED,
		number: DataTypes.INTEGER.UNSIGNED,
		slug: DataTypes.STRING(80),
		title: DataTypes.STRING(300),
		summary: DataTypes.STRING(300),
		lessonHtml: DataTypes.TEXT('medium')
	},
	{ sequelize, tableName: 'units', timestamps: false }
);
