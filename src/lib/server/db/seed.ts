import { hashPassword } from '$lib/server/auth/passwords';
import { roleName, type Role } from '$lib/server/domain/role';
import { User } from './models/user';
import { UserRole } from './models/user-role';
import { inTransaction } from './transaction';

/** Everybody's in the demo. Known to all who read this, which is why `seedDemo` refuses to work in earnest. */
const DEMO_PASSWORD = 'nine-quiet-carriers';

/** People of an invented training centre, Tarn Vale, and of two companies that send theirs to it. */
const PEOPLE: readonly { role: Role; displayName: string; email: string }[] = [
	{ role: 'apprentice', displayName: 'Ailsa Tyson', email: 'ailsa.tyson@northmoor.example' },
	{ role: 'apprentice', displayName: 'Ewan Brack', email: 'ewan.brack@skerrycoast.example' },
	{ role: 'instructor', displayName: 'Bridget Hale', email: 'bridget.hale@tarnvale.example' },
	{ role: 'instructor', displayName: 'Silas Arkle', email: 'silas.arkle@tarnvale.example' },
	{ role: 'coordinator', displayName: 'Morwenna Slee', email: 'morwenna.slee@tarnvale.example' },
	{ role: 'coordinator', displayName: 'Tobin Garth', email: 'tobin.garth@tarnvale.example' },
	{ role: 'company-contact', displayName: 'Una Calder', email: 'una.calder@northmoor.example' },
	{ role: 'company-contact', displayName: 'Piers Langrigg', email: 'piers.langrigg@skerrycoast.example' },
	{ role: 'administrator', displayName: 'Greta Scarth', email: 'greta.scarth@tarnvale.example' },
	{ role: 'administrator', displayName: 'Owen Mell', email: 'owen.mell@tarnvale.example' }
];

/** How to sign in to the demo, for whoever starts it. */
export const demoSignIns = PEOPLE.map(({ role, email }) => ({
	role: roleName(role),
	email,
	password: DEMO_PASSWORD
}));

/**
 * Puts the demo people into an empty database.
 * Throws if there are people in it, or if it serves in earnest: production or https, on a database elsewhere.
 */
export async function seedDemo(env: NodeJS.ProcessEnv = process.env): Promise<void> {
	if (servesInEarnest(env))
		throw new Error('Demo people have a published password: not on a server in earnest.');
	await inTransaction(async (transaction) => {
		if ((await User.count({ transaction })) > 0) throw new Error('The database has people already.');
		for (const { role, displayName, email } of PEOPLE) {
			const passwordHash = await hashPassword(DEMO_PASSWORD);
			const user = await User.create({ displayName, email, passwordHash }, { transaction });
			await UserRole.create({ userId: user.id, role }, { transaction });
		}
	});
}

function servesInEarnest(env: NodeJS.ProcessEnv): boolean {
	const databaseHost = env.DATABASE_URL ? new URL(env.DATABASE_URL).hostname : undefined;
	const isLocal = databaseHost !== undefined && ['127.0.0.1', 'localhost', '[::1]'].includes(databaseHost);
	return !isLocal && (env.NODE_ENV === 'production' || (env.ORIGIN ?? '').startsWith('https:'));
}
