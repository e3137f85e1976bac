import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { localPath } from '$lib/server/domain/local-path';

const elsewhere = [
	...['', 'learn', './learn', '../learn', '?a=1', '#a', ' /learn', '\t/learn', '\n/learn', '\u0000/learn'],
	...['//evil.example', '///evil.example', '////evil.example/a', '//evil.example/..', '//user@evil.example'],
	...['/\\evil.example', '/\\/evil.example', '\\/evil.example', '\\\\evil.example', '/\t/evil.example'],
	...[
		'/\n/evil.example',
		'/\r/evil.example',
		'/\t\\evil.example',
		'/./\\evil.example',
		'/a/..//evil.example'
	],
	...['/.//evil.example', '/%2e//evil.example', '/a/b/../..//evil.example', '/..//evil.example'],
	...[
		'http://evil.example',
		'https://evil.example',
		'HTTPS://evil.example',
		'https:evil.example',
		'http:/evil'
	],
	...[
		'javascript:alert(1)',
		'JaVaScRiPt:alert(1)',
		'java\nscript:alert(1)',
		'data:text/html,x',
		'vbscript:x'
	],
	...[
		'blob:https://site.invalid/x',
		'file:///etc/passwd',
		'mailto:a@evil.example',
		'https://site.invalid/learn'
	]
];

describe('localPath(wanted, fallback)', () => {
	it.each(elsewhere)('does not lead to %j', (wanted) => {
		expect(localPath(wanted, '/home')).toBe('/home');
	});

	it.each([
		['/learn', '/learn'],
		['/learn/6-2?try=2#q1', '/learn/6-2?try=2#q1'],
		['/a/../b', '/b'],
		['/search?next=//evil.example', '/search?next=//evil.example'],
		['/%2F%2Fevil.example', '/%2F%2Fevil.example']
	])('keeps %j', (wanted, path) => {
		expect(localPath(wanted, '/home')).toBe(path);
	});

	it('falls back when nothing is asked for', () => {
		expect(localPath(null, '/home')).toBe('/home');
		expect(localPath(undefined, '/home')).toBe('/home');
	});

	it('always leads a browser to the same site', () => {
		const pieces = fc.constantFrom(
			'/',
			'\\',
			'.',
			'..',
			':',
			'@',
			'%2f',
			'\t',
			'\n',
			'evil.example',
			'a',
			'?',
			'#',
			'//'
		);
		fc.assert(
			fc.property(
				fc.array(pieces, { maxLength: 8 }).map((all) => all.join('')),
				(wanted) => {
					const path = localPath(wanted, '/home');
					expect(new URL(path, 'https://bench.example/sign-in').origin).toBe('https://bench.example');
				}
			),
			{ numRuns: 2000 }
		);
	});
});
