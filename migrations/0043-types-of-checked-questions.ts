import type { MigrationStep } from '../src/lib/server/db/migration';

/** Exercises that were checked before questions had types ask for numbers. No exercise asks more than six. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		UPDATE checked_content SET definition = JSON_INSERT(definition,
			'$.questions[0].type', 'number',
			'$.questions[1].type', 'number',
			'$.questions[2].type', 'number',
			'$.questions[3].type', 'number',
			'$.questions[4].type', 'number',
			'$.questions[5].type', 'number')
		WHERE definition IS NOT NULL
	`);

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		UPDATE checked_content SET definition = JSON_REMOVE(definition,
			'$.questions[0].type',
			'$.questions[1].type',
			'$.questions[2].type',
			'$.questions[3].type',
			'$.questions[4].type',
			'$.questions[5].type')
		WHERE definition IS NOT NULL
	`);
