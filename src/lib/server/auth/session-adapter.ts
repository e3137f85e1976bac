import type { Adapter, DatabaseSession, DatabaseUser } from 'lucia';
import { Op, type Transaction } from 'sequelize';
import { Session } from '$lib/server/db/models/session';
import { User } from '$lib/server/db/models/user';
import { UserRole } from '$lib/server/db/models/user-role';

/** Lucia's ids are text, ours bytes: Lucia is given the hash in hexadecimal. */
const bytesOf = (id: string): Buffer => Buffer.from(id, 'hex');

/** Lucia's door to the tables `sessions`, `users` and `user_roles`. */
export class SessionAdapter implements Adapter {
	constructor(private readonly transaction?: Transaction) {}

	/** A person who is disabled counts as absent, which ends their sessions at their next request. */
	async getSessionAndUser(id: string): Promise<[DatabaseSession | null, DatabaseUser | null]> {
		const { transaction } = this;
		const session = await Session.findByPk(bytesOf(id), { transaction });
		if (!session) return [null, null];
		const user = await User.findOne({
			where: { id: session.userId, disabledAt: null },
			include: [{ model: UserRole, required: false }],
			transaction
		});
		if (!user) return [presentSession(session), null];
		const roles = (user.userRoles ?? []).map(({ role }) => role);
		const { email, displayName } = user;
		return [presentSession(session), { id: user.id, attributes: { email, displayName, roles } }];
	}

	async getUserSessions(userId: number): Promise<DatabaseSession[]> {
		const sessions = await Session.findAll({ where: { userId }, transaction: this.transaction });
		return sessions.map(presentSession);
	}

	async setSession({ id, userId, expiresAt, attributes }: DatabaseSession): Promise<void> {
		const { transaction } = this;
		await Session.create({ id: bytesOf(id), userId, expiresAt, ...attributes }, { transaction });
	}

	async updateSessionExpiration(id: string, expiresAt: Date): Promise<void> {
		await Session.update({ expiresAt }, { where: { id: bytesOf(id) }, transaction: this.transaction });
	}

	/** Notes a request; moves the expiry with it. */
	async touchSession(id: string, expiresAt: Date, lastUsedAt: Date): Promise<void> {
		const where = { id: bytesOf(id) };
		await Session.update({ expiresAt, lastUsedAt }, { where, transaction: this.transaction });
	}

	async deleteSession(id: string): Promise<void> {
		await Session.destroy({ where: { id: bytesOf(id) }, transaction: this.transaction });
	}

	async deleteUserSessions(userId: number): Promise<void> {
		await Session.destroy({ where: { userId }, transaction: this.transaction });
	}

	async deleteExpiredSessions(): Promise<void> {
		const where = { expiresAt: { [Op.lte]: new Date() } };
		await Session.destroy({ where, limit: 1000, transaction: this.transaction });
	}
}

const presentSession = ({
	id,
	userId,
	createdAt,
	expiresAt,
	device,
	lastUsedAt
}: Session): DatabaseSession => ({
	id: id.toString('hex'),
	userId,
	expiresAt,
	attributes: { createdAt, device, lastUsedAt }
});
