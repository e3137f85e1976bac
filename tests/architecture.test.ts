import { readdirSync, readFileSync, statSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { faultsOf } from './architecture/faults-of';
import { ROOMS } from './architecture/rooms';
import { strangersAtTop } from './architecture/top-level';

function filesIn(path: string): string[] {
	if (!statSync(path).isDirectory()) return /\.(ts|js|svelte)$/.test(path) ? [path] : [];
	return readdirSync(path).flatMap((name) => filesIn(`${path}/${name}`));
}

describe('every file of the house', () => {
	it.each(['src', 'migrations'])('under %s keeps to what its room may import and be', (folder) => {
		expect(filesIn(folder).flatMap((file) => faultsOf(file, readFileSync(file, 'utf8')))).toEqual([]);
	});

	it('lies where the top level allows it', () => {
		expect(strangersAtTop(readdirSync('.'), readFileSync('.gitignore', 'utf8'))).toEqual([]);
	});
});

/** A planted file and the fault that must be seen in it. */
const planted: [rule: string, file: string, text: string, fault: RegExp][] = [
	[
		'units know nothing else',
		'src/lib/units/a.ts',
		`import '$lib/schemas/scene'`,
		/must not import src\/lib\/schemas/
	],
	['measure stays off the server', 'src/lib/measure/a.ts', `import '$lib/server/bench/x'`, /must not import/],
	['schemas know units only', 'src/lib/schemas/a.ts', `import '$lib/measure/x'`, /must not import/],
	[
		'bench knows no domain',
		'src/lib/server/bench/a.ts',
		`import '$lib/server/domain/policy'`,
		/must not import/
	],
	[
		'domain knows no database',
		'src/lib/server/domain/a.ts',
		`import '$lib/server/db/connection'`,
		/must not import/
	],
	['components know no server', 'src/lib/components/a.ts', `import '$lib/server/bench/x'`, /must not import/],
	[
		'a component’s script counts',
		'src/lib/components/A.svelte',
		`<script>import '$lib/server/db/x'</script>`,
		/must not/
	],
	[
		'both scripts of a component count',
		'src/lib/components/A.svelte',
		`<script module></script><script lang="ts">import '$lib/server/db/x'</script>`,
		/must not/
	],
	[
		'present knows no bench',
		'src/lib/server/present/a.ts',
		`import '$lib/server/bench/truth/x'`,
		/must not import/
	],
	[
		'the database knows no services',
		'src/lib/server/db/a.ts',
		`import '$lib/server/services/a/b'`,
		/must not import/
	],
	[
		'routes know no database',
		'src/routes/+page.server.ts',
		`import '$lib/server/db/connection'`,
		/must not import/
	],
	[
		'routes know no bench',
		'src/routes/+page.server.ts',
		`import '$lib/server/bench/truth/x'`,
		/must not import/
	],
	[
		'services know no routes',
		'src/lib/server/services/a/b.ts',
		`import '../../../../routes/x'`,
		/must not import src\/routes/
	],
	['the command line knows no routes', 'src/cli/a.ts', `import '../routes/x'`, /must not import src\/routes/],
	['the command line knows no components', 'src/cli/a.ts', `import '$lib/components/x'`, /must not import/],
	[
		'migrations stand alone',
		'migrations/0001-a.ts',
		`import '$lib/server/db/models/user'`,
		/must not import/
	],
	[
		'an export from elsewhere is an import',
		'src/lib/units/a.ts',
		`export * from '$lib/measure/x'`,
		/must not import/
	],
	[
		'an import() is an import',
		'src/lib/units/a.ts',
		`const x = await import('$lib/measure/x')`,
		/must not import/
	],
	['a type is an import', 'src/lib/units/a.ts', `type X = import('$lib/measure/x').X`, /must not import/],
	[
		'a glob is an import',
		'src/lib/units/a.ts',
		`import.meta.glob('/src/lib/measure/*.ts')`,
		/must not import/
	],
	...['node:fs', '$app/state', '$env/dynamic/private', '@sveltejs/kit', 'sequelize', 'svelte/store'].flatMap(
		(specifier) =>
			['units', 'measure', 'schemas', 'server/bench', 'server/domain'].map(
				(room): (typeof planted)[number] => [
					`${room} is without ${specifier}`,
					`src/lib/${room}/a.ts`,
					`import '${specifier}'`,
					/must not import/
				]
			)
	),
	...[
		'Math.random()',
		'Date.now()',
		'new Date()',
		'new Date',
		'Date()',
		'performance.now()',
		'globalThis.Math.random()',
		'fetch("/")',
		'process.env',
		'console.log(1)'
	].flatMap((expression) =>
		['units', 'measure', 'schemas', 'server/bench', 'server/domain'].map((room): (typeof planted)[number] => [
			`${room} is without ${expression}`,
			`src/lib/${room}/a.ts`,
			`export const x = ${expression}`,
			/is pure and uses/
		])
	),
	[
		'components leave the framework’s server to routes',
		'src/lib/components/a.ts',
		`import '@sveltejs/kit'`,
		/must not import/
	],
	[
		'the environment is read by callers',
		'src/lib/server/services/a/b.ts',
		`import '$env/dynamic/private'`,
		/must not import/
	],
	[
		'Sequelize stays near the database',
		'src/routes/+page.server.ts',
		`import 'sequelize'`,
		/must not import sequelize/
	],
	['nobody climbs twice', 'src/lib/server/bench/a/b/c.ts', `import '../../x'`, /climbs twice/],
	['another room is named by $lib', 'src/lib/server/auth/a.ts', `import '../db/connection'`, /another room/],
	['$lib goes without an extension', 'src/lib/measure/a.ts', `import '$lib/units/decibel.ts'`, /extension/],
	['nothing lies outside the rooms', 'src/lib/server/helpers/a.ts', ``, /lies in no room/],
	['no file is longer than a few screens', 'src/lib/units/a.ts', '\n'.repeat(301), /301 lines/],
	['no file is named utils', 'src/lib/units/utils.ts', ``, /says nothing/],
	['files are named in kebab-case', 'src/lib/units/deciBel.ts', ``, /kebab-case/]
];

describe('the rules see a planted fault', () => {
	it.each(planted)('%s', (_rule, file, text, fault) => {
		expect(faultsOf(file, text).join('\n')).toMatch(fault);
	});

	it('a stranger at the top level', () => {
		expect(
			strangersAtTop(['src', '.github', 'node_modules', 'notes.log', 'scripts'], 'node_modules/\n*.log\n')
		).toEqual(['scripts']);
	});
});

describe('the rules let pass', () => {
	it.each([
		[
			'a date that is given',
			'src/lib/server/domain/a.ts',
			'export const day = (now: number) => new Date(now)'
		],
		[
			'words in comments and strings',
			'src/lib/units/a.ts',
			`// Math.random() and import 'node:fs'\nexport const a = "import 'node:fs'"`
		],
		[
			'a property that is called like a clock',
			'src/lib/units/a.ts',
			'export const a = (b: { process: number }) => b.process'
		],
		[
			'what the framework makes for a route',
			'src/routes/a/+page.server.ts',
			`import type { Actions } from './$types'`
		],
		[
			'neighbours in the same room',
			'src/lib/server/bench/receiver/a.ts',
			`import '../signal/b'; import './c'`
		],
		['a room one may import', 'src/lib/server/bench/receiver/a.ts', `import { a } from '$lib/units/decibel'`]
	])('%s', (_what, file, text) => {
		expect(faultsOf(file, text)).toEqual([]);
	});

	it('no room twice', () => {
		expect(new Set(ROOMS.map(({ path }) => path)).size).toBe(ROOMS.length);
	});
});
