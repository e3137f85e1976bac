import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Markings } from '$lib/schemas/markings';
import { sequelize } from '../connection';

/** What lies on an attempt's bench besides its set-up: markers, readings that follow the traces, the unit of levels. */
export class AttemptMarkings extends Model<
	InferAttributes<AttemptMarkings>,
	InferCreationAttributes<AttemptMarkings>
> {
	declare attemptId: number;
	declare markings: Markings;
	declare savedAt: Date;
}

AttemptMarkings.init(
	{
		attemptId: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true },
		markings: DataTypes.JSON,
		savedAt: DataTypes.DATE(3)
	},
	{ sequelize, tableName: 'markings', timestamps: false }
);
