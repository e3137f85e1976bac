/** The product's own type in a document that the server makes, embedded in it. */
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

const fileOf = (name: string): Buffer =>
	readFileSync(
		createRequire(import.meta.url).resolve(`@fontsource/spline-sans/files/spline-sans-${name}.woff`)
	);

let cuts: { text: Buffer; bold: Buffer; extended: Buffer } | undefined;

/** Text, bold, and the letters of further languages in the text's weight; read once. */
export const typeCuts = () =>
	(cuts ??= {
		text: fileOf('latin-400-normal'),
		bold: fileOf('latin-600-normal'),
		extended: fileOf('latin-ext-400-normal')
	});

/** What the type has no sign for, in signs that it has. */
const SPELT: Record<string, string> = {
	'\u202f': '\u00a0',
	Ω: 'ohm',
	'→': 'to',
	'≤': '<=',
	'≥': '>=',
	γ: 'gamma',
	'\t': ' '
};
const LATIN = /[\n\u0020-\u007e\u00a0-\u00ff–—‘’“”…−\u2009]/u;
const EXTENDED = /[\u0100-\u024f\u1e00-\u1eff]/u;

/** Text cut into stretches that one of the cuts can set; what none has is shown as a question mark. */
export function stretchesOf(text: string): { text: string; extended: boolean }[] {
	const stretches: { text: string; extended: boolean }[] = [];
	for (const sign of text.normalize('NFC').replace(/\r\n?/g, '\n')) {
		const spelt = SPELT[sign] ?? (LATIN.test(sign) || EXTENDED.test(sign) ? sign : '?');
		const extended = EXTENDED.test(spelt);
		const last = stretches.at(-1);
		if (last?.extended === extended) last.text += spelt;
		else stretches.push({ text: spelt, extended });
	}
	return stretches;
}
