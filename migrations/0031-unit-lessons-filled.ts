import type { MigrationStep } from '../src/lib/server/db/migration';

/** Lessons of editions that are there already: one part, all text. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		UPDATE units
		SET lesson = JSON_OBJECT(
			'title', title,
			'words', CAST(LENGTH(lesson_html) / 6 AS UNSIGNED),
			'parts', JSON_ARRAY(JSON_OBJECT('kind', 'text', 'html', lesson_html))
		)
	`);

/** As far as the first figure: those were never HTML. */
export const down: MigrationStep = ({ context }) =>
	context.sequelize.query(
		"UPDATE units SET lesson_html = COALESCE(JSON_UNQUOTE(JSON_EXTRACT(lesson, '$.parts[0].html')), '')"
	);
