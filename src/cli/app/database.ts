/** The database that a command works on: the one DATABASE_URL names, or the private one of this checkout. */
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { QueryTypes } from 'sequelize';
import type { MigrationFiles } from '$lib/server/db/migrate';
import type { Migration } from '$lib/server/db/migration';
import { atEnd } from '../ground/ending';
import { usePrivateServer } from '../mariadb/private-server';
import { createDatabase } from '../mariadb/schema';
import { OWN_SERVER } from '../mariadb/servers';

export interface Database {
	note: string;
	/** Whether it is this checkout's own: then the demo data belongs into it. */
	isPrivate: boolean;
}

/** Makes the database reachable and DATABASE_URL name it, for this process and those it starts. */
export async function openDatabase(): Promise<Database> {
	if (process.env.DATABASE_URL) {
		const { hostname, port, pathname } = new URL(process.env.DATABASE_URL);
		return {
			note: `${pathname.slice(1)} on ${hostname}:${port || 3306}, from DATABASE_URL`,
			isPrivate: false
		};
	}
	const server = await usePrivateServer(OWN_SERVER.folder, OWN_SERVER.firstPort);
	atEnd(() => server.release());
	await useDatabase(server.urlOf(OWN_SERVER.database));
	return { note: server.note, isPrivate: true };
}

/** Makes the database if need be and has DATABASE_URL name it. Must come before anything imports the connection. */
export async function useDatabase(databaseUrl: string): Promise<void> {
	await createDatabase(databaseUrl);
	process.env.DATABASE_URL = databaseUrl;
}

/** Every file of `migrations/`, by path. */
export async function loadMigrations(): Promise<MigrationFiles> {
	const files: MigrationFiles = {};
	for (const name of readdirSync('migrations').filter((entry) => entry.endsWith('.ts'))) {
		files[join('migrations', name)] = (await import(
			pathToFileURL(join('migrations', name)).href
		)) as Migration;
	}
	return files;
}

/** Runs the migrations that have not run yet. */
export async function migrate(): Promise<string> {
	const [sequelize, { migrateUp }] = [await connection(), await import('$lib/server/db/migrate')];
	const names = await migrateUp(sequelize, await loadMigrations());
	return names.length === 0 ? 'up to date' : `${names.length} run, up to ${names.at(-1)}`;
}

/** Publishes the courses of `content/`: a new edition of each one that has changed. */
export async function importCourses(): Promise<string> {
	const { importContent } = await import('$lib/server/services/courses/import-content');
	const courses = await importContent({ root: 'content', now: new Date() });
	const published = courses
		.filter(({ created }) => created)
		.map(({ slug, edition }) => `${slug}, edition ${edition}`);
	const atDesk = courses.filter(({ writtenAtDesk }) => writtenAtDesk).map(({ slug }) => slug);
	const note = published.length === 0 ? `${courses.length}, unchanged` : `published ${published.join('; ')}`;
	return atDesk.length === 0 ? note : `${note}; written at the desk, so left alone: ${atDesk.join(', ')}`;
}

/** Whether nobody is known here yet. */
export async function isEmpty(): Promise<boolean> {
	const rows = await (await connection()).query('SELECT id FROM users LIMIT 1', { type: QueryTypes.SELECT });
	return rows.length === 0;
}

/** Puts the demo data into an empty database; leaves any other alone. */
export async function seedIfEmpty(): Promise<string> {
	if (!(await isEmpty())) return 'not needed: there are people in the database';
	const { seedDemo } = await import('$lib/server/db/seed');
	await seedDemo();
	return 'put into the empty database';
}

/** The pool that the imported services use; closed with the command. */
export async function connection() {
	const { sequelize } = await import('$lib/server/db/connection');
	if (!closes) atEnd(() => sequelize.close());
	closes = true;
	return sequelize;
}

let closes = false;
