import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { displayNameForm, endSessionForm, passwordForm } from '$lib/schemas/account';

const fieldsOf = (result: { error?: { issues: { path: PropertyKey[] }[] } }) =>
	result.error?.issues.map(({ path }) => path.join('.'));

describe('displayNameForm', () => {
	it('keeps a name without outer spaces, and with one space where there were several', () => {
		expect(displayNameForm.parse({ displayName: '  Ailsa \t Tyson\n' })).toEqual({
			displayName: 'Ailsa Tyson'
		});
		expect(displayNameForm.parse({ displayName: 'Þóra Ó’Brien-Šimić' }).displayName).toBe(
			'Þóra Ó’Brien-Šimić'
		);
	});
	it.each([
		undefined,
		'',
		' \u00a0 ',
		'12345',
		'…',
		'x'.repeat(121),
		'Ailsa\u202eTyson',
		'Ai\u0000lsa',
		4,
		{}
	])('refuses %j and names the field', (displayName) =>
		expect(fieldsOf(displayNameForm.safeParse({ displayName }))).toContain('displayName')
	);
	it('never lets through more than the column holds', () => {
		fc.assert(
			fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (typed) => {
				const { data } = displayNameForm.safeParse({ displayName: typed });
				expect([...(data?.displayName ?? '')].length).toBeLessThanOrEqual(120);
			})
		);
	});
});

describe('passwordForm', () => {
	const good = {
		presentPassword: 'the old one',
		newPassword: 'a quite new one',
		newPasswordAgain: 'a quite new one'
	};
	it('takes the present password and a new one twice', () => expect(passwordForm.parse(good)).toEqual(good));
	it.each([
		[{ presentPassword: '' }, ['presentPassword']],
		[{ newPassword: undefined }, ['newPassword']],
		[{ newPasswordAgain: 'a quite new on' }, ['newPasswordAgain']],
		[{ presentPassword: 'a quite new one' }, ['newPassword']],
		[
			{ newPassword: 'x'.repeat(1025), newPasswordAgain: 'x'.repeat(1025) },
			['newPassword', 'newPasswordAgain']
		],
		[{ newPassword: new File([], 'a'), newPasswordAgain: 7 }, ['newPassword', 'newPasswordAgain']]
	])('refuses %j and names the fields', (over, fields) => {
		expect(fieldsOf(passwordForm.safeParse({ ...good, ...over }))).toEqual(fields);
	});
});

it('a session is named by a number that the database can hold', () => {
	expect(endSessionForm.parse({ session: '17' })).toEqual({ session: 17 });
	for (const session of ['', '0', '-1', '1e3', '1'.repeat(16), ' 1', undefined])
		expect(fieldsOf(endSessionForm.safeParse({ session }))).toEqual(['session']);
});
