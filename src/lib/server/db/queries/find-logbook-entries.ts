import { Op, type WhereOptions } from 'sequelize';
import type { LogbookFilter } from '$lib/schemas/logbook';
import { LogbookEntry } from '../models/logbook-entry';

const DAY_MS = 86_400_000;
/** Text that LIKE takes as it stands. */
const literally = (text: string): string => text.replace(/[\\%_]/g, '\\$&');

/** The entries of one person that a filter lets through: each word of `q` in the entry's words or its note. */
export function logbookWhere(
	userId: number,
	{ q, exercise, kind, from, to }: Omit<LogbookFilter, 'page'>
): WhereOptions<LogbookEntry> {
	const words = q.split(/\s+/).filter(Boolean);
	return {
		userId,
		...(exercise && { exercise }),
		...(kind && { kind }),
		[Op.and]: [
			...words.map((word) => {
				const like = { [Op.like]: `%${literally(word)}%` };
				return { [Op.or]: [{ words: like }, { note: like }] };
			}),
			...(from ? [{ keptAt: { [Op.gte]: new Date(`${from}T00:00:00Z`) } }] : []),
			...(to ? [{ keptAt: { [Op.lt]: new Date(Date.parse(`${to}T00:00:00Z`) + DAY_MS) } }] : [])
		]
	};
}

/** Those entries, the newest first. */
export const findLogbookEntries = (
	userId: number,
	filter: Omit<LogbookFilter, 'page'>,
	part: { limit: number; offset: number }
): Promise<{ rows: LogbookEntry[]; count: number }> =>
	LogbookEntry.findAndCountAll({
		where: logbookWhere(userId, filter),
		order: [
			['keptAt', 'DESC'],
			['id', 'DESC']
		],
		...part
	});
