import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync('src/app.css', 'utf8');

/** Declarations of the first block that follows `selector`. */
function tokensAfter(selector: string): Record<string, string> {
	const start = css.indexOf('{', css.indexOf(selector)) + 1;
	const block = css.slice(start, css.indexOf('}', start));
	return Object.fromEntries(
		[...block.matchAll(/--([a-z-]+):\s*([^;]+);/g)].map(([, name, value]) => [name, value])
	);
}

const day = tokensAfter('\n:root {');
const night = tokensAfter("\n:root[data-scheme='night'] {");
const nightOfSystem = tokensAfter("\t:root:not([data-scheme='day']) {");

/** Relative luminance and contrast as WCAG 2.2 defines them. */
function luminance(hex: string): number {
	const [r, g, b] = [1, 3, 5].map((i) => {
		const value = parseInt(hex.slice(i, i + 2), 16) / 255;
		return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
	});
	return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(one: string, other: string): number {
	const [light, dark] = [luminance(one), luminance(other)].sort((a, b) => b - a);
	return (light + 0.05) / (dark + 0.05);
}

const texts = ['ink', 'pencil', 'madder', 'madder-deep', 'verdigris', 'ochre-ink', 'blue', 'plum'];
const lines = ['line', 'ochre', 'act-edge'];
const onWash: [string, string][] = [
	['madder-deep', 'madder-wash'],
	['verdigris', 'verdigris-wash'],
	['ochre-ink', 'ochre-wash'],
	['blue', 'blue-wash'],
	['on-act', 'act'],
	['on-act', 'act-deep'],
	...['madder-wash', 'verdigris-wash', 'ochre-wash', 'blue-wash', 'desk'].map((wash): [string, string] => [
		'ink',
		wash
	])
];

it('is the same night whether chosen or set by the system', () => {
	expect(Object.keys(night)).toContain('paper');
	expect(nightOfSystem).toEqual(night);
	expect(Object.keys(night)).toEqual(Object.keys(day));
});

describe.each([
	['day', day],
	['night', night]
])('by %s', (_, tokens) => {
	const grounds = ['sheet', 'paper'];

	it.each(texts.flatMap((text) => grounds.map((ground) => [text, ground])))(
		'%s is text on %s',
		(text, ground) => {
			expect(contrast(tokens[text], tokens[ground])).toBeGreaterThanOrEqual(4.5);
		}
	);

	it.each(lines.flatMap((line) => grounds.map((ground) => [line, ground])))(
		'%s is a line on %s',
		(line, ground) => {
			expect(contrast(tokens[line], tokens[ground])).toBeGreaterThanOrEqual(3);
		}
	);

	it.each(onWash)('%s is text on %s', (text, wash) => {
		expect(contrast(tokens[text], tokens[wash])).toBeGreaterThanOrEqual(4.5);
	});
});
