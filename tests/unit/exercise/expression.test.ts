import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BenchError } from '$lib/server/bench/bench-error';
import { parseExpression, type Scope } from '$lib/server/bench/exercise/expression';

const evaluate = (text: string, scope: Scope = {}) => parseExpression(text, 'place').evaluate(scope);

describe('parseExpression(text, field)', () => {
	it.each([
		['1 + 2*3', 7],
		['-2^2', -4],
		['2^3^2', 512],
		['(1 + 2)/4', 0.75],
		['450.0125e6 + 25e3*2', 450.0625e6],
		['10*log10(25000/2500)', 10],
		['round(2.5) + floor(-1.5) + ceil(0.2)', 2],
		['max(1, 4, 2) - min(3, -1)', 5],
		['abs(-3) + sqrt(16) + ln(exp(1))', 8]
	])('%s is %d', (text, value) => expect(evaluate(text)).toBeCloseTo(value, 9));

	it('reads names from the scope and says which it needs', () => {
		expect(evaluate('=carrierDbm - leadLossDb', { carrierDbm: -10, leadLossDb: 3 })).toBe(-13);
		expect(parseExpression('a + b*a', 'place').names).toEqual(['a', 'b']);
	});

	it.each([
		'a.b',
		'a["b"]',
		'a[1]',
		'a = 3',
		'f(x) = x',
		'"text"',
		"'text'",
		'[1, 2]',
		'{ a: 1 }',
		'1; 2',
		'a > 1 ? 2 : 3',
		'a == 1',
		'not a',
		'a and b',
		'1:3',
		'3!',
		"a'",
		'a % 2',
		'5 cm',
		'2 a',
		'true',
		'null',
		'constructor("return process")()',
		'import("fs")',
		'eval("1")',
		'cos(1)',
		'random()',
		'parse("1")',
		'a.constructor.constructor("1")()',
		'log10()',
		'',
		'1 +'
	])('refuses %s, naming the field', (text) => {
		const refused = () => evaluate(text, { a: 1, b: 2 });
		expect(refused).toThrow(BenchError);
		expect(refused).toThrow(expect.objectContaining({ field: 'place' }));
	});

	it.each(['constructor', 'toString', '__proto__', 'hasOwnProperty', 'pi', 'e', 'i', 'Infinity', 'NaN'])(
		'knows nothing called %s unless it was given',
		(name) => expect(() => evaluate(name)).toThrow(BenchError)
	);

	it('takes no text for a number', () =>
		expect(() => evaluate('neighbour + 1', { neighbour: 'telemetry' })).toThrow(
			/no number is called neighbour/
		));

	it('refuses what gives no finite number', () => {
		expect(() => evaluate('1/0')).toThrow(/finite/);
		expect(() => evaluate('log10(-1)')).toThrow(/finite/);
		expect(() => evaluate('1e500')).toThrow(BenchError);
	});

	it('refuses nesting and length without end', () => {
		expect(() => evaluate(`${'('.repeat(40)}1${')'.repeat(40)}`)).toThrow(BenchError);
		expect(() => evaluate(`1${' + 1'.repeat(80)}`)).toThrow(/at most 200 characters/);
	});

	it('never returns anything but a finite number, whatever is typed', () => {
		const piece = fc.constantFrom(
			'a',
			'1',
			'.',
			'(',
			')',
			'[',
			']',
			'"',
			'+',
			'*',
			'^',
			',',
			' ',
			'=',
			'log10',
			';',
			'{',
			'}'
		);
		fc.assert(
			fc.property(fc.array(piece, { maxLength: 12 }), (pieces) => {
				try {
					expect(Number.isFinite(evaluate(pieces.join(''), { a: 2 }))).toBe(true);
				} catch (error) {
					expect(error).toBeInstanceOf(BenchError);
				}
			}),
			{ numRuns: 2000 }
		);
	});
});
