import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes
} from 'sequelize';
import type { EntryContent } from '$lib/schemas/logbook';
import { sequelize } from '../connection';

/** Something that a person has put by of a bench. */
export class LogbookEntry extends Model<
	InferAttributes<LogbookEntry>,
	InferCreationAttributes<LogbookEntry>
> {
	declare id: CreationOptional<number>;
	declare userId: number;
	declare attemptId: number;
	declare kind: 'reading' | 'picture' | 'set-up';
	/** Of a reading: which; a person keeps each once. */
	declare readingId: number | null;
	/** Slug. */
	declare exercise: string;
	/** What it is found by, beside its note. */
	declare words: string;
	declare content: EntryContent;
	declare note: string;
	declare keptAt: Date;
}

LogbookEntry.init(
	{
		id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
		userId: DataTypes.INTEGER.UNSIGNED,
		attemptId: DataTypes.BIGINT.UNSIGNED,
		kind: DataTypes.STRING(10),
		readingId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
		exercise: DataTypes.STRING(80),
		words: DataTypes.TEXT,
		content: DataTypes.JSON,
		note: DataTypes.STRING(1000),
		keptAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'logbook_entries', timestamps: false }
);
