import { describe, expect, it } from 'vitest';
import { takeReadingRequest } from '$lib/schemas/attempt';

const fieldsOf = (body: unknown) => {
	const parsed = takeReadingRequest.safeParse(body);
	return parsed.success ? [] : parsed.error.issues.map(({ path }) => path.join('.'));
};
const peak = { kind: 'peak' };
const count = { kind: 'count', atHz: 450e6, gateS: 0.1 };

describe('takeReadingRequest', () => {
	it('takes a reading off a trace, and a count off none', () => {
		expect(fieldsOf({ rows: { from: 0, to: 3 }, trace: 1, request: peak })).toEqual([]);
		expect(fieldsOf({ request: count })).toEqual([]);
	});
	it('names what a reading leaves out and what a count must leave out', () => {
		expect(fieldsOf({ request: peak })).toEqual(['rows', 'trace']);
		expect(fieldsOf({ rows: { from: 0, to: 3 }, trace: 1, request: count })).toEqual(['rows', 'trace']);
	});
	it.each([0, -1, 1e5])('refuses a gate of %d s', (gateS) => {
		expect(fieldsOf({ request: { ...count, gateS } })).toEqual(['request.gateS']);
	});
});
