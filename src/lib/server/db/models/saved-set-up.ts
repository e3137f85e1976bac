import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import type { Settings } from '$lib/schemas/settings';
import { sequelize } from '../connection';

/** A set-up that a person has put by under a name, for any bench. */
export class SavedSetUp extends Model<InferAttributes<SavedSetUp>, InferCreationAttributes<SavedSetUp>> {
	declare id: CreationOptional<number>;
	declare userId: number;
	/** Unique for each person. */
	declare name: string;
	/** As typed. */
	declare settings: Settings;
	declare savedAt: Date;
}

SavedSetUp.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		userId: DataTypes.INTEGER.UNSIGNED,
		name: DataTypes.STRING(60),
		settings: DataTypes.JSON,
		savedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'saved_set_ups', timestamps: false }
);
