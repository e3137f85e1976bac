/** The rooms of the house and what each may import, besides itself. The longest path that fits a file is its room. */
export interface Room {
	path: string;
	/** Paths of this repository. */
	mayImport: string[];
	/** Packages, by name; `*` is any but those that OWNED_PACKAGES keeps for others. */
	packages: string[];
	/** No clock, no chance, no input or output, no framework: the same in gives the same out. */
	isPure?: boolean;
}

const lib = (...names: string[]): string[] => names.map((name) => `src/lib/${name}`);
const server = (...names: string[]): string[] => lib(...names.map((name) => `server/${name}`));

export const ROOMS: Room[] = [
	{ path: 'src/lib/units', mayImport: [], packages: [], isPure: true },
	{ path: 'src/lib/schemas', mayImport: lib('units'), packages: ['zod'], isPure: true },
	{ path: 'src/lib/measure', mayImport: lib('units', 'schemas'), packages: ['fft.js'], isPure: true },
	{
		path: 'src/lib/server/bench',
		mayImport: lib('measure', 'schemas', 'units'),
		packages: ['zod', 'yaml', 'fft.js', 'mathjs', 'bessel'],
		isPure: true
	},
	{
		path: 'src/lib/server/domain',
		mayImport: [...server('bench', 'errors.ts'), ...lib('schemas', 'units')],
		packages: ['zod'],
		isPure: true
	},
	{ path: 'src/lib/components', mayImport: lib('measure', 'units', 'schemas'), packages: ['*'] },
	{
		path: 'src/lib/server/present',
		mayImport: [...lib('schemas', 'units'), ...server('domain')],
		packages: []
	},
	{
		path: 'src/lib/server/services',
		mayImport: [
			...server('present', 'domain', 'bench', 'db', 'mail', 'payments', 'files', 'jobs'),
			...server('auth', 'content', 'errors.ts', 'env.ts'),
			...lib('measure', 'units', 'schemas')
		],
		packages: ['*']
	},
	{
		path: 'src/lib/server/auth',
		mayImport: [...server('db', 'domain', 'errors.ts'), ...lib('schemas')],
		packages: ['*']
	},
	{
		path: 'src/lib/server/db',
		mayImport: [...lib('schemas', 'measure'), ...server('domain')],
		packages: ['*']
	},
	// The demo's people need the hash of their password, like any others.
	{ path: 'src/lib/server/db/seed.ts', mayImport: server('db', 'auth', 'domain'), packages: ['*'] },
	...server('mail', 'payments', 'files', 'jobs').map((path) => ({
		path,
		mayImport: [...server('db', 'domain', 'errors.ts', 'env.ts'), ...lib('schemas')],
		packages: ['*']
	})),
	{ path: 'src/lib/server/content', mayImport: [...lib('schemas'), ...server('bench')], packages: ['*'] },
	{ path: 'src/lib/server/env.ts', mayImport: [], packages: ['zod'] },
	{ path: 'src/lib/server/errors.ts', mayImport: lib('schemas'), packages: [] },
	{
		path: 'src/lib/server/respond.ts',
		mayImport: [...server('errors.ts'), ...lib('schemas')],
		packages: ['*']
	},
	{
		path: 'src/lib/server/read-json.ts',
		mayImport: [...server('errors.ts'), ...lib('schemas')],
		packages: ['*']
	},
	{ path: 'src/lib/server/read-id.ts', mayImport: server('errors.ts'), packages: [] },
	{ path: 'src/lib/server/read-form.ts', mayImport: server('errors.ts'), packages: [] },
	{
		path: 'src/lib/server/hooks',
		mayImport: [
			...server('services', 'auth', 'domain', 'errors.ts', 'env.ts', 'respond.ts'),
			...lib('schemas')
		],
		packages: ['*']
	},
	{ path: 'src/hooks.server.ts', mayImport: server('hooks', 'services', 'env.ts'), packages: ['*'] },
	{ path: 'src/hooks.client.ts', mayImport: lib('schemas'), packages: ['*'] },
	{ path: 'src/app.d.ts', mayImport: [...server('auth', 'domain'), ...lib('schemas')], packages: ['*'] },
	{ path: 'src/params', mayImport: lib('schemas'), packages: ['*'] },
	{
		path: 'src/routes',
		mayImport: [
			...lib('components', 'schemas', 'units'),
			...server('services', 'auth', 'respond.ts', 'read-json.ts', 'read-form.ts', 'read-id.ts'),
			'src/app.css'
		],
		packages: ['*']
	},
	{
		path: 'src/cli',
		mayImport: [...server('services', 'bench', 'db'), ...lib('schemas', 'units', 'measure')],
		packages: ['*']
	},
	{ path: 'migrations', mayImport: server('db/migration.ts'), packages: ['sequelize'] }
];

/** Packages that belong to few rooms, whatever those may import besides. */
export const OWNED_PACKAGES: Record<string, string[]> = {
	sequelize: [...server('db', 'services', 'auth', 'jobs'), 'migrations', 'src/cli'],
	mariadb: ['src/cli'],
	umzug: server('db'),
	lucia: server('auth'),
	'@sveltejs/kit': [
		'src/hooks.client.ts',
		'src/routes',
		'src/params',
		'src/hooks.server.ts',
		'src/app.d.ts',
		...server('hooks', 'auth', 'respond.ts')
	],
	$app: ['src/routes', 'src/hooks.server.ts', 'src/lib/components'],
	$env: []
};

/** The room of a file: the longest path that fits. */
export function roomOf(file: string): Room | undefined {
	return ROOMS.filter(({ path }) => isIn(file, path)).sort((a, b) => b.path.length - a.path.length)[0];
}

/** Whether `target`, perhaps without its extension, is `path` or lies in it. */
export function isIn(target: string, path: string): boolean {
	const bare = (text: string) => text.replace(/\.[jt]s$/, '');
	return target === path || target.startsWith(`${path}/`) || bare(target) === bare(path);
}
