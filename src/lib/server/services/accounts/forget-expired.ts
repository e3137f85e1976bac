import { Op } from 'sequelize';
import { deleteExpiredSessions } from '$lib/server/auth/sessions';
import { KnownDevice } from '$lib/server/db/models/known-device';
import { SignInBucket } from '$lib/server/db/models/sign-in-bucket';

const DAY_MS = 24 * 3600 * 1000;
/** A full bucket has drained in minutes. */
const BUCKET_KEPT_DAYS = 1;
/** As long as the device cookie lives. */
const DEVICE_KEPT_DAYS = 180;
const ROWS_AT_ONCE = 1000;

/** Removes what signing in leaves behind once it has run out: sessions, devices, drained buckets. */
export async function forgetExpired(now: Date): Promise<void> {
	const before = (days: number) => ({ [Op.lt]: new Date(now.getTime() - days * DAY_MS) });
	await deleteExpiredSessions();
	await KnownDevice.destroy({ where: { lastUsedAt: before(DEVICE_KEPT_DAYS) }, limit: ROWS_AT_ONCE });
	await SignInBucket.destroy({ where: { updatedAt: before(BUCKET_KEPT_DAYS) }, limit: ROWS_AT_ONCE });
}
