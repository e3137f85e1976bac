const ENTITIES: Record<string, string> = {
	amp: '&',
	lt: '<',
	gt: '>',
	quot: '"',
	'#39': '’',
	nbsp: '\u00a0'
};

/**
 * Sanitised HTML as plain text.
 * @param gap what stands where a tag stood: blocks of text part words, what is set in italics doesn't
 */
export const textOf = (html: string, gap: string): string =>
	html.replace(/<[^>]*>/g, gap).replace(/&(amp|lt|gt|quot|#39|nbsp);/g, (_, name: string) => ENTITIES[name]);
