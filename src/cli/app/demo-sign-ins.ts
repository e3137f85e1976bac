import { QueryTypes } from 'sequelize';
import { connection } from './database';

/** How to sign in as the demo people who are in the database, one line each, in columns. */
export async function listDemoSignIns(): Promise<string[]> {
	const { demoSignIns } = await import('$lib/server/db/seed');
	const rows = await (
		await connection()
	).query<{ email: string }>('SELECT email FROM users WHERE email IN (:emails)', {
		type: QueryTypes.SELECT,
		replacements: { emails: demoSignIns.map(({ email }) => email) }
	});
	const there = demoSignIns.filter(({ email }) => rows.some((row) => row.email === email));
	const width = (key: 'role' | 'email') => Math.max(0, ...there.map((one) => one[key].length)) + 2;
	return there.map(
		({ role, email, password }) => `  ${role.padEnd(width('role'))}${email.padEnd(width('email'))}${password}`
	);
}
