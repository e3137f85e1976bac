import { QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '../connection';

/** A file of a draft, with who changed it last. */
export interface DraftFileLine {
	id: number;
	path: string;
	hash: string;
	revision: number;
	changedBy: string;
	changedAt: Date;
}

const LINE = `f.id, f.path, f.hash, f.revision, u.display_name AS changedBy, f.changed_at AS changedAt
	FROM draft_files f JOIN users u ON u.id = f.changed_by`;

/** Every file of a draft, without what it holds. */
export const draftFileLines = (draftId: number, transaction?: Transaction): Promise<DraftFileLine[]> =>
	sequelize.query<DraftFileLine>(`SELECT ${LINE} WHERE f.draft_id = :draftId ORDER BY f.path`, {
		type: QueryTypes.SELECT,
		replacements: { draftId },
		transaction
	});

/** The same with what each holds. */
export const draftFileContents = (
	draftId: number,
	transaction?: Transaction
): Promise<{ id: number; path: string; hash: string; bytes: Buffer }[]> =>
	sequelize.query(
		`SELECT f.id, f.path, f.hash, c.bytes FROM draft_files f JOIN file_contents c ON c.hash = f.hash
		WHERE f.draft_id = :draftId ORDER BY f.path`,
		{ type: QueryTypes.SELECT, replacements: { draftId }, transaction }
	);

/** A version of a draft's file. */
export interface VersionLine {
	id: number;
	revision: number;
	origin: string;
	note: string | null;
	changedBy: string;
	begunAt: Date;
	changedAt: Date;
}

/** Versions of a file, the newest first. */
export const fileVersionLines = (fileId: number, most: number): Promise<VersionLine[]> =>
	sequelize.query<VersionLine>(
		`SELECT v.id, v.revision, v.origin, v.note, u.display_name AS changedBy, v.begun_at AS begunAt,
			v.changed_at AS changedAt
		FROM draft_file_versions v JOIN users u ON u.id = v.changed_by
		WHERE v.file_id = :fileId ORDER BY v.id DESC LIMIT :most`,
		{ type: QueryTypes.SELECT, replacements: { fileId, most } }
	);

/** Others who have a file open, by name, since when. */
export const othersAtFile = (
	fileId: number,
	userId: number,
	seenSince: Date
): Promise<{ name: string; openedAt: Date }[]> =>
	sequelize.query(
		`SELECT u.display_name AS name, o.opened_at AS openedAt
		FROM open_files o JOIN users u ON u.id = o.user_id
		WHERE o.file_id = :fileId AND o.user_id <> :userId AND o.seen_at >= :seenSince
		ORDER BY o.opened_at`,
		{ type: QueryTypes.SELECT, replacements: { fileId, userId, seenSince } }
	);
