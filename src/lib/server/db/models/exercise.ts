import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type NonAttribute
} from 'sequelize';
import type { Exercise as ExerciseDefinition } from '$lib/schemas/exercise';
import { sequelize } from '../connection';
import { Edition } from './edition';
import { Unit } from './unit';

/** An exercise of an edition: its definition as the author wrote it, checked at import. */
export class Exercise extends Model<InferAttributes<Exercise>, InferCreationAttributes<Exercise>> {
	declare id: CreationOptional<number>;
	declare editionId: number;
	declare unitId: number;
	/** 1, 2, … within the unit. */
	declare number: number;
	declare slug: string;
	declare title: string;
	declare definition: ExerciseDefinition;
	/** The situation as sanitised HTML; {names} in it are filled in per attempt. */
	declare situationHtml: string;
	/** Attempts allowed. */
	declare tries: number;
	declare edition?: NonAttribute<Edition>;
	declare unit?: NonAttribute<Unit>;
}

Exercise.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		editionId: DataTypes.BIGINT.UNSIGNED,
		unitId: DataTypes.BIGINT.UNSIGNED,
		number: DataTypes.INTEGER.UNSIGNED,
		slug: DataTypes.STRING(80),
		title: DataTypes.STRING(300),
		definition: DataTypes.JSON,
		situationHtml: DataTypes.TEXT,
		tries: DataTypes.INTEGER.UNSIGNED
	},
	{ sequelize, tableName: 'exercises', timestamps: false }
);
Exercise.belongsTo(Edition, { as: 'edition', foreignKey: 'editionId' });
Exercise.belongsTo(Unit, { as: 'unit', foreignKey: 'unitId' });
