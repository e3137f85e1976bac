import { impuritiesOf } from './impurities-of';
import { packageOf, parse, specifiersOf, targetOf } from './imports-of';
import { isIn, OWNED_PACKAGES, type Room, roomOf } from './rooms';

const LONGEST_FILE = 300;
const EMPTY_NAMES = ['utils', 'helpers', 'common', 'index', 'misc'];

/** What a file of this repository does against the rules of the house: one line for each fault. */
export function faultsOf(file: string, text: string): string[] {
	const room = roomOf(file);
	if (!room) return [`${file} lies in no room`];
	const source = parse(file, text);
	const faults = specifiersOf(source).flatMap((specifier) => faultsOfImport(file, room, specifier));
	if (room.isPure) faults.push(...impuritiesOf(source).map((what) => `is pure and uses ${what}`));
	return [...faults, ...faultsOfShape(file, text)].map((fault) => `${file} ${fault}`);
}

function faultsOfImport(file: string, room: Room, specifier: string): string[] {
	const target = targetOf(file, specifier);
	if (target === undefined) return faultsOfPackage(file, room, packageOf(specifier));
	if (target.endsWith('/$types')) return [];
	const faults: string[] = [];
	const home = roomOf(target);
	const isAtHome = home === room;
	if (!isAtHome && !room.mayImport.some((path) => isIn(target, path)))
		faults.push(`must not import ${target}`);
	if (specifier.startsWith('../../')) faults.push(`climbs twice in ${specifier}: $lib says it`);
	else if (!isAtHome && isIn(file, 'src/lib') && specifier.startsWith('../'))
		faults.push(`goes to another room by ${specifier}: $lib says it`);
	if (specifier.startsWith('$lib/') && /\.[jt]s$/.test(specifier) && !specifier.endsWith('.svelte.ts')) {
		faults.push(`gives an extension in ${specifier}`);
	}
	return faults;
}

function faultsOfPackage(file: string, room: Room, name: string): string[] {
	const owners = OWNED_PACKAGES[name];
	if (owners && !owners.some((path) => isIn(file, path))) return [`must not import ${name}`];
	if (room.packages.includes('*') || room.packages.includes(name)) return [];
	return [`must not import ${name}`];
}

function faultsOfShape(file: string, text: string): string[] {
	const faults: string[] = [];
	const lines = text.split('\n').length - 1;
	if (lines > LONGEST_FILE) faults.push(`has ${lines} lines, more than ${LONGEST_FILE}`);
	const name = file.replace(/^.*\//, '').replace(/\..*$/, '');
	if (EMPTY_NAMES.includes(name)) faults.push('has a name that says nothing');
	if (/\.[jt]s$/.test(file) && !/^\+?[a-z0-9]+(-[a-z0-9]+)*$/.test(name))
		faults.push('is not named in kebab-case');
	return faults;
}
