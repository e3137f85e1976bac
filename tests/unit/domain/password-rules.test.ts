import { expect, it } from 'vitest';
import { refusedPassword } from '$lib/server/domain/password-rules';

const person = { email: 'ailsa.tyson@northmoor.example', displayName: 'Ailsa Tyson' };

it.each(['nine-quiet-carriers', '🔭📡🛰️📻🎛️ 12345678', 'drei Meßköpfe im Regen', 'a b c d e f g'])(
	'takes %j',
	(password) => expect(refusedPassword(password, person)).toBeNull()
);

it.each([
	['elevenchars', '12 characters; this has 11'],
	['📡📡📡📡📡📡', '12 characters; this has 6'],
	['abababababababab', '5 different'],
	['my name is AILSA TYSON', 'Leave your name'],
	['ailsa.tyson-2026', 'Leave your name'],
	['Ailsa.Tyson@Northmoor.example!', 'Leave your name']
])('refuses %j and says why', (password, why) => {
	expect(refusedPassword(password, person)).toContain(why);
});

it('doesn’t mind a name too short to be told from chance', () => {
	expect(refusedPassword('bo carries nine masts', { email: 'bo@x.example', displayName: 'Bo' })).toBeNull();
});
