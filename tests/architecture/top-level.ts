/** All that may lie at the top of this repository, besides dotfiles and what .gitignore names. */
const ALLOWED = [
	...['src', 'content', 'migrations', 'tests', 'static'],
	...['package.json', 'package-lock.json', 'README.md', 'DEVELOPERS.md', 'eslint.config.js'],
	...['svelte.config.js', 'vite.config.ts', 'tailwind.config.ts', 'tsconfig.json']
];

/** Names at the top that don't belong there. */
export function strangersAtTop(names: string[], gitignore: string): string[] {
	const ignored = gitignore.split('\n').map((line) => line.replace(/\/$/, ''));
	const isIgnored = (name: string) =>
		ignored.some(
			(pattern) =>
				(pattern.startsWith('*') ? name.endsWith(pattern.slice(1)) : name === pattern) && pattern !== ''
		);
	return names.filter((name) => !name.startsWith('.') && !ALLOWED.includes(name) && !isIgnored(name));
}
