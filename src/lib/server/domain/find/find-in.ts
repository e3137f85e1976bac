/** Looks for words in texts: every word asked for must begin a word of the document. */
import type { FoundText } from '$lib/schemas/find-view';

export interface FindDocument {
	title: string;
	text: string;
}
export interface Found<D extends FindDocument> {
	document: D;
	title: FoundText;
	excerpt: FoundText;
}

/** Of the text around a hit, in characters. */
const EXCERPT = 180;
const BEFORE = 60;

/** A text as it is compared: small, without accents, of the same length, so that places in it are places in the text. */
const plain = (text: string): string =>
	Array.from(text, (sign) => {
		const small = sign.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
		return small.length === sign.length ? small : sign;
	}).join('');

/** The words of a query; a number keeps its sign and its decimals. */
export const wordsOf = (query: string): string[] => [
	...new Set(plain(query).match(/[\p{L}\p{N}]+(?:[.,]\p{N}+)*/gu) ?? [])
];

/** Places at which a word of the text begins with `word`. */
function placesOf(word: string, text: string): number[] {
	const places: number[] = [];
	for (let at = text.indexOf(word); at >= 0; at = text.indexOf(word, at + 1))
		if (at === 0 || !/[\p{L}\p{N}]/u.test(text[at - 1])) places.push(at);
	return places;
}

/**
 * The documents in which every word of the query is found, the best first: the whole query as a title, its words in the title,
 * then how often they stand in the text. Documents alike in that keep their order.
 * @returns none for a query without a letter or digit
 */
export function findIn<D extends FindDocument>(documents: readonly D[], query: string): Found<D>[] {
	const words = wordsOf(query);
	if (words.length === 0) return [];
	const phrase = words.join(' ');
	return documents
		.flatMap((document) => {
			const title = plain(document.title);
			const text = plain(document.text);
			const hits = words.map((word) => ({
				inTitle: placesOf(word, title).length,
				inText: placesOf(word, text).length
			}));
			if (hits.some(({ inTitle, inText }) => inTitle + inText === 0)) return [];
			const named = hits.filter(({ inTitle }) => inTitle > 0).length;
			const often = hits.reduce((sum, { inText }) => sum + Math.min(inText, 10), 0);
			const score = (wordsOf(title).join(' ') === phrase ? 1000 : 0) + 100 * named + often;
			return [{ document, score }];
		})
		.sort((a, b) => b.score - a.score)
		.map(({ document }) => ({
			document,
			title: marked(document.title, words),
			excerpt: excerptOf(document.text, words)
		}));
}

/** The text cut where a word asked for begins and where that word ends. */
function marked(text: string, words: readonly string[]): FoundText {
	const small = plain(text);
	const spans = words
		.flatMap((word) => placesOf(word, small).map((from) => ({ from, to: from + word.length })))
		.sort((a, b) => a.from - b.from || b.to - a.to);
	const parts: FoundText = [];
	let at = 0;
	for (const { from, to } of spans) {
		if (from < at) continue;
		if (from > at) parts.push({ text: text.slice(at, from), hit: false });
		parts.push({ text: text.slice(from, to), hit: true });
		at = to;
	}
	if (at < text.length) parts.push({ text: text.slice(at), hit: false });
	return parts;
}

/** The text around the first hit, from word to word; the beginning where there is none. */
function excerptOf(text: string, words: readonly string[]): FoundText {
	const small = plain(text);
	const first = Math.min(...words.flatMap((word) => placesOf(word, small)), Infinity);
	const around = Number.isFinite(first) ? Math.max(0, first - BEFORE) : 0;
	const from = around === 0 ? 0 : text.indexOf(' ', around) + 1;
	const end = from + EXCERPT;
	const cut = text.lastIndexOf(' ', end);
	const to = end >= text.length ? text.length : cut > from ? cut : end;
	const shown = marked(text.slice(from, to), words);
	if (from > 0) shown.unshift({ text: '… ', hit: false });
	if (to < text.length) shown.push({ text: ' …', hit: false });
	return shown;
}
