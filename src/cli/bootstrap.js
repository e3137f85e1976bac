/**
 * The way into every command of this repository: `node src/cli/bootstrap.js VERB …` runs src/cli/VERB.ts.
 * Plain JavaScript that needs no package, because on a fresh clone there are none: it installs them first.
 */
import { existsSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { installPackages, packagesAreCurrent } from './ground/packages.js';
import { Refusal } from './ground/refusal.js';
import { describeRunning, findRunning } from './ground/running.js';
import { step } from './ground/step.js';

const root = fileURLToPath(new URL('../..', import.meta.url));
const [verb, ...rest] = process.argv.slice(2);
/** Commands that people watch; the others answer on standard output with nothing but their answer. */
const watched = ['start', 'dev', 'test'];

const [major, minor] = process.versions.node.split('.').map(Number);
if (major < 20 || (major === 20 && minor < 19)) {
	console.error(`Sweepwright needs Node.js 20.19 or newer; this is ${process.versions.node}.`);
	process.exit(1);
}
const script = fileURLToPath(new URL(`./${verb}.ts`, import.meta.url));
if (!verb || !/^[a-z0-9-]+$/.test(verb) || !existsSync(script)) {
	console.error(`No such command: ${verb ?? '(none)'}`);
	process.exit(2);
}
process.chdir(root);
// A file .env beside package.json is read like the environment; what the environment says already, wins.
if (verb !== 'test' && existsSync('.env')) process.loadEnvFile('.env');

if (verb === 'start' || verb === 'dev') {
	// Before anything is installed or built: a running instance still reads those files.
	const running = findRunning(verb);
	if (running) {
		console.log(describeRunning(running));
		process.exit(0);
	}
}
if (watched.includes(verb)) {
	console.log('Sweepwright');
	await step('Packages', () => (packagesAreCurrent(root) ? 'already there' : installPackages(root)));
} else if (!packagesAreCurrent(root)) {
	console.error('Packages: npm ci …');
	await installPackages(root);
}

process.argv = [process.argv[0], script, ...rest];
const { register } = await import('tsx/esm/api');
register({ tsconfig: fileURLToPath(new URL('./tsconfig.json', import.meta.url)) });
try {
	await import(pathToFileURL(script).href);
} catch (error) {
	if (!(error instanceof Refusal)) throw error;
	console.error(error.message);
	process.exit(1);
}
