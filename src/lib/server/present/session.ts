import type { SessionView } from '$lib/schemas/account';
import { asDeviceKind } from '$lib/server/domain/device-kind';

interface SessionRecord {
	id: Buffer;
	number: number;
	device: string;
	createdAt: Date;
	lastUsedAt: Date;
	expiresAt: Date;
}

/** An open sign-in as its owner sees it. @param currentId that of the session which asks */
export const presentSession = (session: SessionRecord, currentId: Buffer | null): SessionView => ({
	number: session.number,
	device: asDeviceKind(session.device),
	signedInAt: session.createdAt.toISOString(),
	lastUsedAt: session.lastUsedAt.toISOString(),
	expiresAt: session.expiresAt.toISOString(),
	current: currentId !== null && session.id.equals(currentId)
});
