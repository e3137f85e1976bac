import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import type { Figure } from '$lib/schemas/figure';
import type { Lesson } from '$lib/schemas/lesson';
import { sequelize } from '../connection';
import { Edition } from './edition';

/** A unit of an edition, with its lesson as sanitised HTML and the figures that stand in it. */
export class Unit extends Model<InferAttributes<Unit>, InferCreationAttributes<Unit>> {
	declare id: CreationOptional<number>;
	declare editionId: number;
	/** As the author numbers it: unit 6 may be the only one there is. */
	declare number: number;
	declare slug: string;
	declare title: string;
	declare summary: string;
	/** Slugs of the units that a learner does first. */
	declare needs: CreationOptional<string[]>;
	/** So many of its exercises right, and it is done; null for all of them. */
	declare doneWith: CreationOptional<number | null>;
	declare lesson: Lesson;
	/** As the author wrote them, checked at import. */
	declare figures: Figure[];
	declare edition?: NonAttribute<Edition>;
}

Unit.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		editionId: DataTypes.BIGINT.UNSIGNED,
		number: DataTypes.INTEGER.UNSIGNED,
		slug: DataTypes.STRING(80),
		title: DataTypes.STRING(300),
		summary: DataTypes.STRING(300),
		needs: { type: DataTypes.JSON, defaultValue: [] },
		doneWith: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
		lesson: DataTypes.JSON,
		figures: DataTypes.JSON
	},
	{ sequelize, tableName: 'units', timestamps: false }
);
Unit.belongsTo(Edition, { as: 'edition', foreignKey: 'editionId' });
