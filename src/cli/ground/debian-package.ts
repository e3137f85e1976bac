import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { Refusal } from './refusal.js';

/** Where the program `name` is: in PATH, or in the system folders that an ordinary user's PATH leaves out. */
export function findProgram(name: string): string | undefined {
	return [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/local/sbin', '/sbin', '/usr/bin']
		.filter((folder) => folder !== '')
		.map((folder) => join(folder, name))
		.find((path) => existsSync(path));
}

/**
 * Where the program is; installs Debian's package that holds it if need be, as root or through a sudo that asks nothing.
 * Throws a Refusal with the command to run where that isn't possible.
 */
export function requireProgram(program: string, debianPackage: string): string {
	const found = findProgram(program);
	if (found) return found;
	install(debianPackage);
	const installed = findProgram(program);
	if (!installed) throw new Refusal(`Debian's ${debianPackage} is installed, but holds no ${program}.`);
	return installed;
}

function install(debianPackage: string): void {
	const byHand = new Refusal(
		`${debianPackage} is needed and not there. Run this once, then the same command again:\n\n  sudo apt-get update && sudo apt-get install -y ${debianPackage}\n`
	);
	const apt = findProgram('apt-get');
	const root = process.getuid?.() === 0;
	const sudo = root ? undefined : findProgram('sudo');
	if (!apt || (!root && !sudo)) throw byHand;
	process.stderr.write(`installing Debian's ${debianPackage} … `);
	const asRoot = (args: string[]) => {
		const line = ['env', 'DEBIAN_FRONTEND=noninteractive', apt, ...args];
		const [command, ...rest] = sudo ? [sudo, '-n', ...line] : line;
		return spawnSync(command, rest, { encoding: 'utf8' });
	};
	const tries = [() => asRoot(['install', '-y', debianPackage])];
	// The lists of packages may be absent or old: fetch them and try once more.
	tries.push(() => (asRoot(['update']), tries[0]()));
	for (const attempt of tries) {
		const { status, stderr } = attempt();
		if (status === 0) return;
		console.error(`\n${stderr}`);
	}
	throw byHand;
}
