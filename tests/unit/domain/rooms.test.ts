import { describe, expect, it } from 'vitest';
import { homeOf, roomsOf } from '$lib/server/domain/rooms';
import { roles, type Actor, type Role } from '$lib/server/domain/role';

const actor = (...held: Role[]): Actor => ({ id: 1, roles: held });

describe('homeOf(actor)', () => {
	it.each(roles.map((role) => [role]))('is a room that %s may enter', (role) => {
		expect(roomsOf(actor(role)).map(({ href }) => href)).toContain(homeOf(actor(role)));
	});

	it('starts an instructor who also learns where they teach', () => {
		expect(homeOf(actor('apprentice', 'instructor'))).toBe('/teach');
	});

	it('is the front page for a person without a role', () => expect(homeOf(actor())).toBe('/'));
});
